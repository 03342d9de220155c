'use client'
import { useEffect, useMemo, useRef } from 'react'
import type { Annotations } from './annotation'
import type { Frame } from './axisLines'
import { placeLabels } from './labels'
import type { BoardModel } from './model'
import { outlineSegments } from './outlineSegments'

/** Where each label stands. While the board moves they keep their side; when it rests they step aside. */
export function useLabels(annotations: Annotations, model: BoardModel, frame: Frame, moving: boolean): Record<string, number> {
  const { view, viewport } = frame
  const placed = useMemo(
    () =>
      moving
        ? null
        : placeLabels(annotations.labels, [...annotations.lines, ...outlineSegments(model.outlines, view, viewport)], viewport),
    [annotations, model.outlines, view, viewport, moving],
  )
  const last = useRef<Record<string, number>>({})
  useEffect(() => {
    if (placed) last.current = placed
  }, [placed])
  return placed ?? last.current
}
