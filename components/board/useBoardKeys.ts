'use client'
import type { Dispatch, KeyboardEvent } from 'react'
import type { BoardAction, Tool } from './boardState'
import type { ViewControl } from './useView'
import type { Viewport } from './view'

const STEP = 40
const ARROWS: Record<string, [number, number]> = {
  ArrowLeft: [1, 0],
  ArrowRight: [-1, 0],
  ArrowUp: [0, 1],
  ArrowDown: [0, -1],
}
const ZOOM = 1.25

interface Options {
  control: ViewControl
  viewport: Viewport
  tool: Tool
  dispatch: Dispatch<BoardAction>
  /** outlines can be taken by a window */
  hasWindow: boolean
  /** the tool's own keys: moves the pointer of the tool by px on the board; true where it took the key */
  toolKey: (event: KeyboardEvent) => boolean
}

/** All that the board does, by keys while it or its tools have the focus. */
export function useBoardKeys({ control, viewport, tool, dispatch, hasWindow, toolKey }: Options) {
  const middle = { x: viewport.width / 2, y: viewport.height / 2 }
  const actions: Record<string, () => void> = {
    '+': () => control.zoom(middle, ZOOM),
    '=': () => control.zoom(middle, ZOOM),
    '-': () => control.zoom(middle, 1 / ZOOM),
    f: control.fit,
    a: () => dispatch({ do: 'show', what: 'axes' }),
    d: () => dispatch({ do: 'show', what: 'dimensions' }),
    p: () => dispatch({ do: 'show', what: 'plastic' }),
    c: () => dispatch({ do: 'show', what: 'circle' }),
    m: () => dispatch({ do: 'tool', tool: 'measure' }),
    u: () => dispatch({ do: 'tool', tool: 'axis' }),
    ...(hasWindow && { w: () => dispatch({ do: 'tool', tool: 'window' }) }),
    escape: () => dispatch({ do: 'escape' }),
  }
  const onKeyDown = (event: KeyboardEvent) => {
    const command = event.ctrlKey || event.metaKey
    if (command && event.key === 'z') {
      event.preventDefault()
      dispatch({ do: 'undo' })
      return
    }
    if (command || event.altKey) return
    const onBoard = event.target instanceof SVGElement
    if (!onBoard && (event.key.startsWith('Arrow') || event.key === 'Enter')) return
    if (tool !== 'look' && toolKey(event)) {
      event.preventDefault()
      return
    }
    const arrow = ARROWS[event.key]
    const act = arrow
      ? () => control.pan(arrow[0] * STEP * (event.shiftKey ? 5 : 1), arrow[1] * STEP * (event.shiftKey ? 5 : 1))
      : actions[event.key.toLowerCase()]
    if (!act) return
    event.preventDefault()
    act()
  }
  return onKeyDown
}
