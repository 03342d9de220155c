import { type EdgeTable, pushArc, pushLine } from '../geometry/edges'

/** A bulge below this bends a chord by less than its last bit. */
const LEAST_BULGE = 1e-15

/**
 * Appends the edge from (x0, y0) to (x1, y1) with bulge b = tan(Δ/4), Δ the sweep (> 0 counter-clockwise):
 * radius c(1 + b²)/(4|b|), centre = middle + left normal · c(1 − b²)/(4b), c the chord
 * (DXF reference of the format's maker). Nothing where the ends coincide.
 */
export function pushBulge(table: EdgeTable, x0: number, y0: number, x1: number, y1: number, b: number, source: number): boolean {
  const dx = x1 - x0
  const dy = y1 - y0
  if (dx === 0 && dy === 0) return false
  if (Math.abs(b) < LEAST_BULGE) {
    pushLine(table, x0, y0, x1, y1, source)
    return true
  }
  const lift = ((1 - b) * (1 + b)) / (4 * b)
  const cx = x0 + dx / 2 - dy * lift
  const cy = y0 + dy / 2 + dx * lift
  const radius = (Math.hypot(dx, dy) * (1 + b * b)) / (4 * Math.abs(b))
  pushArc(table, x0, y0, x1, y1, cx, cy, radius, Math.atan2(y0 - cy, x0 - cx), 4 * Math.atan(b), source)
  return true
}
