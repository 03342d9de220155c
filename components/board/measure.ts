import type { DrawingPoint } from './view'

/** What two points say, mm and degrees (counter-clockwise from +x, in (−180, 180]). */
export interface Measured {
  distance: number
  dx: number
  dy: number
  /** null where the points coincide */
  angle: number | null
}

export function measured(a: DrawingPoint, b: DrawingPoint): Measured {
  const dx = b.x - a.x
  const dy = b.y - a.y
  const distance = Math.hypot(dx, dy)
  return { distance, dx, dy, angle: distance === 0 ? null : (Math.atan2(dy, dx) * 180) / Math.PI }
}
