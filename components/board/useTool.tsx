'use client'
import { type Dispatch, type KeyboardEvent, type ReactNode, useMemo, useState } from 'react'
import type { Writing } from './annotate'
import type { BoardAction, BoardState } from './boardState'
import type { Segment } from './labels'
import { MeasureLayer } from './MeasureLayer'
import { MeasureReadout } from './MeasureReadout'
import type { BoardModel } from './model'
import { type Snapped, snapperOf } from './snapper'
import { UserAxisLayer } from './UserAxisLayer'
import { WindowLayer } from './WindowLayer'
import { type DrawingPoint, type ScreenPoint, toDrawing, toScreen, type View, type Viewport } from './view'

/** How near a point must be to be snapped to, px. */
const REACH = 12
const STEP = 12

interface Options {
  model: BoardModel
  state: BoardState
  dispatch: Dispatch<BoardAction>
  view: View
  viewport: Viewport
  writing: Writing
  /** what is drawn already and no figure may lie on */
  lines: Segment[]
  onWindow?: (a: DrawingPoint, b: DrawingPoint) => void
}

interface ToolControl {
  over: (at: ScreenPoint | null) => void
  click: (at: ScreenPoint) => void
  key: (event: KeyboardEvent) => boolean
  layer: ReactNode
  readout: ReactNode
}

const ARROWS: Record<string, [number, number]> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, -1],
  ArrowDown: [0, 1],
}

/** The tool in hand: where its pointer is, what a click and a key do, what it draws. */
export function useTool({ model, state, dispatch, view, viewport, writing, lines, onWindow }: Options): ToolControl {
  const snapper = useMemo(() => snapperOf(model.region), [model.region])
  const [pointer, setPointer] = useState<ScreenPoint | null>(null)
  const snapped: Snapped | null = pointer && snapper(toDrawing(view, pointer), REACH / view.scale)

  const corner = (at: DrawingPoint) => {
    const [first] = state.points
    dispatch(first ? { do: 'tool', tool: 'window' } : { do: 'point', at })
    if (first) onWindow?.(first, at)
  }
  const place = (at: ScreenPoint) => {
    if (state.tool === 'window') return corner(toDrawing(view, at))
    const point = snapper(toDrawing(view, at), REACH / view.scale).at
    if (state.tool === 'measure') dispatch({ do: 'point', at: point })
    else dispatch({ do: 'axis', axis: { through: point, angle: state.axis?.angle ?? 0 }, step: true })
  }
  const step = (dx: number, dy: number) => {
    const from = snapped ? toScreen(view, snapped.at) : (pointer ?? { x: viewport.width / 2, y: viewport.height / 2 })
    setPointer({ x: from.x + dx, y: from.y + dy })
  }
  const turn = (degrees: number) => {
    if (!state.axis) return
    dispatch({ do: 'axis', axis: { ...state.axis, angle: state.axis.angle + (degrees * Math.PI) / 180 }, step: true })
  }

  return {
    over: setPointer,
    click: (at) => {
      setPointer(at)
      place(at)
    },
    key: (event) => {
      const arrow = ARROWS[event.key]
      const length = event.shiftKey ? 1 : STEP + REACH
      if (arrow) step(arrow[0] * length, arrow[1] * length)
      else if (event.key === 'Enter') place(pointer ?? { x: viewport.width / 2, y: viewport.height / 2 })
      else if (state.tool === 'axis' && event.key === '[') turn(1)
      else if (state.tool === 'axis' && event.key === ']') turn(-1)
      else return false
      return true
    },
    layer: (
      <>
        <UserAxisLayer {...{ model, state, dispatch, view, viewport }} />
        {state.tool === 'window' && <WindowLayer corner={state.points[0] ?? null} pointer={pointer} view={view} />}
        {(state.tool === 'measure' || state.tool === 'axis') && (
          <MeasureLayer points={state.points} pointer={snapped} {...{ view, viewport, lines }} length={writing.length} />
        )}
      </>
    ),
    readout:
      state.tool === 'measure' ? (
        <MeasureReadout points={state.points} pointer={snapped} writing={writing} />
      ) : state.tool === 'axis' ? (
        <p className="text-small text-soft">
          Choose a point, by click or with arrow keys and Enter. Drag the ring to turn the axis, or press [ and ]. Its figures
          stand in the sheet.
        </p>
      ) : state.tool === 'window' ? (
        <p className="text-small text-soft">
          Drag from corner to corner round what you want, or set two corners by click or with arrow keys and Enter. What lies
          wholly inside is taken.
        </p>
      ) : null,
  }
}
