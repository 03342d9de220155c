import { ARC, BEZIER, type EdgeTable } from '../edges'

/**
 * Whether the loop of edges from … to − 1 turns one way only (sense 1 left, −1 right), by chords and by the way its arcs
 * bend; loops with ellipses or Béziers are not looked into and count as not convex.
 */
export function isConvex({ kind, ends, shape, shapes }: EdgeTable, from: number, to: number, sense: 1 | -1): boolean {
  let last = to - 1
  for (let i = from; i < to; i++) {
    if (kind[i] > ARC && kind[i] <= BEZIER) return false
    if (kind[i] === ARC && shapes[shape[i] + 4] * sense < 0) return false
    const [ax, ay] = [ends[4 * last + 2] - ends[4 * last], ends[4 * last + 3] - ends[4 * last + 1]]
    const [bx, by] = [ends[4 * i + 2] - ends[4 * i], ends[4 * i + 3] - ends[4 * i + 1]]
    if ((ax * by - ay * bx) * sense < 0) return false
    last = i
  }
  return true
}
