import { type Annotations, along, emptyAnnotations, lineTo, moveTo, px, textLabel } from './annotation'
import { type DrawingPoint, directionOnScreen, toScreen, type View } from './view'

/** The arc from +x to axis 1 with its angle, `radius` px around the centroid. */
export function angleArc(view: View, centroid: DrawingPoint, degrees: number, radius: number, text: string): Annotations {
  if (Math.abs(degrees) < 0.05) return emptyAnnotations()
  const c = toScreen(view, centroid)
  const angle = (degrees * Math.PI) / 180
  const from = along(c, directionOnScreen(0), radius)
  const to = along(c, directionOnScreen(angle), radius)
  const turnsLeft = degrees > 0 ? 0 : 1
  const middle = directionOnScreen(angle / 2)
  const beyond = (side: number, r: number) => along(c, directionOnScreen(side), r)
  const places = [
    along(c, middle, radius + 30),
    along(c, middle, radius - 26),
    ...[0.18, -0.18, 0.3, -0.3, 0.45, -0.45].flatMap((turn) => [
      beyond(angle + Math.sign(degrees) * turn, radius + 12),
      beyond(-Math.sign(degrees) * Math.abs(turn), radius + 12),
      beyond(angle + Math.sign(degrees) * turn, radius + 60),
      beyond(-Math.sign(degrees) * Math.abs(turn), radius + 60),
    ]),
  ]
  const steps = 6
  const points = Array.from({ length: steps + 1 }, (_, k) => along(c, directionOnScreen((k * angle) / steps), radius))
  return {
    strokes: [
      { id: 'angle', look: 'angle', d: `${moveTo(from)}A${px(radius)} ${px(radius)} 0 0 ${turnsLeft} ${px(to.x)} ${px(to.y)}` },
    ],
    labels: [textLabel({ id: 'angle', text, look: 'principal', places, size: 13, mono: true })],
    lines: points.slice(1).map((b, k) => ({ a: points[k], b })),
  }
}

/** A circle with its diameter written beside it. */
export function circleWithDiameter(
  view: View,
  centre: DrawingPoint,
  radius: number,
  text: string,
  look: 'circle' | 'hot',
): Annotations {
  const c = toScreen(view, centre)
  const r = radius * view.scale
  const left = { x: c.x - r, y: c.y }
  const turns = Array.from({ length: 25 }, (_, k) => along(c, directionOnScreen((k * Math.PI) / 12), r))
  const places = [0.25, 0.75, -0.25, -0.75, 0.15, 0.85].map((turn) => along(c, directionOnScreen(turn * Math.PI), r + 30))
  const d = `${moveTo(left)}A${px(r)} ${px(r)} 0 1 0 ${px(c.x + r)} ${px(c.y)}A${px(r)} ${px(r)} 0 1 0 ${px(left.x)} ${px(left.y)}`
  const cross = `${moveTo({ x: c.x - 5, y: c.y })}${lineTo({ x: c.x + 5, y: c.y })}${moveTo({ x: c.x, y: c.y - 5 })}${lineTo({ x: c.x, y: c.y + 5 })}`
  return {
    strokes: [
      { id: 'circle', look, d },
      { id: 'circle-centre', look, d: cross, mark: 'open' },
    ],
    labels: [textLabel({ id: 'circle', text, look: look === 'hot' ? 'principal' : 'dimension', places, mono: true })],
    lines: turns.slice(1).map((b, k) => ({ a: turns[k], b })),
  }
}
