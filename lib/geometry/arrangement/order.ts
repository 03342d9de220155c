import { LINE } from '../edges'
import type { Arrangement } from './arrange'
import { pointAt } from './curve'

const p = new Float64Array(2)

/** An end of a kept sub-edge at a vertex: half-edge 2u leaves from[u], half-edge 2u + 1 runs the other way. */
export interface Spoke {
  half: number
  out: boolean
}

/**
 * Sorts spokes round their common vertex counter-clockwise, by where they cross one small circle. Pieces
 * are monotone in x and y, so each crosses it exactly once: the order is right for tangent edges of any
 * curvature as well.
 */
export function aroundVertex(a: Arrangement, vertex: number, spokes: Spoke[]): void {
  const { x, y } = a.local
  let radius = Number.POSITIVE_INFINITY
  const leaves = ({ half, out }: Spoke) => (half & 1) === (out ? 0 : 1)
  for (const s of spokes) {
    const u = s.half >> 1
    const other = leaves(s) ? a.to[u] : a.from[u]
    radius = Math.min(radius, Math.hypot(x[other] - x[vertex], y[other] - y[vertex]))
  }
  const angle = new Map<Spoke, number>()
  for (const s of spokes) angle.set(s, angleOnCircle(a, vertex, s.half >> 1, leaves(s), 0.9 * radius))
  spokes.sort((s, t) => (angle.get(s) ?? 0) - (angle.get(t) ?? 0))
}

/** Direction from the vertex to where sub-edge u is `radius` away from it. */
function angleOnCircle(a: Arrangement, vertex: number, u: number, leaves: boolean, radius: number): number {
  const { x, y } = a.local
  const other = leaves ? a.to[u] : a.from[u]
  if (a.pieces.table.kind[a.row[u]] === LINE) return Math.atan2(y[other] - y[vertex], x[other] - x[vertex])
  let near = leaves ? a.t0[u] : a.t1[u]
  let far = leaves ? a.t1[u] : a.t0[u]
  for (let n = 0; n < 48; n++) {
    const t = (near + far) / 2
    pointAt(a.pieces.table, a.row[u], t, p)
    if (Math.hypot(p[0] - x[vertex], p[1] - y[vertex]) < radius) near = t
    else far = t
  }
  return Math.atan2(p[1] - y[vertex], p[0] - x[vertex])
}
