import { LINE } from '../edges'
import { pointAt } from './curve'
import { levelOn } from './foot'
import type { Merged } from './merge'
import type { Pieces } from './monotone'
import type { Vertices } from './vertices'

const p = new Float64Array(2)
const q = new Float64Array(2)

/**
 * Sub-edges as they truly run from vertex to vertex: the carrier, shifted by what its ends lie off the snapped vertices,
 * in proportion along the way. Without this, sub-edges as short as the tolerance point anywhere.
 */
export interface Stretches {
  pieces: Pieces
  local: Vertices
  merged: Pick<Merged, 'from' | 'to' | 'row' | 'piece' | 't0' | 't1'>
}

/** How far vertex and carrier differ at the first (0) or second (1) end of sub-edge u: dx, dy. */
function shiftAt({ pieces, local, merged }: Stretches, u: number, end: 0 | 1, out: Float64Array): void {
  const v = end === 0 ? merged.from[u] : merged.to[u]
  pointAt(pieces.table, merged.row[u], end === 0 ? merged.t0[u] : merged.t1[u], out)
  out[0] = local.x[v] - out[0]
  out[1] = local.y[v] - out[1]
}

/** Writes the point of sub-edge u at the fraction f of its way. */
export function pointOf(s: Stretches, u: number, f: number, out: Float64Array): void {
  const { local, merged, pieces } = s
  if (pieces.table.kind[merged.row[u]] === LINE) {
    out[0] = local.x[merged.from[u]] + f * (local.x[merged.to[u]] - local.x[merged.from[u]])
    out[1] = local.y[merged.from[u]] + f * (local.y[merged.to[u]] - local.y[merged.from[u]])
    return
  }
  shiftAt(s, u, 0, p)
  shiftAt(s, u, 1, q)
  pointAt(pieces.table, merged.row[u], merged.t0[u] + f * (merged.t1[u] - merged.t0[u]), out)
  out[0] += (1 - f) * p[0] + f * q[0]
  out[1] += (1 - f) * p[1] + f * q[1]
}

/** The x (axis 0) or y (axis 1) of sub-edge u where its other coordinate has the given value. */
export function crossingOf(s: Stretches, u: number, axis: 0 | 1, value: number): number {
  const { local, merged, pieces } = s
  const [along, across] = axis === 0 ? [local.x, local.y] : [local.y, local.x]
  const [a, b] = [merged.from[u], merged.to[u]]
  const row = merged.row[u]
  if (pieces.table.kind[row] === LINE) return along[a] + ((value - across[a]) / (across[b] - across[a])) * (along[b] - along[a])
  shiftAt(s, u, 0, p)
  shiftAt(s, u, 1, q)
  const other = axis === 0 ? 1 : 0
  const [t0, t1] = [merged.t0[u], merged.t1[u]]
  let f = (value - across[a]) / (across[b] - across[a])
  let t = t0
  for (let n = 0; n < 3; n++) {
    t = levelOn(pieces, merged.piece[u], other, value - (1 - f) * p[other] - f * q[other])
    t = t0 < t1 ? Math.min(Math.max(t, t0), t1) : Math.min(Math.max(t, t1), t0)
    f = (t - t0) / (t1 - t0)
  }
  const shift = (1 - f) * p[axis] + f * q[axis]
  pointAt(pieces.table, row, t, p)
  return Math.min(Math.max(p[axis] + shift, Math.min(along[a], along[b])), Math.max(along[a], along[b]))
}
