import type { BoardMark } from './model'
import type { ScreenPoint, View } from './view'

/** No finding's ring is drawn smaller than this, px. */
const LEAST_RING = 9

/** Radius of the ring round a finding, px. */
export const markRadius = ({ size }: BoardMark, view: View) => Math.max(LEAST_RING, (size * view.scale) / 2)

/** The mark of a centre of area: a circle with two opposite quarters filled, `r` px. */
export function centroidMark(r: number): { circle: string; quarters: string } {
  return {
    circle: `M${-r} 0A${r} ${r} 0 1 0 ${r} 0A${r} ${r} 0 1 0 ${-r} 0Z`,
    quarters: `M0 0V${-r}A${r} ${r} 0 0 1 ${r} 0ZM0 0V${r}A${r} ${r} 0 0 1 ${-r} 0Z`,
  }
}

/** The mark of the shear centre: a small circle with a cross through it, `r` px. */
export const shearCentreMark = (r: number): string =>
  `M${-r} 0A${r} ${r} 0 1 0 ${r} 0A${r} ${r} 0 1 0 ${-r} 0ZM${-2 * r} 0H${2 * r}M0 ${-2 * r}V${2 * r}`

/** Hatch lines at 45°, `spacing` px apart across a board this large, with one period to spare for moving. */
export function hatchLines(width: number, height: number, spacing: number): string {
  const step = spacing * Math.SQRT2
  const lines: string[] = []
  for (let x = -height - 2 * step; x < width + 2 * step; x += step)
    lines.push(
      `M${x.toFixed(1)} ${(height + step).toFixed(1)}l${(height + 2 * step).toFixed(1)} ${(-height - 2 * step).toFixed(1)}`,
    )
  return lines.join('')
}

/** How far the hatch is shifted so that it stays with the metal while the board moves. */
export function hatchShift(anchor: ScreenPoint, spacing: number): number {
  const step = spacing * Math.SQRT2
  const offset = (anchor.x + anchor.y) % step
  return offset < 0 ? offset + step : offset
}
