import type { Segment } from './labels'
import { toScreen, type View, type Viewport } from './view'

/** Outlines with more corners than this in all are not looked at: labels keep their clear edge anyway. */
const CORNERS = 1500

/** The metal's edges as far as they are in view, for labels to step aside from, px. */
export function outlineSegments(outlines: { polyline: Float64Array }[], view: View, { width, height }: Viewport): Segment[] {
  const corners = outlines.reduce((sum, { polyline }) => sum + polyline.length / 2, 0)
  if (corners > CORNERS) return []
  const segments: Segment[] = []
  for (const { polyline } of outlines) {
    for (let i = 0; i + 3 < polyline.length; i += 2) {
      const a = toScreen(view, { x: polyline[i], y: polyline[i + 1] })
      const b = toScreen(view, { x: polyline[i + 2], y: polyline[i + 3] })
      const outside =
        Math.max(a.x, b.x) < 0 || Math.min(a.x, b.x) > width || Math.max(a.y, b.y) < 0 || Math.min(a.y, b.y) > height
      if (!outside) segments.push({ a, b })
    }
  }
  return segments
}
