import { type EdgeTable, LINE } from '../geometry/edges'
import { add, newSum, type Sum, sumOf } from '../geometry/sum'
import type { Bundles } from './bundles'
import { addSegment, curvePoint, loadCurve, newCurve, newCurvePoint, reachOf, turnsInV } from './curve'
import type { Frame } from './frame'
import { AREA, addShifted, U, UU, UV, V, VV } from './momentArray'

/** Integrals over the metal above v = c: ∫dA, ∫u dA, ∫v dA, ∫v² dA; and the width of metal along the line. */
export interface Above {
  area: number
  u: number
  v: number
  vv: number
  width: number
}

/** ∮u dv, ∮½u² dv, ∮u v dv, ∮u v² dv along what lies above; the closing line along v = c adds nothing (dv = 0 on it). */
const part = new Float64Array(5)
const WIDTH = 4

function addLine(u0: number, v0: number, u1: number, v1: number): void {
  const d = v1 - v0
  part[0] += (d * (u0 + u1)) / 2
  part[1] += (d * (u0 * u0 + u0 * u1 + u1 * u1)) / 6
  part[2] += (d * (u0 * (2 * v0 + v1) + u1 * (v0 + 2 * v1))) / 6
  part[3] += (d * (u0 * (3 * v0 * v0 + 2 * v0 * v1 + v1 * v1) + u1 * (v0 * v0 + 2 * v0 * v1 + 3 * v1 * v1))) / 12
}

const segment = new Float64Array(6)

function addMoments(): void {
  part[0] += segment[AREA]
  part[1] += segment[U]
  part[2] += segment[V]
  part[3] += segment[VV]
}

function addLineAbove(u0: number, v0: number, u1: number, v1: number, c: number): void {
  if (v0 <= c && v1 <= c) return
  if (v0 >= c && v1 >= c) {
    addLine(u0, v0, u1, v1)
    return
  }
  const u = u0 + ((c - v0) / (v1 - v0)) * (u1 - u0)
  if (v1 > v0) {
    addLine(u, c, u1, v1)
    part[WIDTH] += u
  } else {
    addLine(u0, v0, u, c)
    part[WIDTH] -= u
  }
}

const curve = newCurve()
const point = newCurvePoint()

function addCurved(t0: number, t1: number, u0: number, v0: number, u1: number, v1: number): void {
  addLine(u0, v0, u1, v1)
  segment.fill(0)
  addSegment(curve, t0, t1, 0.5 * (u0 + u1), 0.5 * (v0 + v1), segment)
  addMoments()
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
    const next = (newton - low) * (newton - high) < 0 ? newton : 0.5 * (low + high)
    if (Math.abs(next - t) <= 1e-16 * (Math.abs(t0) + Math.abs(t1))) return next
    t = next
  }
  return t
}

/** A piece of the curve along which v only rises or only falls. */
function addPieceAbove(t0: number, t1: number, u0: number, v0: number, u1: number, v1: number, c: number): void {
  if (v0 <= c && v1 <= c) return
  if (v0 >= c && v1 >= c) {
    addCurved(t0, t1, u0, v0, u1, v1)
    return
  }
  const rising = v1 > v0
  const t = crossing(t0, t1, rising, c)
  const { u } = curvePoint(curve, t, point)
  part[WIDTH] += rising ? u : -u
  if (rising) addCurved(t, t1, u, c, u1, v1)
  else addCurved(t0, t, u0, v0, u, c)
}

/** Adds what lies above v = c of edge i to `part`; curves are split at their turning points and at the line. */
function addEdgeAbove(edges: EdgeTable, i: number, { x, y, cos, sin }: Frame, c: number): void {
  const { ends } = edges
  const x0 = ends[4 * i] - x
  const y0 = ends[4 * i + 1] - y
  const x1 = ends[4 * i + 2] - x
  const y1 = ends[4 * i + 3] - y
  const u0 = x0 * cos + y0 * sin
  const v0 = y0 * cos - x0 * sin
  const u1 = x1 * cos + y1 * sin
  const v1 = y1 * cos - x1 * sin
  if (edges.kind[i] === LINE) {
    addLineAbove(u0, v0, u1, v1, c)
    return
  }
  loadCurve(edges, i, { x, y, cos, sin }, curve)
  const reach = reachOf(curve)
  if (v0 <= c && v1 <= c && curve.kv + reach <= c) return
  if (v0 >= c && v1 >= c && curve.kv - reach >= c) {
    addCurved(curve.from, curve.to, u0, v0, u1, v1)
    return
  }
  let t = curve.from
  let u = u0
  let v = v0
  for (const turn of turnsInV(curve)) {
    curvePoint(curve, turn, point)
    const { u: nextU, v: nextV } = point
    addPieceAbove(t, turn, u, v, nextU, nextV, c)
    t = turn
    u = nextU
    v = nextV
  }
  addPieceAbove(t, curve.to, u, v, u1, v1, c)
}

/** Turns and moves moments about the bundles' origin (axes along x and y) into the frame, and adds them. */
function addTurned({ x, y }: Bundles, m: Float64Array, at: number, frame: Frame): void {
  const { cos, sin } = frame
  const dx = x - frame.x
  const dy = y - frame.y
  const p = m[at + U] * cos + m[at + V] * sin
  const q = m[at + V] * cos - m[at + U] * sin
  const qq = m[at + VV] * cos * cos + m[at + UU] * sin * sin - 2 * m[at + UV] * sin * cos
  segment.fill(0)
  addShifted(segment, dx * cos + dy * sin, dy * cos - dx * sin, m[at + AREA], p, q, 0, qq, 0)
  addMoments()
}

/** Chord of a run: what an open run adds beside the moments between it and its chord. */
function addChord({ edges, start }: Bundles, k: number, frame: Frame): void {
  const { ends } = edges
  const { cos, sin } = frame
  const first = 4 * start[k]
  const last = 4 * (start[k + 1] - 1) + 2
  const x0 = ends[first] - frame.x
  const y0 = ends[first + 1] - frame.y
  const x1 = ends[last] - frame.x
  const y1 = ends[last + 1] - frame.y
  addLine(x0 * cos + y0 * sin, y0 * cos - x0 * sin, x1 * cos + y1 * sin, y1 * cos - x1 * sin)
}

let bottoms = new Float64Array(0)
let tops = new Float64Array(0)

/** Lowest and highest v that the box of each run reaches in the frame, into `bottoms` and `tops`. */
function spanRuns({ boxes, count }: Bundles, { x, y, cos, sin }: Frame): void {
  if (bottoms.length < count) {
    bottoms = new Float64Array(count)
    tops = new Float64Array(count)
  }
  for (let k = 0; k < count; k++) {
    const minX = boxes[4 * k]
    const minY = boxes[4 * k + 1]
    const maxX = boxes[4 * k + 2]
    const maxY = boxes[4 * k + 3]
    const middle = (0.5 * (minY + maxY) - y) * cos - (0.5 * (minX + maxX) - x) * sin
    const half = 0.5 * ((maxY - minY) * Math.abs(cos) + (maxX - minX) * Math.abs(sin))
    bottoms[k] = middle - half
    tops[k] = middle + half
  }
}

const whole = new Float64Array(6)

/** Area, first moments and second moment of the metal above v = c, about the frame's origin; exact for every kind of edge. */
export function above(bundles: Bundles, frame: Frame, c: number): Above {
  const { edges, count, start, closed, segments } = bundles
  const sums = [newSum(), newSum(), newSum(), newSum(), newSum()]
  const turnedLater = [newSum(), newSum(), newSum(), newSum(), newSum(), newSum()]
  spanRuns(bundles, frame)
  for (let k = 0; k < count; k++) {
    if (tops[k] < c) continue
    if (bottoms[k] > c && closed[k]) {
      for (let j = 0; j < 6; j++) add(turnedLater[j], segments[6 * k + j])
      continue
    }
    part.fill(0)
    if (bottoms[k] > c) {
      addChord(bundles, k, frame)
      addTurned(bundles, segments, 6 * k, frame)
    } else for (let i = start[k]; i < start[k + 1]; i++) addEdgeAbove(edges, i, frame, c)
    for (let j = 0; j < 5; j++) add(sums[j], part[j])
  }
  part.fill(0)
  for (let j = 0; j < 6; j++) whole[j] = sumOf(turnedLater[j])
  addTurned(bundles, whole, 0, frame)
  for (let j = 0; j < 5; j++) add(sums[j], part[j])
  const [area, u, v, vv, width] = sums.map(sumOf)
  return { area, u, v, vv, width }
}

/**
 * The height c of the line v = c that halves the area: Newton's steps (the area above falls by width × dc), kept in a bracket.
 * Runs that the bracket has left behind are settled and not looked at again.
 */
export function halfAreaHeight(bundles: Bundles, frame: Frame, minV: number, maxV: number): number {
  const { edges, count, start, closed, segments, moments } = bundles
  let active = Uint32Array.from({ length: count }, (_, k) => k)
  const settled = newSum()
  let low = minV
  let high = maxV
  let c = low < 0 && high > 0 ? 0 : 0.5 * (low + high)
  const addWhole = (sum: Sum, k: number) => {
    add(sum, segments[6 * k + AREA])
    if (closed[k]) return
    part.fill(0)
    addChord(bundles, k, frame)
    add(sum, part[0])
  }
  spanRuns(bundles, frame)
  for (let step = 0; step < 200; step++) {
    const area = { ...settled }
    let width = 0
    for (const k of active) {
      if (tops[k] < c) continue
      if (bottoms[k] > c) {
        addWhole(area, k)
        continue
      }
      part.fill(0)
      for (let i = start[k]; i < start[k + 1]; i++) addEdgeAbove(edges, i, frame, c)
      add(area, part[0])
      width += part[WIDTH]
    }
    const excess = sumOf(area) - 0.5 * moments.area
    if (excess > 0) low = c
    else high = c
    if (Math.abs(excess) <= 2e-14 * moments.area || high - low <= 1e-15 * (maxV - minV)) break
    let kept = 0
    for (const k of active) {
      if (bottoms[k] > high) addWhole(settled, k)
      else if (tops[k] >= low) active[kept++] = k
    }
    active = active.subarray(0, kept)
    const newton = c + excess / width
    const next = newton > low && newton < high ? newton : 0.5 * (low + high)
    if (next === c) break
    c = next
  }
  return c
}
