import type { EdgeTable } from './edges'

/** Sum of the chords of edges from … to − 1: the perimeter, or a little less where edges are curved. */
export function chordLength({ ends: e }: EdgeTable, from: number, to: number): number {
  let sum = 0
  for (let i = from; i < to; i++) sum += Math.sqrt((e[4 * i + 2] - e[4 * i]) ** 2 + (e[4 * i + 3] - e[4 * i + 1]) ** 2)
  return sum
}
