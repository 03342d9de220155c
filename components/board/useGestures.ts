'use client'
import { type PointerEvent, type RefObject, useEffect, useRef } from 'react'
import type { ScreenPoint } from './view'

/** A press that moves less than this is a click, px. */
const CLICK = 4

interface Handlers {
  pan: (dx: number, dy: number) => void
  zoom: (at: ScreenPoint, factor: number) => void
  /** the pointer moved without dragging */
  over: (at: ScreenPoint | null) => void
  click: (at: ScreenPoint) => void
  /** a drag is the tool's: it counts as a click where it begins and one where it ends, and the view stays */
  dragsTool: boolean
}

const middleOf = (points: ScreenPoint[]): ScreenPoint => ({
  x: points.reduce((sum, p) => sum + p.x, 0) / points.length,
  y: points.reduce((sum, p) => sum + p.y, 0) / points.length,
})
const spreadOf = ([a, b]: ScreenPoint[]) => Math.max(Math.hypot(a.x - b.x, a.y - b.y), 1)

/** Drag to move (or to work a tool), wheel to zoom at the cursor, Shift + wheel to move, two fingers to move and zoom. */
export function useGestures(ref: RefObject<SVGSVGElement | null>, handlers: Handlers) {
  const pointers = useRef(new Map<number, ScreenPoint>())
  const start = useRef<{ at: ScreenPoint; dragged: boolean } | null>(null)
  const latest = useRef(handlers)
  useEffect(() => {
    latest.current = handlers
  })

  const place = (event: { clientX: number; clientY: number }): ScreenPoint => {
    const box = ref.current?.getBoundingClientRect()
    return { x: event.clientX - (box?.left ?? 0), y: event.clientY - (box?.top ?? 0) }
  }

  useEffect(() => {
    const svg = ref.current
    if (!svg) return
    const onWheel = (event: WheelEvent) => {
      event.preventDefault()
      const line = event.deltaMode === 1 ? 16 : 1
      const sideways = event.shiftKey ? event.deltaX || event.deltaY : event.deltaX
      if (event.shiftKey || (!event.ctrlKey && Math.abs(event.deltaX) > Math.abs(event.deltaY))) {
        latest.current.pan(-sideways * line, event.shiftKey ? 0 : -event.deltaY * line)
        return
      }
      const box = svg.getBoundingClientRect()
      const at = { x: event.clientX - box.left, y: event.clientY - box.top }
      latest.current.zoom(at, Math.exp(-event.deltaY * line * (event.ctrlKey ? 0.01 : 0.0016)))
    }
    svg.addEventListener('wheel', onWheel, { passive: false })
    return () => svg.removeEventListener('wheel', onWheel)
  }, [ref])

  const onPointerDown = (event: PointerEvent<SVGSVGElement>) => {
    if (event.button > 1) return
    const at = place(event)
    pointers.current.set(event.pointerId, at)
    event.currentTarget.setPointerCapture(event.pointerId)
    start.current = pointers.current.size === 1 ? { at, dragged: false } : null
  }
  const onPointerMove = (event: PointerEvent<SVGSVGElement>) => {
    const at = place(event)
    if (!pointers.current.has(event.pointerId)) {
      if (event.pointerType === 'mouse') latest.current.over(at)
      return
    }
    if (latest.current.dragsTool && start.current) {
      if (!start.current.dragged && Math.hypot(at.x - start.current.at.x, at.y - start.current.at.y) >= CLICK) {
        latest.current.click(start.current.at)
        start.current.dragged = true
      }
      latest.current.over(at)
      return
    }
    const before = [...pointers.current.values()]
    pointers.current.set(event.pointerId, at)
    const after = [...pointers.current.values()]
    const from = middleOf(before)
    const to = middleOf(after)
    if (start.current && !start.current.dragged) {
      if (Math.hypot(at.x - start.current.at.x, at.y - start.current.at.y) < CLICK) return
      latest.current.pan(at.x - start.current.at.x, at.y - start.current.at.y)
      start.current.dragged = true
      return
    }
    latest.current.pan(to.x - from.x, to.y - from.y)
    if (after.length === 2) latest.current.zoom(to, spreadOf(after) / spreadOf(before))
  }
  const onPointerUp = (event: PointerEvent<SVGSVGElement>) => {
    pointers.current.delete(event.pointerId)
    if (start.current && (!start.current.dragged || latest.current.dragsTool)) latest.current.click(place(event))
    start.current = null
  }
  const onPointerCancel = (event: PointerEvent<SVGSVGElement>) => {
    pointers.current.delete(event.pointerId)
    start.current = null
  }
  const onPointerLeave = () => latest.current.over(null)
  return { onPointerDown, onPointerMove, onPointerUp, onPointerCancel, onPointerLeave }
}
