'use client'
import { useCallback, useEffect, useRef, useState } from 'react'
import {
  type Box,
  type DrawingPoint,
  fitView,
  type Inset,
  panBy,
  type ScreenPoint,
  type View,
  type Viewport,
  viewOnPlace,
  zoomAt,
  zoomLimits,
} from './view'

/** How long after the last movement the labels look for better places, ms. */
const SETTLE = 140

export interface ViewControl {
  view: View
  /** true while the view is being moved */
  moving: boolean
  pan: (dx: number, dy: number) => void
  zoom: (at: ScreenPoint, factor: number) => void
  fit: () => void
  goTo: (at: DrawingPoint, size: number) => void
}

const middleOf = (box: Box) => ({ x: (box.minX + box.maxX) / 2, y: (box.minY + box.maxY) / 2 })
const sizeOf = (box: Box) => Math.max(box.maxX - box.minX, box.maxY - box.minY)

/** Is it a drawing of another size or at another place, so that the old view shows nothing of use? */
export function isAnother(before: Box, after: Box): boolean {
  const growth = sizeOf(after) / sizeOf(before)
  const a = middleOf(before)
  const b = middleOf(after)
  return !(growth > 0.5 && growth < 2) || Math.hypot(a.x - b.x, a.y - b.y) > sizeOf(before) / 2
}

/** Where the board looks: fitted until somebody moves it. */
export function useView(extents: Box, viewport: Viewport, inset: Inset): ViewControl {
  const [moved, setMoved] = useState<View | null>(null)
  const [moving, setMoving] = useState(false)
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined)
  const [fittedTo, setFittedTo] = useState(extents)
  if (fittedTo !== extents) {
    setFittedTo(extents)
    if (isAnother(fittedTo, extents)) setMoved(null)
  }
  const fitted = fitView(extents, viewport, inset)
  const now = useRef({ fitted, limits: zoomLimits(extents, viewport), viewport })
  useEffect(() => {
    now.current = { fitted, limits: zoomLimits(extents, viewport), viewport }
  })

  const move = useCallback((change: (view: View) => View) => {
    setMoved((view) => change(view ?? now.current.fitted))
    setMoving(true)
    clearTimeout(timer.current)
    timer.current = setTimeout(() => setMoving(false), SETTLE)
  }, [])
  useEffect(() => () => clearTimeout(timer.current), [])

  const pan = useCallback((dx: number, dy: number) => move((view) => panBy(view, dx, dy)), [move])
  const zoom = useCallback(
    (at: ScreenPoint, factor: number) => move((view) => zoomAt(view, at, factor, now.current.limits)),
    [move],
  )
  const fit = useCallback(() => setMoved(null), [])
  const goTo = useCallback(
    (at: DrawingPoint, size: number) => move(() => viewOnPlace(at, size, now.current.viewport, now.current.limits)),
    [move],
  )
  return { view: moved ?? fitted, moving, pan, zoom, fit, goTo }
}
