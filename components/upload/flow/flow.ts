import { type ArcRun, type Bond, DEFAULT_RECIPE, type Does, type Recipe, type XY } from '@/lib/geometry/recipe'
import type { OutlineView } from '@/lib/section/types'
import { begin, type History, push, redo, undo } from './history'
import { moved, stepsOf, withMaterial, withRole } from './makeUp'
import { compare, type SizeClaim } from './size'

/** Everything a person decides on one drawing; all of it can be undone. */
export interface Choices {
  recipe: Recipe
  claim: SizeClaim | null
  /** the finished profile, or a die with shrinkage: null until a person says */
  finished: 'finished' | 'die' | null
  /** offers of arcs that were looked at and declined, by their first vertex */
  declined: XY[]
  /** outlines that a person said are the sheet's frame, no profile: details are looked for without them */
  frames: XY[]
}

export interface FlowState {
  history: History<Choices>
  drawingRevision: string
  note: string
}

type Simple = Pick<Recipe, 'unit' | 'scale' | 'shrinkage' | 'tolerance' | 'turn' | 'space' | 'hatches' | 'material' | 'part'>

export type FlowAction =
  | { type: 'set'; change: Partial<Simple> }
  /** `taken`: the names that count at the moment, where the recipe leaves the choice to the reader */
  | { type: 'layer' | 'lineType'; name: string; on: boolean; taken: string[] }
  | { type: 'layers' | 'lineTypes'; names: string[] }
  | { type: 'does'; at: XY; does: Does; outlines: readonly OutlineView[] }
  | { type: 'outlineMaterial'; at: XY; material: string | null; outlines: readonly OutlineView[] }
  | { type: 'move'; at: XY; by: -1 | 1; outlines: readonly OutlineView[] }
  | { type: 'nesting' }
  | { type: 'arc'; run: ArcRun; accept: boolean }
  | { type: 'arcs'; runs: ArcRun[] }
  | { type: 'bond'; bond: Bond }
  | { type: 'claim'; claim: SizeClaim | null }
  | { type: 'finished'; finished: 'finished' | 'die'; shrinkage?: number }
  /** what the file itself says, before a person decides anything */
  | { type: 'begin'; unit: Recipe['unit'] }
  | { type: 'frame'; at: XY; part: XY[] }
  | { type: 'undo' }
  | { type: 'redo' }
  | { type: 'text'; change: Partial<Pick<FlowState, 'drawingRevision' | 'note'>> }

export function startFlow(recipe: Partial<Recipe> = {}): FlowState {
  const choices: Choices = { recipe: { ...DEFAULT_RECIPE, ...recipe }, claim: null, finished: null, declined: [], frames: [] }
  return { history: begin(choices), drawingRevision: '', note: '' }
}

export const choicesOf = (state: FlowState): Choices => state.history.present

/** A person said what is drawn and knows a dimension that agrees with the recipe as it stands now. */
export const isConfirmed = ({ claim, finished, recipe }: Choices): boolean =>
  claim !== null && finished !== null && compare(claim, recipe).agrees

/** One reducer for the whole flow; every choice but typed text is one step of undo. */
export function flow(state: FlowState, action: FlowAction): FlowState {
  switch (action.type) {
    case 'undo':
      return { ...state, history: undo(state.history) }
    case 'redo':
      return { ...state, history: redo(state.history) }
    case 'text':
      return { ...state, ...action.change }
    case 'begin': {
      const { past, future, present } = state.history
      if (past.length + future.length > 0) return state
      return { ...state, history: begin({ ...present, recipe: { ...present.recipe, unit: action.unit } }) }
    }
    default: {
      const now = state.history.present
      const next = decide(now, action)
      return next === now ? state : { ...state, history: push(state.history, next) }
    }
  }
}

type Decision = Exclude<FlowAction, { type: 'undo' | 'redo' | 'text' | 'begin' }>

const samePoint = (a: XY, b: XY) => a[0] === b[0] && a[1] === b[1]

function decide(now: Choices, action: Decision): Choices {
  const { recipe } = now
  const recipeWith = (change: Partial<Recipe>): Choices => ({ ...now, recipe: { ...recipe, ...change } })
  switch (action.type) {
    case 'set':
      return afterSet(now, action.change)
    case 'layer':
      return recipeWith({ layers: switched(recipe.layers ?? action.taken, action.name, action.on) })
    case 'lineType':
      return recipeWith({ lineTypes: switched(recipe.lineTypes ?? action.taken, action.name, action.on) })
    case 'layers':
      return recipeWith({ layers: action.names })
    case 'lineTypes':
      return recipeWith({ lineTypes: action.names })
    case 'does':
      return recipeWith({ makeUp: withRole(stepsOf(recipe.makeUp, action.outlines), action.at, action.does) })
    case 'outlineMaterial':
      return recipeWith({ makeUp: withMaterial(stepsOf(recipe.makeUp, action.outlines), action.at, action.material) })
    case 'move':
      return recipeWith({ makeUp: moved(stepsOf(recipe.makeUp, action.outlines), action.at, action.by) })
    case 'nesting':
      return recipe.makeUp === null ? now : recipeWith({ makeUp: null })
    case 'arc': {
      const others = recipe.arcs.filter(({ from, to }) => !samePoint(from, action.run.from) || !samePoint(to, action.run.to))
      const declined = now.declined.filter((at) => !samePoint(at, action.run.from))
      if (action.accept) return { ...recipeWith({ arcs: [...others, action.run] }), declined }
      return { ...recipeWith({ arcs: others }), declined: [...declined, action.run.from] }
    }
    case 'arcs':
      return recipeWith({ arcs: [...recipe.arcs, ...action.runs] })
    case 'bond': {
      const others = recipe.bonds.filter(({ at }) => !samePoint(at, action.bond.at))
      return recipeWith({ bonds: [...others, action.bond] })
    }
    case 'frame':
      return { ...afterSet(now, { part: action.part }), frames: [...now.frames, action.at] }
    case 'claim':
      return { ...now, claim: action.claim }
    case 'finished': {
      const shrinkage = action.finished === 'finished' ? 1 : (action.shrinkage ?? recipe.shrinkage)
      return { ...now, finished: action.finished, recipe: { ...recipe, shrinkage } }
    }
  }
}

/** Another part or space shows other outlines: a make-up stated for the former ones says nothing about them. */
function afterSet(now: Choices, change: Partial<Simple>): Choices {
  const recipe = { ...now.recipe, ...change }
  const elsewhere = change.part !== undefined || change.space !== undefined
  if (!elsewhere) return { ...now, recipe }
  return { ...now, recipe: { ...recipe, makeUp: null }, claim: null }
}

function switched(names: readonly string[], name: string, on: boolean): string[] {
  const others = names.filter((other) => other !== name)
  return on ? [...others, name] : others
}
