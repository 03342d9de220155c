import { markRadius } from './marks'
import type { BoardMark, BoardOutline } from './model'
import { distanceTo, holds } from './polyline'
import { type Box, type DrawingPoint, type ScreenPoint, toScreen, type View, within } from './view'

const areaOf = (box: Box) => (box.maxX - box.minX) * (box.maxY - box.minY)

/**
 * The outline under a point: the nearest one within `reach` (mm), else the smallest that holds the
 * point; null where there is none.
 */
export function outlineAt(outlines: BoardOutline[], p: DrawingPoint, reach: number): BoardOutline | null {
  let nearest: BoardOutline | null = null
  let least = reach
  let around: BoardOutline | null = null
  for (const outline of outlines) {
    if (!within(outline.box, p, reach)) continue
    const distance = distanceTo(outline.polyline, p)
    if (distance <= least) {
      least = distance
      nearest = outline
    } else if (holds(outline.polyline, p) && (!around || areaOf(outline.box) < areaOf(around.box))) {
      around = outline
    }
  }
  return nearest ?? around
}

/** How near a finding's ring or its middle must be pressed, px. */
const RING_REACH = 6

/** The finding whose ring, or whose middle, lies under a point of the board; the smallest of several. */
export function markAt(marks: readonly BoardMark[], p: ScreenPoint, view: View): BoardMark | null {
  let found: BoardMark | null = null
  for (const mark of marks) {
    const middle = toScreen(view, mark.at)
    const distance = Math.hypot(p.x - middle.x, p.y - middle.y)
    const pressed = distance <= 2 * RING_REACH || Math.abs(distance - markRadius(mark, view)) <= RING_REACH
    if (pressed && (!found || mark.size < found.size)) found = mark
  }
  return found
}

/** The outlines that lie wholly in the window between two opposite corners. */
export function outlinesWithin(outlines: readonly BoardOutline[], a: DrawingPoint, b: DrawingPoint): BoardOutline[] {
  const [minX, maxX, minY, maxY] = [Math.min(a.x, b.x), Math.max(a.x, b.x), Math.min(a.y, b.y), Math.max(a.y, b.y)]
  return outlines.filter(({ box }) => box.minX >= minX && box.maxX <= maxX && box.minY >= minY && box.maxY <= maxY)
}
