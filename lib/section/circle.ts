import { difference, product, rootsOf } from '../geometry/bernstein'
import { turning } from '../geometry/bezierXy'
import { type EdgeTable, LINE, type Point } from '../geometry/edges'
import { type Bundles, boxOf } from './bundles'
import { type Curve, curvePoint, loadCurve, newCurve, newCurvePoint, reachOf } from './curve'
import { type Circle, enclosingCircle } from './enclosingCircle'

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

interface Far extends Point {
  square: number
}

function farByEdges(edges: EdgeTable, from: number, to: number, x: number, y: number, far: Far): void {
  const { ends, kind } = edges
  const frame = { x, y, cos: 1, sin: 0 }
  const take = (u: number, v: number): void => {
    const square = u * u + v * v
    if (square <= far.square) return
    far.square = square
    far.x = x + u
    far.y = y + v
  }
  for (let i = from; i < to; i++) {
    take(ends[4 * i] - x, ends[4 * i + 1] - y)
    if (kind[i] === LINE) continue
    loadCurve(edges, i, frame, curve)
    if (Math.hypot(curve.ku, curve.kv) + reachOf(curve) <= Math.sqrt(far.square)) continue
    for (const t of curve.controls ? bezierPeaks(curve) : conicPeaks(curve)) {
      curvePoint(curve, t, point)
      take(point.u, point.v)
    }
  }
}

/** The point of the boundary farthest from (x, y); runs whose box lies nearer than what is found are passed over. */
function farthest({ edges, count, start, boxes }: Bundles, x: number, y: number): Far {
  const far: Far = { x, y, square: 0 }
  for (let k = 0; k < count; k++) {
    const u = Math.max(x - boxes[4 * k], boxes[4 * k + 2] - x)
    const v = Math.max(y - boxes[4 * k + 1], boxes[4 * k + 3] - y)
    if (u * u + v * v > far.square) farByEdges(edges, start[k], start[k + 1], x, y, far)
  }
  return far
}

/**
 * Circumscribing circle: the smallest circle round the region. The smallest circle round a few boundary points grows by the
 * boundary's farthest point from its centre until nothing lies outside; the radius given reaches that farthest point.
 */
export function circumscribingCircle(bundles: Bundles): Circle {
  const { minX, minY, maxX, maxY } = boxOf(bundles)
  const points: Point[] = [farthest(bundles, 0.5 * (minX + maxX), 0.5 * (minY + maxY))]
  points.push(farthest(bundles, points[0].x, points[0].y))
  let circle = enclosingCircle(points)
  for (let step = 0; step < 100; step++) {
    const far = farthest(bundles, circle.x, circle.y)
    const distance = Math.sqrt(far.square)
    if (distance <= circle.radius * (1 + 1e-13)) break
    points.push(far)
    const next = enclosingCircle(points)
    if (next.radius <= circle.radius) return { ...circle, radius: distance }
    circle = next
  }
  return circle
}
