/** Decimal exponent of the first digit: 3 for 1234, −2 for 0.012. */
const exponentOf = (value: number): number => Number(value.toExponential().split('e')[1])

/**
 * Power of ten of the last digit worth printing of a value known to ± `plusMinus`: the first place whose half unit is not less
 * than the ±. 12.3456 ± 0.03 → −1 (12.3). −Infinity where nothing limits it.
 */
export function lastSurvivingPlace(plusMinus: number): number {
  if (!(plusMinus > 0)) return Number.NEGATIVE_INFINITY
  const twice = 2 * plusMinus
  const exponent = exponentOf(twice)
  return Number(`1e${exponent}`) >= twice ? exponent : exponent + 1
}

/** Rounds to at most `digits` significant digits and to the last place that survives ± `plusMinus`: plain decimal notation. */
export function survivingDigits(value: number, digits: number, plusMinus = 0): string {
  if (value === 0 || !Number.isFinite(value)) return value === 0 ? '0' : String(value)
  const place = Math.max(lastSurvivingPlace(plusMinus), exponentOf(value) - digits + 1)
  const significant = exponentOf(value) - place + 1
  if (significant < 0) return '0'
  if (significant === 0) return Math.abs(value) >= 0.5 * 10 ** place ? expanded(Math.sign(value) * 10 ** place, 1) : '0'
  return expanded(value, Math.min(100, significant))
}

function expanded(value: number, significant: number): string {
  const [mantissa, exponent] = value.toExponential(significant - 1).split('e')
  const shift = Number(exponent)
  const sign = mantissa.startsWith('-') ? '-' : ''
  const figures = mantissa.replace('-', '').replace('.', '')
  if (shift >= figures.length - 1) return sign + figures.padEnd(shift + 1, '0')
  if (shift >= 0) return `${sign}${figures.slice(0, shift + 1)}.${figures.slice(shift + 1)}`
  return `${sign}0.${'0'.repeat(-shift - 1)}${figures}`
}
