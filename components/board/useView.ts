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

/** Where the board looks: fitted until somebody moves it. */
export function useView(extents: Box, viewport: Viewport, inset: Inset): ViewControl {
  const [moved, setMoved] = useState<View | null>(null)
  const [moving, setMoving] = useState(false)
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined)
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
