import type { Point } from '../geometry/edges'
import type { HeldCircle } from './enclosingCircle'

/**
 * How far the centre of a held circle moves, at most, when each point that holds it moves by 1 along its own radius: 1 for the two
 * ends of a diameter; for three points the rows of the inverse of n·dc + dr = 1. Large where the three lie close to half a turn.
 */
export function circleLeverage({ x, y, by }: HeldCircle<Point>): number {
  if (by.length !== 3) return 1
  const [a, b, c] = by.map((p) => {
    const distance = Math.hypot(p.x - x, p.y - y)
    return { x: (p.x - x) / distance, y: (p.y - y) / distance }
  })
  const det = (b.x - a.x) * (c.y - a.y) - (b.y - a.y) * (c.x - a.x)
  const along = Math.abs(b.y - c.y) + Math.abs(c.y - a.y) + Math.abs(a.y - b.y)
  const across = Math.abs(b.x - c.x) + Math.abs(c.x - a.x) + Math.abs(a.x - b.x)
  return Math.max(1, Math.hypot(along, across) / Math.abs(det))
}
