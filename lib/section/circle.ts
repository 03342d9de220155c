import { difference, product, rootsOf } from '../geometry/bernstein'
import { turning } from '../geometry/bezierXy'
import { type EdgeTable, LINE, type Point } from '../geometry/edges'
import { type Curve, curvePoint, loadCurve, newCurve, newCurvePoint, reachOf } from './curve'
import { type Circle, enclosingCircle } from './enclosingCircle'
import type { Extremes } from './extremes'

const curve = newCurve()
const point = newCurvePoint()
const SAMPLES = 32

/** Parameters where u² + v² may be greatest along an elliptical arc: falls of its derivative, bracketed by samples, then halved. */
function conicPeaks({ from, to }: Curve): number[] {
  const growth = (t: number) => {
    curvePoint(curve, t, point)
    return (point.u * point.du + point.v * point.dv) * Math.sign(to - from)
  }
  const peaks: number[] = []
  let before = growth(from)
  for (let k = 1; k <= SAMPLES; k++) {
    const t = from + ((to - from) * k) / SAMPLES
    const now = growth(t)
    if (before > 0 && now <= 0) {
      let low = from + ((to - from) * (k - 1)) / SAMPLES
      let high = t
      for (let step = 0; step < 52; step++) {
        const middle = 0.5 * (low + high)
        if (growth(middle) > 0) low = middle
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

/** The point of the boundary farthest from (x, y). */
function farthest(edges: EdgeTable, x: number, y: number): Point & { distance: number } {
  const e = edges.ends
  let far = { x, y, distance: 0 }
  let square = 0
  for (let i = 0; i < edges.count; i++) {
    const dx = e[4 * i] - x
    const dy = e[4 * i + 1] - y
    const d = dx * dx + dy * dy
    if (d > square) {
      square = d
      far = { x: e[4 * i], y: e[4 * i + 1], distance: 0 }
    }
  }
  const frame = { x, y, cos: 1, sin: 0 }
  for (let i = 0; i < edges.count; i++) {
    if (edges.kind[i] === LINE) continue
    loadCurve(edges, i, frame, curve)
    if (Math.hypot(curve.ku, curve.kv) + reachOf(curve) <= Math.sqrt(square)) continue
    for (const t of curve.controls ? bezierPeaks(curve) : conicPeaks(curve)) {
      const { u, v } = curvePoint(curve, t, point)
      if (u * u + v * v > square) {
        square = u * u + v * v
        far = { x: x + u, y: y + v, distance: 0 }
      }
    }
  }
  far.distance = Math.sqrt(square)
  return far
}

/**
 * Circumscribing circle: the smallest circle round the region. The smallest circle round a few boundary points grows by the
 * boundary's farthest point from its centre until nothing lies outside; the radius given reaches that farthest point.
 */
export function circumscribingCircle(edges: EdgeTable, { minU, maxU, minV, maxV }: Extremes): Circle {
  const points: Point[] = [farthest(edges, 0.5 * (minU + maxU), 0.5 * (minV + maxV))]
  points.push(farthest(edges, points[0].x, points[0].y))
  let circle = enclosingCircle(points)
  for (let step = 0; step < 100; step++) {
    const far = farthest(edges, circle.x, circle.y)
    if (far.distance <= circle.radius * (1 + 1e-13)) break
    points.push(far)
    const next = enclosingCircle(points)
    if (next.radius <= circle.radius) return { ...circle, radius: far.distance }
    circle = next
  }
  return circle
}
