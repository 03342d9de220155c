'use client'
import { type Dispatch, type PointerEvent, useRef } from 'react'
import { AnnotationLayer } from './AnnotationLayer'
import type { Axis } from './axesOf'
import { drawAxis } from './axisLines'
import type { BoardAction, BoardState } from './boardState'
import type { BoardModel } from './model'
import { directionOnScreen, type ScreenPoint, toDrawing, toScreen, type View, type Viewport } from './view'

/** The handle that turns the axis stands this far from the one that moves it, px. */
const ARM = 90

interface Props {
  model: BoardModel
  state: BoardState
  dispatch: Dispatch<BoardAction>
  view: View
  viewport: Viewport
}

/** An axis that the person placed: drag its square to move it, its ring to turn it. */
export function UserAxisLayer({ model, state, dispatch, view, viewport }: Props) {
  const drag = useRef<'move' | 'turn' | null>(null)
  const { axis } = state
  if (!axis) return null
  const centre = toScreen(view, axis.through)
  const d = directionOnScreen(axis.angle)
  const handle = { x: centre.x + ARM * d.x, y: centre.y + ARM * d.y }
  const set = (next: Axis, step: boolean) => dispatch({ do: 'axis', axis: next, step })

  const place = (event: PointerEvent<SVGElement>): ScreenPoint => {
    const box = event.currentTarget.ownerSVGElement?.getBoundingClientRect()
    return { x: event.clientX - (box?.left ?? 0), y: event.clientY - (box?.top ?? 0) }
  }
  const begin = (what: 'move' | 'turn') => (event: PointerEvent<SVGElement>) => {
    event.stopPropagation()
    event.currentTarget.setPointerCapture(event.pointerId)
    drag.current = what
    set(axis, true)
  }
  const follow = (event: PointerEvent<SVGElement>) => {
    if (!drag.current) return
    event.stopPropagation()
    const at = toDrawing(view, place(event))
    if (drag.current === 'move') set({ ...axis, through: at }, false)
    else set({ ...axis, angle: Math.atan2(at.y - axis.through.y, at.x - axis.through.x) }, false)
  }
  const end = (event: PointerEvent<SVGElement>) => {
    if (drag.current) event.stopPropagation()
    drag.current = null
  }
  const handlers = { onPointerMove: follow, onPointerUp: end, onPointerCancel: end }
  const drawn = drawAxis(
    { ...axis, id: 'user', look: 'user', text: 'own', textLook: 'user', beyond: 40, arrow: true },
    { view, viewport, extents: model.extents },
  )
  return (
    <g>
      <AnnotationLayer annotations={drawn} choices={{}} />
      <rect
        x={centre.x - 6}
        y={centre.y - 6}
        width={12}
        height={12}
        className="cursor-move fill-sheet stroke-accent"
        strokeWidth={2}
        onPointerDown={begin('move')}
        {...handlers}
      >
        <title>Drag to move the axis</title>
      </rect>
      <circle
        cx={handle.x}
        cy={handle.y}
        r={7}
        className="cursor-grab fill-sheet stroke-accent"
        strokeWidth={2}
        onPointerDown={begin('turn')}
        {...handlers}
      >
        <title>Drag to turn the axis</title>
      </circle>
    </g>
  )
}
