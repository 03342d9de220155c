/**
 * Axes to measure in: origin (x, y) and u turned counter-clockwise from +x; v is u turned +90°.
 * u = (X − x)·cos + (Y − y)·sin, v = (Y − y)·cos − (X − x)·sin.
 */
export interface Frame {
  x: number
  y: number
  cos: number
  sin: number
}

/** Frame at (x, y) turned by `degrees`, counter-clockwise; exact at multiples of 90°. */
export function frameAt(x: number, y: number, degrees = 0): Frame {
  const quarter = Math.round(degrees / 90)
  const rest = ((degrees - 90 * quarter) * Math.PI) / 180
  const c = Math.cos(rest)
  const s = Math.sin(rest)
  switch (((quarter % 4) + 4) % 4) {
    case 0:
      return { x, y, cos: c, sin: s }
    case 1:
      return { x, y, cos: 0 - s, sin: c }
    case 2:
      return { x, y, cos: 0 - c, sin: 0 - s }
    default:
      return { x, y, cos: s, sin: 0 - c }
  }
}

/** Point of the frame in the drawing's axes. */
export function fromFrame({ x, y, cos, sin }: Frame, u: number, v: number): { x: number; y: number } {
  return { x: x + u * cos - v * sin, y: y + u * sin + v * cos }
}
