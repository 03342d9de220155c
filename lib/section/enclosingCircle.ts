import type { Point } from '../geometry/edges'

export interface Circle {
  x: number
  y: number
  radius: number
}

/** A circle and the points (two or three, or one alone) that hold it. */
export interface HeldCircle<P extends Point> extends Circle {
  by: P[]
}

function throughTwo<P extends Point>(a: P, b: P): HeldCircle<P> {
  return { x: 0.5 * (a.x + b.x), y: 0.5 * (a.y + b.y), radius: 0.5 * Math.hypot(a.x - b.x, a.y - b.y), by: [a, b] }
}

function throughThree<P extends Point>(a: P, b: P, c: P): HeldCircle<P> | null {
  const bx = b.x - a.x
  const by = b.y - a.y
  const cx = c.x - a.x
  const cy = c.y - a.y
  const twice = 2 * (bx * cy - by * cx)
  if (twice === 0) return null
  const bb = bx * bx + by * by
  const cc = cx * cx + cy * cy
  const ux = (cy * bb - by * cc) / twice
  const uy = (bx * cc - cx * bb) / twice
  return { x: a.x + ux, y: a.y + uy, radius: Math.hypot(ux, uy), by: [a, b, c] }
}

/** The circle through two or three points (two: their chord is a diameter); null where three lie on a line. */
export function circleThrough<P extends Point>(points: readonly P[]): HeldCircle<P> | null {
  const [a, b, c] = points
  return points.length === 3 ? throughThree(a, b, c) : points.length === 2 ? throughTwo(a, b) : null
}

const outside = (circle: Circle, p: Point): boolean => Math.hypot(p.x - circle.x, p.y - circle.y) > circle.radius * (1 + 1e-14)

/**
 * Smallest circle round a few points. Source: E. Welzl, Smallest enclosing disks, 1991, in its iterative form (from memory);
 * points are taken in the order given, so the answer is the same every time.
 */
export function enclosingCircle<P extends Point>(points: readonly P[]): HeldCircle<P> {
  let circle: HeldCircle<P> = { x: points[0].x, y: points[0].y, radius: 0, by: [points[0]] }
  for (let i = 1; i < points.length; i++) {
    if (!outside(circle, points[i])) continue
    circle = { x: points[i].x, y: points[i].y, radius: 0, by: [points[i]] }
    for (let j = 0; j < i; j++) {
      if (!outside(circle, points[j])) continue
      circle = throughTwo(points[i], points[j])
      for (let k = 0; k < j; k++) {
        if (outside(circle, points[k])) circle = throughThree(points[i], points[j], points[k]) ?? circle
      }
    }
  }
  return circle
}
