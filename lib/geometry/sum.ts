/**
 * A running sum that carries its own rounding error (Neumaier's variant of Kahan's sum, from memory):
 * the result is as if added in twice the precision and rounded once, whatever the order of magnitudes.
 */
export interface Sum {
  total: number
  lost: number
}

export const newSum = (): Sum => ({ total: 0, lost: 0 })

export function add(sum: Sum, value: number): void {
  const total = sum.total + value
  sum.lost += Math.abs(sum.total) >= Math.abs(value) ? sum.total - total + value : value - total + sum.total
  sum.total = total
}

export const sumOf = (sum: Sum): number => sum.total + sum.lost

/** Compensated sum of a list. */
export function compensatedSum(values: ArrayLike<number>): number {
  const sum = newSum()
  for (let i = 0; i < values.length; i++) add(sum, values[i])
  return sumOf(sum)
}
