/** Decimals beyond these are counted as these. */
export const MOST_DECIMALS = 40
const MEANINGFUL_SHARE = 0.02

/**
 * Half of the last written digit of the coordinates, in drawing units, from how many coordinates were
 * written with how many decimals: the most decimals that at least 2 % of them use. A drawing written
 * with one decimal at most is taken as exact (0): no program rounds coordinates to tenths, so 60.0 means 60.
 * Common practice, no source.
 */
export function lastDigitOf(histogram: Uint32Array): number {
  let all = 0
  for (const n of histogram) all += n
  let decimals = histogram.length - 1
  for (let n = histogram[decimals]; decimals > 0 && n < Math.max(1, MEANINGFUL_SHARE * all); n += histogram[decimals]) decimals--
  return decimals <= 1 ? 0 : Number(`5e-${decimals + 1}`)
}
