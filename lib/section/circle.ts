import type { Point } from '../geometry/edges'
import { type Bundles, boxOf } from './bundles'
import { circleLeverage } from './circleLeverage'
import { type Circle, circleThrough, enclosingCircle, type HeldCircle } from './enclosingCircle'
import { type BoundaryPoint, farthest, peakNear } from './farthest'

/**
 * The circle held by the peaks of the same curves as seen from `centre`: at the true centre it is its own answer. Points that have
 * run into one peak count once.
 */
function heldFrom(bundles: Bundles, { by, radius }: HeldCircle<BoundaryPoint>, centre: Point): HeldCircle<BoundaryPoint> | null {
  const peaks = by.map((known) => peakNear(bundles.edges, known, centre))
  const apart = peaks.filter((p, i) => peaks.slice(0, i).every((q) => Math.hypot(p.x - q.x, p.y - q.y) > 1e-3 * radius))
  return circleThrough(apart)
}

/**
 * Newton's steps for the centre that its own peaks give back, with a slope from small displacements: the radius of a circle held
 * by smooth curves is flat in its centre, so that a radius right to the last digit leaves the centre only half of them.
 */
function polished(bundles: Bundles, start: HeldCircle<BoundaryPoint>): HeldCircle<BoundaryPoint> {
  if (start.by.every(({ edge }) => edge < 0)) return start
  const h = 1e-5 * start.radius
  let circle = start
  for (let step = 0; step < 6; step++) {
    const { x, y } = circle
    const here = heldFrom(bundles, circle, circle)
    const right = heldFrom(bundles, circle, { x: x + h, y })
    const up = heldFrom(bundles, circle, { x, y: y + h })
    if (!here || !right || !up) return start
    const a = 1 - (right.x - here.x) / h
    const b = -(up.x - here.x) / h
    const c = -(right.y - here.y) / h
    const d = 1 - (up.y - here.y) / h
    const det = a * d - b * c
    const dx = (d * (here.x - x) - b * (here.y - y)) / det
    const dy = (a * (here.y - y) - c * (here.x - x)) / det
    if (!(Math.hypot(dx, dy) < 0.01 * start.radius)) return start
    const next = heldFrom(bundles, here, { x: x + dx, y: y + dy })
    if (!next) return start
    circle = { ...next, x: x + dx, y: y + dy }
    if (Math.hypot(dx, dy) <= 1e-14 * start.radius) break
  }
  return circle
}

/**
 * Circumscribing circle: the smallest circle round the region. The smallest circle round a few boundary points grows by the
 * boundary's farthest point from its centre until nothing lies outside; then its points of contact are made exact. The radius
 * given reaches the farthest point. With it, how far its centre answers to its points of contact.
 */
export function circumscribingCircle(bundles: Bundles): { circle: Circle; leverage: number } {
  const { minX, minY, maxX, maxY } = boxOf(bundles)
  const points: BoundaryPoint[] = [farthest(bundles, { x: 0.5 * (minX + maxX), y: 0.5 * (minY + maxY) })]
  points.push(farthest(bundles, points[0]))
  let held = enclosingCircle(points)
  for (let step = 0; step < 100; step++) {
    const far = farthest(bundles, held)
    if (Math.sqrt(far.square) <= held.radius * (1 + 1e-13)) break
    points.push(far)
    const next = enclosingCircle(points)
    if (next.radius <= held.radius) break
    held = next
  }
  const best = polished(bundles, held)
  const reachOf = (centre: Point) => Math.sqrt(farthest(bundles, centre).square)
  const found = reachOf(best) <= reachOf(held) * (1 + 1e-14) ? best : held
  const { x, y } = found
  return { circle: { x, y, radius: reachOf(found) }, leverage: circleLeverage(found) }
}
