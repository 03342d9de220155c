import type { Point } from '@/lib/geometry/edges'

/** A point of the drawing: mm, x right, y up. */
export type DrawingPoint = Point & { readonly space?: 'drawing' }
/** A point of the board: px from its top left corner, y down. */
export type ScreenPoint = Point & { readonly space?: 'screen' }

export interface Box {
  minX: number
  minY: number
  maxX: number
  maxY: number
}
/** Does the box, grown by `reach`, hold the point? */
export const within = (box: Box, p: Point, reach: number) =>
  p.x >= box.minX - reach && p.x <= box.maxX + reach && p.y >= box.minY - reach && p.y <= box.maxY + reach

export interface Viewport {
  width: number
  height: number
}
/** Room that stays free around what is fitted, px. */
export interface Inset {
  top: number
  right: number
  bottom: number
  left: number
}

/** px per mm, and where the drawing's origin lies on the board, px. */
export interface View {
  scale: number
  x: number
  y: number
}

export const drawingPoint = (x: number, y: number): DrawingPoint => ({ x, y })
export const screenPoint = (x: number, y: number): ScreenPoint => ({ x, y })

export function toScreen(view: View, p: DrawingPoint): ScreenPoint {
  return screenPoint(view.x + view.scale * p.x, view.y - view.scale * p.y)
}

export function toDrawing(view: View, p: ScreenPoint): DrawingPoint {
  return drawingPoint((p.x - view.x) / view.scale, (view.y - p.y) / view.scale)
}

/** A direction of the drawing (angle in rad, counter-clockwise from +x) as a unit vector on the board. */
export function directionOnScreen(angle: number): ScreenPoint {
  return screenPoint(Math.cos(angle), -Math.sin(angle))
}

/** The SVG transform that puts a path written about `origin` (mm, y down, as svgPath writes them) on the board. */
export function transformOf(view: View, origin: DrawingPoint): string {
  const { x, y } = toScreen(view, origin)
  return `translate(${x} ${y}) scale(${view.scale})`
}

/** What of the drawing the board shows. */
export function visibleBox(view: View, viewport: Viewport): Box {
  const a = toDrawing(view, screenPoint(0, viewport.height))
  const b = toDrawing(view, screenPoint(viewport.width, 0))
  return { minX: a.x, minY: a.y, maxX: b.x, maxY: b.y }
}

/** The view that shows the box as large as the viewport allows, in the middle of what the inset leaves free. */
export function fitView(box: Box, viewport: Viewport, inset: Inset): View {
  const width = Math.max(viewport.width - inset.left - inset.right, 20)
  const height = Math.max(viewport.height - inset.top - inset.bottom, 20)
  const wide = Math.max(box.maxX - box.minX, 1e-9)
  const high = Math.max(box.maxY - box.minY, 1e-9)
  const scale = Math.min(width / wide, height / high)
  return {
    scale,
    x: inset.left + width / 2 - (scale * (box.minX + box.maxX)) / 2,
    y: inset.top + height / 2 + (scale * (box.minY + box.maxY)) / 2,
  }
}

export function panBy(view: View, dx: number, dy: number): View {
  return { ...view, x: view.x + dx, y: view.y + dy }
}

/** The view `factor` times larger; what lies under `at` stays there. */
export function zoomAt(view: View, at: ScreenPoint, factor: number, limits: { min: number; max: number }): View {
  const scale = Math.min(Math.max(view.scale * factor, limits.min), limits.max)
  const k = scale / view.scale
  return { scale, x: at.x - k * (at.x - view.x), y: at.y - k * (at.y - view.y) }
}

/** A place of the drawing brought to the middle, `size` mm of it filling about a third of the viewport. */
export function viewOnPlace(at: DrawingPoint, size: number, viewport: Viewport, limits: { min: number; max: number }): View {
  const wanted = Math.min(viewport.width, viewport.height) / (3 * size)
  const scale = Math.min(Math.max(wanted, limits.min), limits.max)
  return { scale, x: viewport.width / 2 - scale * at.x, y: viewport.height / 2 + scale * at.y }
}

/** How far one may zoom out of and into a drawing of this size. */
export function zoomLimits(box: Box, viewport: Viewport): { min: number; max: number } {
  const size = Math.max(box.maxX - box.minX, box.maxY - box.minY, 1e-9)
  const fit = Math.min(viewport.width, viewport.height) / size
  return { min: fit / 10, max: fit * 20_000 }
}
