'use client'
import { useEffect, useMemo, useRef } from 'react'
import type { Annotations } from './annotation'
import type { Frame } from './axisLines'
import { placeLabels, type Segment } from './labels'
import type { BoardModel } from './model'
import { toScreen, type View, type Viewport } from './view'

/** Outlines with more corners than this in all are not looked at: labels keep their clear edge anyway. */
const CORNERS = 1500

function outlineSegments(model: BoardModel, view: View, { width, height }: Viewport): Segment[] {
  const corners = model.outlines.reduce((sum, { polyline }) => sum + polyline.length / 2, 0)
  if (corners > CORNERS) return []
  const segments: Segment[] = []
  for (const { polyline } of model.outlines) {
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

/** Where each label stands. While the board moves they keep their side; when it rests they step aside. */
export function useLabels(annotations: Annotations, model: BoardModel, frame: Frame, moving: boolean): Record<string, number> {
  const { view, viewport } = frame
  const placed = useMemo(
    () =>
      moving
        ? null
        : placeLabels(annotations.labels, [...annotations.lines, ...outlineSegments(model, view, viewport)], viewport),
    [annotations, model, view, viewport, moving],
  )
  const last = useRef<Record<string, number>>({})
  useEffect(() => {
    if (placed) last.current = placed
  }, [placed])
  return placed ?? last.current
}
