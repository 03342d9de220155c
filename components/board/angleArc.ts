import { type Annotations, along, clearance, emptyAnnotations, left, lineTo, moveTo, px, textLabel } from './annotation'
import { type DrawingPoint, directionOnScreen, toScreen, type View } from './view'

/** The arc from +x to axis 1 with its angle, `radius` px around the centroid. */
export function angleArc(view: View, centroid: DrawingPoint, degrees: number, radius: number, text: string): Annotations {
  if (Math.abs(degrees) < 0.05) return emptyAnnotations()
  const c = toScreen(view, centroid)
  const angle = (degrees * Math.PI) / 180
  const from = along(c, directionOnScreen(0), radius)
  const to = along(c, directionOnScreen(angle), radius)
  const turnsLeft = degrees > 0 ? 0 : 1
  const turn = Math.sign(degrees)
  const reaches = [radius - 12, radius - 34, radius + 34, radius + 60, radius / 2]
  const places = (size: { width: number; height: number }) =>
    [5, 12].flatMap((room) =>
      reaches.flatMap((t) =>
        [
          { ray: directionOnScreen(angle), side: turn },
          { ray: directionOnScreen(0), side: -turn },
        ].map(({ ray, side }) => along(along(c, ray, t), left(ray), side * (clearance(size, left(ray)) + room))),
      ),
    )
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
  const west = { x: c.x - r, y: c.y }
  const turns = Array.from({ length: 25 }, (_, k) => along(c, directionOnScreen((k * Math.PI) / 12), r))
  const places = (size: { width: number; height: number }) =>
    [4, 12, 20, 28, 2, 6, 10, 14, 18, 22, 26, 30, 0, 8, 16, 24].flatMap((k) => {
      const ray = directionOnScreen((k * Math.PI) / 16)
      const away = clearance(size, ray) + 6
      return [along(c, ray, r + away), along(c, ray, r - away)]
    })
  const d = `${moveTo(west)}A${px(r)} ${px(r)} 0 1 0 ${px(c.x + r)} ${px(c.y)}A${px(r)} ${px(r)} 0 1 0 ${px(west.x)} ${px(west.y)}`
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
