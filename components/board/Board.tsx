'use client'
import { type Dispatch, type ReactNode, useEffect, useId, useMemo, useRef } from 'react'
import { AnnotationLayer } from './AnnotationLayer'
import { annotate, type Writing } from './annotate'
import type { BoardAction, BoardState } from './boardState'
import { CentroidMark } from './CentroidMark'
import { ShearCentreMark } from './ShearCentreMark'
import { FindingMarks } from './FindingMarks'
import { HotLayer } from './HotLayer'
import { markAt, outlineAt } from './hit'
import type { HoverStore } from './hover'
import { Legend } from './Legend'
import { Metal } from './Metal'
import type { BoardModel } from './model'
import { ShareLayer } from './ShareLayer'
import { Strokes } from './Strokes'
import { Toolbar } from './Toolbar'
import { useBoardKeys } from './useBoardKeys'
import { useGestures } from './useGestures'
import { useLabels } from './useLabels'
import { useTool } from './useTool'
import { useView } from './useView'
import { useViewport } from './useViewport'
import { type DrawingPoint, toDrawing } from './view'
import { ZoneMarks } from './ZoneMarks'
import { sheetAround } from './zones'

/** Room around what is fitted: for axes, their names, dimensions and the zones' marks, px. */
const INSET = { top: 92, right: 84, bottom: 76, left: 96 }
const NARROW_INSET = { top: 64, right: 50, bottom: 58, left: 74 }
/** The drawing is worked by keys, so it takes the focus. */
const FOCUSABLE = { tabIndex: 0 }
/** How near an outline the pointer must be to pick it, px. */
const REACH = 8

interface Props {
  model: BoardModel
  state: BoardState
  dispatch: Dispatch<BoardAction>
  hover: HoverStore
  writing: Writing
  /** said to those who cannot see it */
  label: string
  onPick?: (outlineId: string | null) => void
  /** a finding's ring was pressed: its place in the list */
  onMark?: (index: number) => void
  /** offers the window tool: two opposite corners */
  onWindow?: (a: DrawingPoint, b: DrawingPoint) => void
  /** the title block, at the foot */
  children?: ReactNode
}

/** The drawing board: the metal, its axes and what a person asks of it. */
export function Board({ model, state, dispatch, hover, writing, label, onPick, onMark, onWindow, children }: Props) {
  const svg = useRef<SVGSVGElement>(null)
  const id = useId()
  const viewport = useViewport(svg)
  const inset = viewport.width < 520 ? NARROW_INSET : INSET
  const control = useView(model.extents, viewport, inset)
  const { view } = control
  const sheet = useMemo(() => sheetAround(model.extents), [model.extents])
  const frame = useMemo(() => ({ view, viewport, extents: model.extents }), [view, viewport, model.extents])
  const base = useMemo(() => annotate(model.section, frame, state.shown, writing), [model.section, frame, state.shown, writing])
  const choices = useLabels(base, model, frame, control.moving)
  const tool = useTool({ model, state, dispatch, view, viewport, writing, lines: base.lines, onWindow })
  const { goTo } = control

  useEffect(() => {
    if (state.goal) goTo(state.goal.at, state.goal.size)
  }, [state.goal, goTo])

  const pick = (x: number, y: number) => outlineAt(model.outlines, toDrawing(view, { x, y }), REACH / view.scale)?.id ?? null
  const gestures = useGestures(svg, {
    pan: control.pan,
    zoom: control.zoom,
    over: (at) => {
      if (state.tool !== 'look') return tool.over(at)
      const outline = at && pick(at.x, at.y)
      hover.set(outline ? { kind: 'outline', id: outline } : null)
    },
    click: (at) => {
      if (state.tool !== 'look') return tool.click(at)
      const mark = onMark && markAt(model.marks, at, view)
      if (mark) onMark(mark.index)
      else onPick?.(pick(at.x, at.y))
    },
    dragsTool: state.tool === 'window',
  })
  const onKeyDown = useBoardKeys({
    control,
    viewport,
    tool: state.tool,
    dispatch,
    hasWindow: onWindow !== undefined,
    toolKey: tool.key,
  })

  return (
    <section aria-label="Board" onKeyDown={onKeyDown} className="grid grid-cols-1 border border-hair bg-sheet">
      <svg
        ref={svg}
        {...gestures}
        {...FOCUSABLE}
        role="application"
        aria-label={label}
        aria-describedby={`${id}-keys`}
        viewBox={`0 0 ${viewport.width} ${viewport.height}`}
        className={`block h-[22rem] w-full select-none outline-accent -outline-offset-2 focus-visible:outline-2 md:h-[clamp(22rem,calc(100dvh-var(--board-around,18rem)),56rem)] ${
          state.tool === 'look' ? 'touch-pan-y' : 'touch-none cursor-crosshair'
        }`}
      >
        <Metal id={`${id}-metal`} path={model.metal} origin={model.origin} view={view} viewport={viewport} />
        <Strokes strokes={model.strokes} origin={model.origin} view={view} />
        <ZoneMarks sheet={sheet} view={view} viewport={viewport} />
        <AnnotationLayer annotations={base} choices={choices} />
        <HotLayer {...{ model, hover, frame, base, choices, writing }} shown={state.shown} />
        {tool.layer}
        {model.section && <CentroidMark at={model.section.centroid} view={view} />}
        {model.section?.shearCentre && state.shown.axes && (
          <ShearCentreMark at={model.section.shearCentre} view={view} hover={hover} />
        )}
        {state.share && <ShareLayer model={model} axis={state.share} frame={frame} />}
        <FindingMarks marks={model.marks} view={view} hover={hover} />
      </svg>
      <p id={`${id}-keys`} className="sr-only">
        Arrow keys move the drawing, plus and minus zoom, F fits it, M measures, U places an axis of your own,
        {onWindow && ' W takes what lies in a window,'} Escape ends a tool.
      </p>
      <div className="border-hair border-t">
        <Toolbar
          state={state}
          dispatch={dispatch}
          hasSection={model.section !== null}
          hasWindow={onWindow !== undefined}
          zoom={(factor) => control.zoom({ x: viewport.width / 2, y: viewport.height / 2 }, factor)}
          fit={control.fit}
        />
      </div>
      <div className="flex min-h-12 items-center border-t border-line px-3 py-1.5">
        {tool.readout || <Legend model={model} shown={state.shown} names={writing.names} />}
      </div>
      {children}
    </section>
  )
}
