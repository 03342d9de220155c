import { bezierXy, turnsOf } from '../bezierXy'
import { ARC, type EdgeTable, ELLIPSE, LINE } from '../edges'
import { endOf, jetAt, pointAt, startOf } from './curve'

/**
 * Edges cut where they turn round in x or y. Piece i is edge[i] from parameter t0[i] to t1[i], in the
 * edge's own direction; `ends` holds x0 y0 x1 y1. The box of a monotone piece is the box of its ends.
 */
export interface Pieces {
  table: EdgeTable
  count: number
  edge: Uint32Array
  t0: Float64Array
  t1: Float64Array
  ends: Float64Array
}

/** All edges of the table as monotone pieces, in the order of the edges. */
export function monotonePieces(table: EdgeTable, tolerance: number): Pieces {
  let room = Math.max(16, 2 * table.count)
  const pieces: Pieces = {
    table,
    count: 0,
    edge: new Uint32Array(room),
    t0: new Float64Array(room),
    t1: new Float64Array(room),
    ends: new Float64Array(4 * room),
  }
  const p = new Float64Array(2)
  for (let e = 0; e < table.count; e++) {
    const cuts = table.kind[e] === LINE ? [] : turningParameters(table, e, tolerance)
    while (pieces.count + cuts.length + 1 > room) {
      room *= 2
      grow(pieces, room)
    }
    let t = startOf(table, e)
    let x = table.ends[4 * e]
    let y = table.ends[4 * e + 1]
    for (let c = 0; c <= cuts.length; c++) {
      const i = pieces.count++
      const last = c === cuts.length
      const next = last ? endOf(table, e) : cuts[c]
      pieces.edge[i] = e
      pieces.t0[i] = t
      pieces.t1[i] = next
      pieces.ends[4 * i] = x
      pieces.ends[4 * i + 1] = y
      if (!last) pointAt(table, e, next, p)
      x = last ? table.ends[4 * e + 2] : p[0]
      y = last ? table.ends[4 * e + 3] : p[1]
      pieces.ends[4 * i + 2] = x
      pieces.ends[4 * i + 3] = y
      t = next
    }
  }
  return pieces
}

function grow(pieces: Pieces, room: number): void {
  const { edge, t0, t1, ends } = pieces
  pieces.edge = new Uint32Array(room)
  pieces.edge.set(edge)
  pieces.t0 = new Float64Array(room)
  pieces.t0.set(t0)
  pieces.t1 = new Float64Array(room)
  pieces.t1.set(t1)
  pieces.ends = new Float64Array(4 * room)
  pieces.ends.set(ends)
}

/**
 * Parameters strictly inside edge e, in its direction, where its carrier is level or upright: quadrants of an arc,
 * extremes of an ellipse or Bézier. Left out are those beyond which the edge turns back by less than a quarter of the
 * tolerance before it ends or turns again: it is monotone all but for that, and needs no vertex there.
 */
export function turningParameters(table: EdgeTable, e: number, tolerance: number): number[] {
  const start = startOf(table, e)
  const end = endOf(table, e)
  const found = table.kind[e] === ARC || table.kind[e] === ELLIPSE ? angles(table, e, start, end) : bezierTurns(table, e)
  found.sort((a, b) => (end > start ? a - b : b - a))
  const turns: { t: number; axis: number; value: number }[] = []
  const at = new Float64Array(6)
  const before = table.ends.slice(4 * e, 4 * e + 2)
  for (const t of found) {
    jetAt(table, e, t, at)
    const axis = Math.abs(at[2]) < Math.abs(at[3]) ? 0 : 1
    if (Math.abs(at[axis] - before[axis]) <= tolerance / 4) continue
    turns.push({ t, axis, value: at[axis] })
    before.set(at.subarray(0, 2))
  }
  for (let last = turns.at(-1); last; last = turns.at(-1)) {
    if (Math.abs(last.value - table.ends[4 * e + 2 + last.axis]) > tolerance / 4) break
    turns.pop()
  }
  return turns.map(({ t }) => t)
}

function angles(table: EdgeTable, e: number, start: number, end: number): number[] {
  const s = table.shapes
  const k = table.shape[e]
  const low = Math.min(start, end)
  const high = Math.max(start, end)
  const found: number[] = []
  const every = (first: number, step: number) => {
    for (let n = Math.ceil((low - first) / step); first + n * step < high; n++) {
      const t = first + n * step
      if (t > low) found.push(t)
    }
  }
  if (table.kind[e] === ARC) every(0, Math.PI / 2)
  else {
    every(Math.atan2(s[k + 4], s[k + 2]), Math.PI)
    every(Math.atan2(s[k + 5], s[k + 3]), Math.PI)
  }
  return found
}

function bezierTurns(table: EdgeTable, e: number): number[] {
  const curve = bezierXy(table, e)
  return [...turnsOf(curve.x, curve), ...turnsOf(curve.y, curve)]
}
