import type { EdgeTable } from '../geometry/edges'
import { add, newSum, type Sum, sumOf } from '../geometry/sum'
import { edgeMoments } from './edgeMoments'
import type { Frame } from './frame'
import { AREA, U, UU, UV, V, VV } from './momentArray'

/** Area moments in a frame's axes: ∫dA, ∫u dA, ∫v dA, ∫u² dA, ∫v² dA, +∫uv dA (mm², mm³, mm⁴). */
export interface Moments {
  area: number
  u: number
  v: number
  uu: number
  vv: number
  uv: number
}

const out = new Float64Array(6)

/**
 * Moments of the metal bounded by edges from … to − 1 (closed loops, metal on the left) in `frame`.
 * Compensated sums; choose the frame's origin within the region, so that nothing is lost to a far origin.
 */
export function momentsOf(edges: EdgeTable, from: number, to: number, frame: Frame): Moments {
  const sums: Sum[] = [newSum(), newSum(), newSum(), newSum(), newSum(), newSum()]
  const [a, u, v, uu, vv, uv] = sums
  for (let i = from; i < to; i++) {
    edgeMoments(edges, i, frame, out)
    add(a, out[AREA])
    add(u, out[U])
    add(v, out[V])
    add(uu, out[UU])
    add(vv, out[VV])
    add(uv, out[UV])
  }
  return { area: sumOf(a), u: sumOf(u), v: sumOf(v), uu: sumOf(uu), vv: sumOf(vv), uv: sumOf(uv) }
}
