import { difference, product, rootsOf } from '../geometry/bernstein'
import { turning } from '../geometry/bezierXy'
import { ARC, type EdgeTable, LINE, type Point } from '../geometry/edges'
import type { Bundles } from './bundles'
import { type Curve, curvePoint, loadCurve, newCurve, newCurvePoint, reachOf } from './curve'

/** A point of the boundary: at parameter t of curved edge `edge`, or a joint (edge −1). */
export interface BoundaryPoint extends Point {
  edge: number
  t: number
}

const curve = newCurve()
const point = newCurvePoint()
const SAMPLES = 32

/** The one peak of a circular arc: where the line from the origin through its centre leaves it. */
function arcPeaks({ ku, kv, eu, ev, fu, fv, from, to }: Curve): number[] {
  const cosTo = Math.cos(to)
  const cu = ku - eu * cosTo
  const cv = kv - ev * cosTo
  const t = Math.atan2(cu * fu + cv * fv, cu * eu + cv * ev)
  return Math.abs(t) < Math.abs(to - from) / 2 ? [t] : []
}

/** Growth of u² + v² along the curve: its zeros are nearest and farthest points. */
function growth(t: number): number {
  curvePoint(curve, t, point)
  return point.u * point.du + point.v * point.dv
}

/** Parameters where u² + v² may be greatest along an elliptical arc: falls of its growth, bracketed by samples, then halved. */
function ellipsePeaks({ from, to }: Curve): number[] {
  const sign = Math.sign(to - from)
  const peaks: number[] = []
  let before = sign * growth(from)
  for (let k = 1; k <= SAMPLES; k++) {
    const t = from + ((to - from) * k) / SAMPLES
    const now = sign * growth(t)
    if (before > 0 && now <= 0) {
      let low = from + ((to - from) * (k - 1)) / SAMPLES
      let high = t
      for (let step = 0; step < 52; step++) {
        const middle = 0.5 * (low + high)
        if (sign * growth(middle) > 0) low = middle
        else high = middle
      }
      peaks.push(0.5 * (low + high))
    }
    before = now
  }
  return peaks
}

/** The same for a Bézier piece: roots of the derivative of (u² + v²)/w² in Bernstein form. */
function bezierPeaks({ controls, ku, kv }: Curve): number[] {
  if (!controls) return []
  const w = Array.from(controls.w)
  const u = w.map((weight, j) => controls.u[j] + ku * weight)
  const v = w.map((weight, j) => controls.v[j] + kv * weight)
  const minusV = product(v, v).map((value) => -value)
  const square = difference(product(u, u), minusV)
  return rootsOf(turning(square, { x: square, y: square, w: product(w, w), rational: controls.rational }))
}

interface Far extends BoundaryPoint {
  square: number
}

function farByEdges(edges: EdgeTable, from: number, to: number, x: number, y: number, far: Far): void {
  const { ends, kind } = edges
  const frame = { x, y, cos: 1, sin: 0 }
  const take = (u: number, v: number, edge: number, t: number): void => {
    const square = u * u + v * v
    if (square <= far.square) return
    far.square = square
    far.x = x + u
    far.y = y + v
    far.edge = edge
    far.t = t
  }
  for (let i = from; i < to; i++) {
    take(ends[4 * i] - x, ends[4 * i + 1] - y, -1, 0)
    if (kind[i] === LINE) continue
    loadCurve(edges, i, frame, curve)
    if (Math.hypot(curve.ku, curve.kv) + reachOf(curve) <= Math.sqrt(far.square)) continue
    for (const t of curve.controls ? bezierPeaks(curve) : kind[i] === ARC ? arcPeaks(curve) : ellipsePeaks(curve)) {
      curvePoint(curve, t, point)
      take(point.u, point.v, i, t)
    }
  }
}

/** The point of the boundary farthest from (x, y); runs whose box lies nearer than what is found are passed over. */
export function farthest({ edges, count, start, boxes }: Bundles, { x, y }: Point): Far {
  const far: Far = { x, y, edge: -1, t: 0, square: 0 }
  for (let k = 0; k < count; k++) {
    const u = Math.max(x - boxes[4 * k], boxes[4 * k + 2] - x)
    const v = Math.max(y - boxes[4 * k + 1], boxes[4 * k + 3] - y)
    if (u * u + v * v > far.square) farByEdges(edges, start[k], start[k + 1], x, y, far)
  }
  return far
}

/** The peak of the distance from (x, y) next to a known one on the same curve, by secant steps; joints stay. */
export function peakNear(edges: EdgeTable, known: BoundaryPoint, { x, y }: Point): BoundaryPoint {
  if (known.edge < 0) return known
  loadCurve(edges, known.edge, { x, y, cos: 1, sin: 0 }, curve)
  const low = Math.min(curve.from, curve.to)
  const high = Math.max(curve.from, curve.to)
  let before = known.t + 1e-5 * (high - low)
  let growthBefore = growth(before)
  let { t } = known
  for (let step = 0; step < 12; step++) {
    const now = growth(t)
    if (now === growthBefore) break
    const next = Math.min(high, Math.max(low, t - (now * (t - before)) / (now - growthBefore)))
    before = t
    growthBefore = now
    t = next
    if (Math.abs(t - before) <= 1e-16 * (high - low)) break
  }
  curvePoint(curve, t, point)
  return { x: x + point.u, y: y + point.v, edge: known.edge, t }
}
