import { type EdgeTable, LINE } from '../geometry/edges'
import { add, newSum, sumOf } from '../geometry/sum'
import { addSegment, curvePoint, loadCurve, newCurve, newCurvePoint, turnsInV } from './curve'
import type { Frame } from './frame'
import { AREA, U, V, VV } from './momentArray'

/**
 * A region cut up for questions of the kind "how much lies above v = c": pieces of edges along which v only rises or only falls.
 * Piece i runs from (u0, v0) to (u1, v1) = ends[4i …]; curved pieces name their edge and parameters and keep the four moments
 * of the segment between piece and chord (area, ∫u, ∫v, ∫v²).
 */
export interface Slice {
  edges: EdgeTable
  frame: Frame
  count: number
  ends: Float64Array
  /** row in the curved columns, −1 for a straight piece */
  curved: Int32Array
  edge: number[]
  parameters: number[]
  segments: number[]
}

/** Integrals over the metal above a line: ∫dA, ∫u dA, ∫v dA, ∫v² dA. */
export interface Above {
  area: number
  u: number
  v: number
  vv: number
}

const curve = newCurve()
const point = newCurvePoint()
const segment = new Float64Array(6)

function pushCurved(slice: Slice, i: number, t0: number, t1: number, u0: number, v0: number, u1: number, v1: number): void {
  const row = slice.edge.length
  segment.fill(0)
  addSegment(curve, t0, t1, 0.5 * (u0 + u1), 0.5 * (v0 + v1), segment)
  slice.edge.push(i)
  slice.parameters.push(t0, t1)
  slice.segments.push(segment[AREA], segment[U], segment[V], segment[VV])
  if (slice.count === slice.curved.length) {
    const ends = new Float64Array(8 * slice.count)
    const curved = new Int32Array(2 * slice.count)
    ends.set(slice.ends)
    curved.set(slice.curved)
    slice.ends = ends
    slice.curved = curved
  }
  const at = 4 * slice.count
  slice.ends[at] = u0
  slice.ends[at + 1] = v0
  slice.ends[at + 2] = u1
  slice.ends[at + 3] = v1
  slice.curved[slice.count++] = row
}

/** Slices the region bounded by `edges` (closed loops, metal on the left) across v of `frame`. */
export function sliceOf(edges: EdgeTable, frame: Frame): Slice {
  const n = Math.max(8, edges.count)
  const slice: Slice = {
    edges,
    frame,
    count: 0,
    ends: new Float64Array(4 * n),
    curved: new Int32Array(n),
    edge: [],
    parameters: [],
    segments: [],
  }
  const { cos, sin } = frame
  const e = edges.ends
  for (let i = 0; i < edges.count; i++) {
    if (edges.kind[i] !== LINE) continue
    const x0 = e[4 * i] - frame.x
    const y0 = e[4 * i + 1] - frame.y
    const x1 = e[4 * i + 2] - frame.x
    const y1 = e[4 * i + 3] - frame.y
    const at = 4 * slice.count
    slice.ends[at] = x0 * cos + y0 * sin
    slice.ends[at + 1] = y0 * cos - x0 * sin
    slice.ends[at + 2] = x1 * cos + y1 * sin
    slice.ends[at + 3] = y1 * cos - x1 * sin
    slice.curved[slice.count++] = -1
  }
  for (let i = 0; i < edges.count; i++) {
    if (edges.kind[i] === LINE) continue
    loadCurve(edges, i, frame, curve)
    const x0 = e[4 * i] - frame.x
    const y0 = e[4 * i + 1] - frame.y
    const x1 = e[4 * i + 2] - frame.x
    const y1 = e[4 * i + 3] - frame.y
    let t = curve.from
    let u = x0 * cos + y0 * sin
    let v = y0 * cos - x0 * sin
    for (const turn of turnsInV(curve)) {
      curvePoint(curve, turn, point)
      const { u: u1, v: v1 } = point
      pushCurved(slice, i, t, turn, u, v, u1, v1)
      t = turn
      u = u1
      v = v1
    }
    pushCurved(slice, i, t, curve.to, u, v, x1 * cos + y1 * sin, y1 * cos - x1 * sin)
  }
  return slice
}

/** Parameter within t0 … t1 where v = c, v monotone between: Newton's steps kept within the bracket by halving. */
function crossing(t0: number, t1: number, rising: boolean, c: number): number {
  let low = t0
  let high = t1
  let t = 0.5 * (t0 + t1)
  for (let step = 0; step < 80; step++) {
    curvePoint(curve, t, point)
    const off = point.v - c
    if (off === 0) return t
    if (off > 0 === rising) high = t
    else low = t
    const newton = t - off / point.dv
    const inside = (newton - low) * (newton - high) < 0
    const next = inside ? newton : 0.5 * (low + high)
    if (Math.abs(next - t) <= 1e-16 * (Math.abs(t0) + Math.abs(t1))) return next
    t = next
  }
  return t
}

/** Line part of ∫u dv, ∫½u² dv, ∫u v dv, ∫u v² dv along a chord. */
function chord(u0: number, v0: number, u1: number, v1: number, out: Above): void {
  const d = v1 - v0
  out.area = (d * (u0 + u1)) / 2
  out.u = (d * (u0 * u0 + u0 * u1 + u1 * u1)) / 6
  out.v = (d * (u0 * (2 * v0 + v1) + u1 * (v0 + 2 * v1))) / 6
  out.vv = (d * (u0 * (3 * v0 * v0 + 2 * v0 * v1 + v1 * v1) + u1 * (v0 * v0 + 2 * v0 * v1 + 3 * v1 * v1))) / 12
}

/** Where piece i crosses v = c: u there, last found. Set by `pieceAbove` for pieces that cross. */
let crossedAt = 0

/**
 * The part of piece i above v = c, into `out`: ∮u dv, ∮½u² dv, ∮u v dv, ∮u v² dv there. The closing line along v = c gives
 * nothing (dv = 0), so summed over all pieces these are the integrals over the metal above. Returns whether it crosses.
 */
export function pieceAbove(slice: Slice, i: number, c: number, out: Above): boolean {
  const { ends, curved, segments } = slice
  const at = 4 * i
  const v0 = ends[at + 1]
  const v1 = ends[at + 3]
  if (v0 <= c && v1 <= c) {
    out.area = 0
    out.u = 0
    out.v = 0
    out.vv = 0
    return false
  }
  const row = curved[i]
  const u0 = ends[at]
  const u1 = ends[at + 2]
  if (v0 >= c && v1 >= c) {
    chord(u0, v0, u1, v1, out)
    if (row >= 0) {
      out.area += segments[4 * row]
      out.u += segments[4 * row + 1]
      out.v += segments[4 * row + 2]
      out.vv += segments[4 * row + 3]
    }
    return false
  }
  const rising = v1 > v0
  if (row < 0) {
    const u = u0 + ((c - v0) / (v1 - v0)) * (u1 - u0)
    crossedAt = u
    if (rising) chord(u, c, u1, v1, out)
    else chord(u0, v0, u, c, out)
    return true
  }
  loadCurve(slice.edges, slice.edge[row], slice.frame, curve)
  const t0 = slice.parameters[2 * row]
  const t1 = slice.parameters[2 * row + 1]
  const t = crossing(t0, t1, rising, c)
  const { u } = curvePoint(curve, t, point)
  crossedAt = u
  segment.fill(0)
  if (rising) {
    chord(u, c, u1, v1, out)
    addSegment(curve, t, t1, 0.5 * (u + u1), 0.5 * (c + v1), segment)
  } else {
    chord(u0, v0, u, c, out)
    addSegment(curve, t0, t, 0.5 * (u0 + u), 0.5 * (v0 + c), segment)
  }
  out.area += segment[AREA]
  out.u += segment[U]
  out.v += segment[V]
  out.vv += segment[VV]
  return true
}

const part: Above = { area: 0, u: 0, v: 0, vv: 0 }

/** Area, first moments and second moment of the metal above v = c, about the frame's origin; exact for every kind of edge. */
export function above(slice: Slice, c: number): Above {
  const area = newSum()
  const u = newSum()
  const v = newSum()
  const vv = newSum()
  for (let i = 0; i < slice.count; i++) {
    pieceAbove(slice, i, c, part)
    add(area, part.area)
    add(u, part.u)
    add(v, part.v)
    add(vv, part.vv)
  }
  return { area: sumOf(area), u: sumOf(u), v: sumOf(v), vv: sumOf(vv) }
}

/** The line v = c that halves the area, and the width of metal along it. */
export interface HalfLine {
  c: number
  width: number
}

/**
 * Halves the area by Newton's steps (the area above falls by width × dc) kept within a bracket; pieces that have fallen out of
 * the bracket are summed once and left, so that the search costs little more than one walk over all pieces.
 */
export function halfAreaLine(slice: Slice, minV: number, maxV: number): HalfLine {
  const whole = above(slice, Number.NEGATIVE_INFINITY).area
  const { ends } = slice
  let active = Uint32Array.from({ length: slice.count }, (_, i) => i)
  let low = minV
  let high = maxV
  let settled = 0
  let c = low < 0 && high > 0 ? 0 : 0.5 * (low + high)
  let width = 0
  for (let step = 0; step < 200; step++) {
    const area = newSum()
    add(area, settled)
    width = 0
    for (const i of active) {
      if (pieceAbove(slice, i, c, part)) width += ends[4 * i + 3] > ends[4 * i + 1] ? crossedAt : -crossedAt
      add(area, part.area)
    }
    const excess = sumOf(area) - 0.5 * whole
    if (excess > 0) low = c
    else high = c
    if (Math.abs(excess) <= 2e-16 * whole || high - low <= 1e-16 * (maxV - minV)) break
    let kept = 0
    for (const i of active) {
      const bottom = Math.min(ends[4 * i + 1], ends[4 * i + 3])
      if (bottom >= high) {
        pieceAbove(slice, i, Number.NEGATIVE_INFINITY, part)
        settled += part.area
      } else if (Math.max(ends[4 * i + 1], ends[4 * i + 3]) > low) active[kept++] = i
    }
    active = active.subarray(0, kept)
    const newton = c + excess / width
    const next = newton > low && newton < high ? newton : 0.5 * (low + high)
    if (next === c) break
    c = next
  }
  return { c, width }
}
