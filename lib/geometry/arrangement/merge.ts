import { LINE } from '../edges'
import { lengthOf } from '../evaluate'
import type { Splits } from './arrange'
import { pointAt } from './curve'
import { footOn } from './foot'
import type { Pieces } from './monotone'
import type { Vertices } from './vertices'

/** Sub-edges, equal ones once, with signed counts by owner; fields as in `Arrangement`. */
export interface Merged {
  count: number
  from: Uint32Array
  to: Uint32Array
  row: Uint32Array
  piece: Uint32Array
  t0: Float64Array
  t1: Float64Array
  countStart: Uint32Array
  countOwner: Uint32Array
  countValue: Int32Array
}

/** Sub-edges between the same two vertices count as one when they run within this many tolerances. */
const SAME = 3

const p = new Float64Array(2)
const q = new Float64Array(2)

/**
 * Cuts the pieces at their splits and takes equal sub-edges once. The carrier of the longest edge holds,
 * so that the same one is chosen all along a shared stretch.
 */
export function mergeEqual(pieces: Pieces, { start, t, vertex }: Splits, owner: Uint32Array, local: Vertices): Merged {
  const most = t.length
  const from = new Uint32Array(most)
  const to = new Uint32Array(most)
  const piece = new Uint32Array(most)
  const t0 = new Float64Array(most)
  const t1 = new Float64Array(most)
  const length = new Float64Array(pieces.table.count)
  for (let e = 0; e < length.length; e++) length[e] = lengthOf(pieces.table, e)
  const buckets = new Int32Array(2 ** Math.ceil(Math.log2(2 * most + 2))).fill(-1)
  const next = new Int32Array(most)
  const uses: number[] = []
  let count = 0
  const known = (i: number, a: number, b: number, ta: number, tb: number, h: number) => {
    for (let u = buckets[h]; u >= 0; u = next[u]) {
      const ends = (from[u] === a && to[u] === b) || (from[u] === b && to[u] === a)
      if (ends && same(pieces, local, i, ta, tb, piece[u], a, b)) return u
    }
    return -1
  }
  for (let i = 0; i < pieces.count; i++) {
    for (let k = start[i]; k + 1 < start[i + 1]; k++) {
      const [a, b, ta, tb] = [vertex[k], vertex[k + 1], t[k], t[k + 1]]
      if (a === b) continue
      const h = (Math.imul(Math.min(a, b), 0x9e3779b1) ^ Math.imul(Math.max(a, b), 0x85ebca6b)) & (buckets.length - 1)
      let u = known(i, a, b, ta, tb, h)
      if (u < 0) {
        u = count++
        from[u] = a
        to[u] = b
        piece[u] = i
        t0[u] = ta
        t1[u] = tb
        next[u] = buckets[h]
        buckets[h] = u
      } else if (length[pieces.edge[i]] > length[pieces.edge[piece[u]]]) {
        piece[u] = i
        t0[u] = from[u] === a ? ta : tb
        t1[u] = from[u] === a ? tb : ta
      }
      uses.push(u, owner[pieces.edge[i]], from[u] === a ? 1 : -1)
    }
  }
  const row = new Uint32Array(count)
  for (let u = 0; u < count; u++) row[u] = pieces.edge[piece[u]]
  return {
    count,
    from: from.slice(0, count),
    to: to.slice(0, count),
    row,
    piece: piece.slice(0, count),
    t0: t0.slice(0, count),
    t1: t1.slice(0, count),
    ...counts(count, uses),
  }
}

/** Whether the stretch of piece i runs along the sub-edge on piece j with the same end vertices a and b. */
function same(pieces: Pieces, local: Vertices, i: number, ta: number, tb: number, j: number, a: number, b: number): boolean {
  const { table, edge } = pieces
  const lines = (table.kind[edge[i]] === LINE ? 1 : 0) + (table.kind[edge[j]] === LINE ? 1 : 0)
  if (lines === 2) return true
  for (let n = 1; n <= 3; n++) {
    pointAt(table, edge[i], ta + ((tb - ta) * n) / 4, p)
    if (table.kind[edge[i]] === LINE) {
      p[0] = local.x[a] + ((local.x[b] - local.x[a]) * n) / 4
      p[1] = local.y[a] + ((local.y[b] - local.y[a]) * n) / 4
    }
    const { 0: x, 1: y } = p
    if (table.kind[edge[j]] === LINE) {
      const dx = local.x[b] - local.x[a]
      const dy = local.y[b] - local.y[a]
      const off = Math.abs((x - local.x[a]) * dy - (y - local.y[a]) * dx) / Math.hypot(dx, dy)
      if (off > SAME * local.tolerance) return false
      continue
    }
    footOn(pieces, j, x, y, q)
    if (Math.hypot(q[0] - x, q[1] - y) > SAME * local.tolerance) return false
  }
  return true
}

/** Sums the signed uses (sub-edge, owner, sign) by sub-edge and owner; owners that cancel out are left out. */
function counts(count: number, uses: number[]): Pick<Merged, 'countStart' | 'countOwner' | 'countValue'> {
  const start = new Uint32Array(count + 1)
  for (let n = 0; n < uses.length; n += 3) start[uses[n] + 1]++
  for (let u = 0; u < count; u++) start[u + 1] += start[u]
  const fill = start.slice()
  const owners = new Uint32Array(uses.length / 3)
  const values = new Int32Array(uses.length / 3)
  for (let n = 0; n < uses.length; n += 3) {
    const at = fill[uses[n]]++
    owners[at] = uses[n + 1]
    values[at] = uses[n + 2]
  }
  const countStart = new Uint32Array(count + 1)
  let kept = 0
  for (let u = 0; u < count; u++) {
    const first = kept
    for (let k = start[u]; k < start[u + 1]; k++) {
      let at = first
      while (at < kept && owners[at] !== owners[k]) at++
      const value = values[k]
      if (at === kept) {
        owners[kept] = owners[k]
        values[kept++] = value
      } else values[at] += value
    }
    for (let k = first; k < kept; k++) {
      if (values[k] !== 0) continue
      kept--
      owners[k] = owners[kept]
      values[k] = values[kept]
      k--
    }
    countStart[u + 1] = kept
  }
  return { countStart, countOwner: owners.slice(0, kept), countValue: values.slice(0, kept) }
}
