'use client'
import type { Dispatch } from 'react'
import { Button } from '@/components/ui/Button'
import type { Shown } from './annotate'
import type { BoardAction, BoardState } from './boardState'

const LAYERS: { what: keyof Shown; word: string; shortcut: string }[] = [
  { what: 'axes', word: 'Axes', shortcut: 'A' },
  { what: 'dimensions', word: 'Dimensions', shortcut: 'D' },
  { what: 'plastic', word: 'Plastic', shortcut: 'P' },
  { what: 'circle', word: 'Circle', shortcut: 'C' },
]

const Divider = () => <span className="mx-1 h-6 w-px bg-line max-md:hidden" aria-hidden="true" />

interface Props {
  state: BoardState
  dispatch: Dispatch<BoardAction>
  hasSection: boolean
  /** outlines can be taken by a window */
  hasWindow: boolean
  zoom: (factor: number) => void
  fit: () => void
}

/** What the board shows and what the pointer does, as quiet words under it. */
export function Toolbar({ state, dispatch, hasSection, hasWindow, zoom, fit }: Props) {
  const layers = hasSection ? LAYERS : LAYERS.filter(({ what }) => what === 'dimensions')
  return (
    <div role="toolbar" aria-label="Board" className="flex flex-wrap items-center gap-1 px-2 py-1 text-small">
      {layers.map(({ what, word, shortcut }) => (
        <Button
          key={what}
          look="quiet"
          shortcut={shortcut}
          title={`${word} on or off`}
          aria-pressed={state.shown[what]}
          onClick={() => dispatch({ do: 'show', what })}
        >
          {word}
        </Button>
      ))}
      <Divider />
      <Button
        look="quiet"
        shortcut="M"
        title="Measure between ends, middles, centres and edges"
        aria-pressed={state.tool === 'measure'}
        onClick={() => dispatch({ do: 'tool', tool: 'measure' })}
      >
        Measure
      </Button>
      {hasWindow && (
        <Button
          look="quiet"
          shortcut="W"
          title="Take what lies in a window"
          aria-pressed={state.tool === 'window'}
          onClick={() => dispatch({ do: 'tool', tool: 'window' })}
        >
          Window
        </Button>
      )}
      {hasSection && (
        <Button
          look="quiet"
          shortcut="U"
          title="Place and turn an axis of your own"
          aria-pressed={state.tool === 'axis'}
          onClick={() => dispatch({ do: 'tool', tool: 'axis' })}
        >
          Own axis
        </Button>
      )}
      <Divider />
      <Button look="quiet" shortcut="-" title="Smaller" aria-label="Smaller" onClick={() => zoom(1 / 1.5)}>
        −
      </Button>
      <Button look="quiet" shortcut="+" title="Larger" aria-label="Larger" onClick={() => zoom(1.5)}>
        +
      </Button>
      <Button look="quiet" shortcut="F" title="Fit the whole drawing" onClick={fit}>
        Fit
      </Button>
    </div>
  )
}
