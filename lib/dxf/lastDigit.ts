/** Decimals beyond these are counted as these. */
export const MOST_DECIMALS = 40
/** Significant digits from which a program is known to write all that a double holds. */
export const FULL_PRECISION = 15
const MEANINGFUL_SHARE = 0.02

/** How the numbers of a file are written. */
export interface WrittenDigits {
  /** coordinates by number of decimals */
  decimals: Uint32Array
  /** coordinates that end in a 0 behind the first decimal: a fixed number of decimals is written */
  padded: number
  /** numbers of any use with 15 significant digits or more */
  full: number
}

export const noDigits = (): WrittenDigits => ({ decimals: new Uint32Array(MOST_DECIMALS + 1), padded: 0, full: 0 })

/**
 * Half of the last written digit of the coordinates, in drawing units: that of the most decimals that at least
 * 2 % of them use. 0 (exact) where the file writes as many digits as a number needs, which is known where some
 * number has 15, and where it has one decimal at most: no program rounds to tenths, so 60.0 means 60.
 * Common practice, no source.
 */
export function lastDigitOf({ decimals, padded, full }: WrittenDigits): number {
  let all = 0
  for (const n of decimals) all += n
  const meaningful = Math.max(1, MEANINGFUL_SHARE * all)
  if (full > 0 && padded < meaningful) return 0
  let most = MOST_DECIMALS
  while (most > 0 && decimals[most] < meaningful) most--
  return most <= 1 ? 0 : Number(`5e-${most + 1}`)
}
