import type { Axis, AxisId } from './axesOf'
import type { Shown } from './annotate'
import type { DrawingPoint } from './view'

/** `look`: move about and pick; `measure`: two points; `axis`: place and turn an axis of one's own; `window`: two corners. */
export type Tool = 'look' | 'measure' | 'axis' | 'window'

/** What a person can take back. */
interface Placed {
  /** points of the measurement, or the first corner of a window: none to two */
  points: DrawingPoint[]
  axis: Axis | null
}

export interface BoardState extends Placed {
  tool: Tool
  shown: Shown
  /** the axis whose shares are drawn */
  share: AxisId | null
  /** a place to bring into view; a new object each time it is asked for */
  goal: { at: DrawingPoint; size: number } | null
  past: Placed[]
}

export type BoardAction =
  | { do: 'show'; what: keyof Shown }
  | { do: 'tool'; tool: Tool }
  | { do: 'share'; axis: AxisId | null }
  | { do: 'point'; at: DrawingPoint }
  | { do: 'axis'; axis: Axis | null; step: boolean }
  | { do: 'goTo'; at: DrawingPoint; size: number }
  | { do: 'undo' }
  | { do: 'escape' }

export const initialBoard: BoardState = {
  tool: 'look',
  shown: { axes: true, dimensions: true, plastic: false, circle: false },
  share: null,
  points: [],
  axis: null,
  goal: null,
  past: [],
}

const STEPS = 50
const remember = ({ past, points, axis }: BoardState): Placed[] => [...past.slice(1 - STEPS), { points, axis }]

/** One step of the board. `axis` with `step: false` follows a drag: only its beginning can be undone. */
export function boardReducer(state: BoardState, action: BoardAction): BoardState {
  switch (action.do) {
    case 'show':
      return { ...state, shown: { ...state.shown, [action.what]: !state.shown[action.what] } }
    case 'tool': {
      const tool = state.tool === action.tool ? 'look' : action.tool
      return { ...state, tool, points: [] }
    }
    case 'share':
      return { ...state, share: state.share === action.axis ? null : action.axis }
    case 'point': {
      const points = state.points.length === 2 ? [action.at] : [...state.points, action.at]
      return { ...state, points, past: remember(state) }
    }
    case 'axis':
      return { ...state, axis: action.axis, past: action.step ? remember(state) : state.past }
    case 'goTo':
      return { ...state, goal: { at: action.at, size: action.size } }
    case 'undo': {
      const before = state.past.at(-1)
      return before ? { ...state, ...before, past: state.past.slice(0, -1) } : state
    }
    case 'escape':
      if (state.points.length > 0) return { ...state, points: [], past: remember(state) }
      return { ...state, tool: 'look' }
  }
}
