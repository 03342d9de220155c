import { ARC, BEZIER, type EdgeTable } from '../edges'

/**
 * Whether the loop of edges from … to − 1 turns one way only (sense 1 left, −1 right), by chords and by the way its arcs
 * bend; loops with ellipses or Béziers are not looked into and count as not convex.
 */
export function isConvex({ kind, ends, shape, shapes }: EdgeTable, from: number, to: number, sense: 1 | -1): boolean {
  let ax = ends[4 * to - 2] - ends[4 * to - 4]
  let ay = ends[4 * to - 1] - ends[4 * to - 3]
  for (let i = from; i < to; i++) {
    if (kind[i] > ARC && kind[i] <= BEZIER) return false
    if (kind[i] === ARC && shapes[shape[i] + 4] * sense < 0) return false
    const bx = ends[4 * i + 2] - ends[4 * i]
    const by = ends[4 * i + 3] - ends[4 * i + 1]
    if ((ax * by - ay * bx) * sense < 0) return false
    ax = bx
    ay = by
  }
  return true
}
