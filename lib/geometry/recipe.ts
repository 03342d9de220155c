/** A point in drawing units. */
export type XY = [number, number]

export type UnitName = 'mm' | 'cm' | 'm' | 'in' | 'ft'
export type Does = 'add' | 'cut' | 'common' | 'out'

/** One step of the make-up: the outline nearest to `at`, and what it does. */
export interface MakeUpStep {
  at: XY
  does: Does
  material?: string
}

/** A run of chords accepted as one arc: its first and last vertex and one between them. */
export interface ArcRun {
  from: XY
  through: XY
  to: XY
}

/** An answer to a question about the face that holds `at`. */
export interface Bond {
  at: XY
  is: 'metal' | 'void' | 'bonded' | 'contact'
}

/**
 * All that turns a file's bytes into a section. mm per drawing unit = unit × scale ÷ shrinkage.
 * Coordinates are drawing units before `turn` (degrees, counter-clockwise).
 */
export interface Recipe {
  unit: UnitName | number
  scale: number
  shrinkage: number
  /** chaining tolerance, mm */
  tolerance: number
  /** null: every layer that is on, thawed and plots */
  layers: string[] | null
  /** null: every line type but centre, hidden and phantom lines */
  lineTypes: string[] | null
  /** 'model', or the name of a layout whose paper-space outlines are taken instead */
  space: string
  /** null: all outlines; else a point on each outline taken */
  part: XY[] | null
  turn: number
  arcs: ArcRun[]
  hatches: boolean
  bonds: Bond[]
  /** null: by nesting depth (even adds, odd cuts) */
  makeUp: MakeUpStep[] | null
  /** id of the material of the whole section, for its mass */
  material: string | null
}

export const DEFAULT_RECIPE: Recipe = {
  unit: 'mm',
  scale: 1,
  shrinkage: 1,
  tolerance: 0.01,
  layers: null,
  lineTypes: null,
  space: 'model',
  part: null,
  turn: 0,
  arcs: [],
  hatches: false,
  bonds: [],
  makeUp: null,
  material: null,
}

const MM_PER: Record<UnitName, number> = { mm: 1, cm: 10, m: 1000, in: 25.4, ft: 304.8 }

/** mm per drawing unit. */
export function mmPerUnit({ unit, scale, shrinkage }: Pick<Recipe, 'unit' | 'scale' | 'shrinkage'>): number {
  return ((typeof unit === 'number' ? unit : MM_PER[unit]) * scale) / shrinkage
}
