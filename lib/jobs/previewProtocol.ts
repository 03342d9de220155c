import type { Drawing } from '../dxf/drawing'
import type { Tally } from '../dxf/select'
import type { OutlineSet } from '../geometry/outlineSet'
import type { Does, Recipe } from '../geometry/recipe'
import type { Region } from '../geometry/region'
import type { SectionAnswer } from '../section/types'
import type { UsedMaterial } from './answer'

/** The steps of a task, in order. */
export type Stage = 'read' | 'chain' | 'combine' | 'figures' | 'torsion'

/** The drawing without its long columns, with counts for the lists a person chooses from. */
export interface DrawingView extends Omit<Drawing, 'edges' | 'entities' | 'remarks'> {
  entities: number
  /** entities that gave edges, as this recipe takes or leaves them */
  tallies: { layers: Tally[]; lineTypes: Tally[]; kinds: Tally[]; spaces: Tally[] }
}

/** What an outline does in the make-up taken; `out` too where a person must still say it. */
export type Role = Does

/** Which block each outline came in with, one row an outline: the entity that gave its first edge tells. */
export interface Placed {
  /** index into `drawing.blocks` + 1 of the outermost block; 0 where drawn directly */
  block: Uint32Array
  /** running number of that block's placement; 0 where drawn directly */
  insert: Uint32Array
}

/** All that the page shows for one recipe. */
export interface PreviewResult {
  answer: SectionAnswer
  drawing: DrawingView
  /** drawing units, before the recipe's turn */
  outlines: OutlineSet
  roles: Role[]
  placed: Placed
  /** mm, turned: the frame of the figures; null without a section */
  region: Region | null
}

/** From page to worker: the file once, then a recipe as often as the person changes something. */
export type PreviewRequest =
  | { kind: 'open'; file: Blob; name: string }
  | { kind: 'recipe'; seq: number; recipe: Recipe; materials: Record<string, UsedMaterial> }

/** From worker to page. A stage without result says that it begins; torsion begins with all other figures in hand. */
export type PreviewReply =
  | { seq: number; stage: Exclude<Stage, 'torsion'>; result: null }
  | { seq: number; stage: 'torsion'; result: PreviewResult }
  | { seq: number; stage: 'done'; result: PreviewResult }
  | { seq: number; stage: 'failed'; result: { message: string } }
