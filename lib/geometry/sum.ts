/**
 * Running sums that carry their own rounding error (Neumaier's variant of Kahan's sum, from memory): each result is as if
 * added in twice the precision and rounded once, whatever the order of magnitudes. Sum j has its total at 2j and what it
 * lost at 2j + 1.
 */
export type Sums = Float64Array

export const newSums = (count: number): Sums => new Float64Array(2 * count)

export function add(sums: Sums, j: number, value: number): void {
  const before = sums[2 * j]
  const total = before + value
  sums[2 * j + 1] += Math.abs(before) >= Math.abs(value) ? before - total + value : value - total + before
  sums[2 * j] = total
}

export const sumOf = (sums: Sums, j: number): number => sums[2 * j] + sums[2 * j + 1]

/** Compensated sum of a list. */
export function compensatedSum(values: ArrayLike<number>): number {
  const sum = newSums(1)
  for (let i = 0; i < values.length; i++) add(sum, 0, values[i])
  return sumOf(sum, 0)
}
