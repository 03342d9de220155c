import type { BoardOutline } from './model'
import { distanceTo, holds } from './polyline'
import { type Box, type DrawingPoint, within } from './view'

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
