import type { Finding } from '../geometry/finding'
import type { Recipe } from '../geometry/recipe'
import { type Drawing, FROZEN_INSERT, HATCH_BOUNDARY, HATCH_PATTERN, INVISIBLE } from './drawing'
import { FindingList } from './findingList'
import { INSERT_KIND } from './kinds'
import { drawsNoMetal } from './lineTypes'
import { reportSelection } from './reportSelection'

/** What the recipe says about which entities count. */
export type Selecting = Pick<Recipe, 'layers' | 'lineTypes' | 'space' | 'hatches'>

/** How many entities of one name are taken, and how many are left out for whatever reason. */
export interface Tally {
  name: string
  taken: number
  left: number
}

export interface Selection {
  /** rows of `drawing.edges` that are taken, ascending */
  edges: Uint32Array
  /** remarks on the entities taken, and what was left out by which rule */
  findings: Finding[]
  findingsTotal: number
  /** entities that gave edges, by name; in the order of the drawing */
  layers: Tally[]
  lineTypes: Tally[]
  kinds: Tally[]
  spaces: Tally[]
}

// why an entity is left out
export const TAKEN = 0
export const OTHER_SPACE = 1
export const HATCH = 2
export const UNSEEN = 3
export const OTHER_LAYER = 4
export const OTHER_LINE_TYPE = 5
export const PATTERN = 6

/**
 * Chooses the edges that a recipe takes. By default: model space; layers that are on, thawed and plot; line types
 * other than hidden, centre and phantom (`drawsNoMetal`); visible entities; no hatch boundaries; never the lines of a hatch's pattern. Layers or line
 * types that the recipe names are taken whatever their state. Names are compared without regard to case.
 * A fault of an entity (an error) counts only where the entity is taken.
 */
export function selectEdges(drawing: Drawing, selecting: Selecting): Selection {
  const { entities, edges } = drawing
  const layers = layersTaken(drawing, selecting.layers)
  const lineTypes = lineTypesTaken(drawing, selecting.lineTypes)
  const space = spaceTaken(drawing, selecting.space)
  const why = new Uint8Array(entities.count)
  for (let row = 0; row < entities.count; row++) {
    const flags = entities.flags[row]
    if (entities.space[row] !== space) why[row] = OTHER_SPACE
    else if ((flags & HATCH_BOUNDARY) !== 0 && !selecting.hatches) why[row] = HATCH
    else if ((flags & HATCH_PATTERN) !== 0) why[row] = PATTERN
    else if ((flags & INVISIBLE) !== 0) why[row] = UNSEEN
    else if (layers[entities.layer[row]] === 0 || ((flags & FROZEN_INSERT) !== 0 && !selecting.layers)) why[row] = OTHER_LAYER
    else if (lineTypes[entities.lineType[row]] === 0) why[row] = OTHER_LINE_TYPE
  }
  const taken = new Uint32Array(edges.count)
  const gave = new Uint8Array(entities.count)
  let count = 0
  for (let i = 0; i < edges.count; i++) {
    const row = edges.source[i]
    gave[row] = 1
    if (why[row] === TAKEN) taken[count++] = i
  }
  const tallies = tally(drawing, why, gave)
  const findings = new FindingList()
  reportSelection(drawing, selecting, why, gave, tallies, findings)
  return { edges: taken.subarray(0, count), findings: findings.items, findingsTotal: findings.total, ...tallies }
}

const upperCase = (names: readonly string[]): Set<string> => new Set(names.map((name) => name.toUpperCase()))

function layersTaken({ layers }: Drawing, wanted: readonly string[] | null): Uint8Array {
  const names = wanted && upperCase(wanted)
  return Uint8Array.from(layers, ({ name, off, frozen, plots }) =>
    Number(names ? names.has(name.toUpperCase()) : !off && !frozen && plots),
  )
}

function lineTypesTaken({ lineTypes }: Drawing, wanted: readonly string[] | null): Uint8Array {
  const names = wanted && upperCase(wanted)
  return Uint8Array.from(lineTypes, (name) => Number(names ? names.has(name.toUpperCase()) : !drawsNoMetal(name)))
}

function spaceTaken({ spaces }: Drawing, wanted: string): number {
  const index = spaceIndex(spaces, wanted)
  return index < 0 ? spaces.length : index
}

/** Index of a space by its name, upper or lower case as for all names of the format; −1 where there is none. */
export function spaceIndex(spaces: string[], wanted: string): number {
  const name = wanted.toUpperCase()
  return name === 'MODEL' ? 0 : spaces.findIndex((space, index) => index > 0 && space.toUpperCase() === name)
}

export type Tallies = Pick<Selection, 'layers' | 'lineTypes' | 'kinds' | 'spaces'>

function tally(drawing: Drawing, why: Uint8Array, gave: Uint8Array): Tallies {
  const { entities } = drawing
  const start = (names: readonly string[]): Tally[] => names.map((name) => ({ name, taken: 0, left: 0 }))
  const tallies = {
    layers: start(drawing.layers.map(({ name }) => name)),
    lineTypes: start(drawing.lineTypes),
    kinds: start(drawing.kinds),
    spaces: start(drawing.spaces),
  }
  for (let row = 0; row < entities.count; row++) {
    if (gave[row] === 0 || entities.kind[row] === INSERT_KIND) continue
    const key = why[row] === TAKEN ? 'taken' : 'left'
    tallies.layers[entities.layer[row]][key]++
    tallies.lineTypes[entities.lineType[row]][key]++
    tallies.kinds[entities.kind[row]][key]++
    tallies.spaces[entities.space[row]][key]++
  }
  return tallies
}
