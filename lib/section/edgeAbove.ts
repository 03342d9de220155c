import { type EdgeTable, LINE } from '../geometry/edges'
import { addSegment, curvePoint, loadCurve, newCurve, newCurvePoint, reachOf, turnsInV } from './curve'
import type { Frame } from './frame'
import { AREA, U, V, VV } from './momentArray'

/** ∮u dv, ∮½u² dv, ∮u v dv, ∮u v² dv along what lies above; the closing line along v = c adds nothing (dv = 0 on it). */
export const part = new Float64Array(5)
/** place of the signed sum of crossings, which is the width of metal along the line */
export const WIDTH = 4

/** Adds a straight piece that lies above the line. */
export function addLine(u0: number, v0: number, u1: number, v1: number): void {
  const d = v1 - v0
  part[0] += (d * (u0 + u1)) / 2
  part[1] += (d * (u0 * u0 + u0 * u1 + u1 * u1)) / 6
  part[2] += (d * (u0 * (2 * v0 + v1) + u1 * (v0 + 2 * v1))) / 6
  part[3] += (d * (u0 * (3 * v0 * v0 + 2 * v0 * v1 + v1 * v1) + u1 * (v0 * v0 + 2 * v0 * v1 + 3 * v1 * v1))) / 12
}

/** Moments of a segment on their way into `part`. */
export const segment = new Float64Array(6)

export function addMoments(): void {
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
export function addEdgeAbove(edges: EdgeTable, i: number, { x, y, cos, sin }: Frame, c: number): void {
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
