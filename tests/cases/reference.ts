import { readFileSync } from 'node:fs'
import path from 'node:path'
import type { MakeUpStep, UnitName } from '@/lib/geometry/recipe'
import type { Section } from '@/lib/section/types'

/** Figures that the references hold; a subset of `Section`. */
export type Figures = Pick<
  Section,
  'area' | 'perimeter' | 'extents' | 'centroid' | 'ix' | 'iy' | 'ixy' | 'ip' | 'i1' | 'i2' | 'theta' | 'rx' | 'ry' | 'r1' | 'r2'
> &
  Pick<Section, 'elastic' | 'plastic' | 'circle'>

export interface Accept {
  area: number
  perimeter: number
  centroid: number
  extents: number
  second: number
  radii: number
  elastic: number
  plastic: number
  circle: number
  thetaDegrees: number
}

export interface Variant {
  tolerance: number
  makeUp: MakeUpStep[] | null
  expected_mm: Figures
}

export interface Reference {
  file: string
  title: string
  unit: { drawing: UnitName; mmPerUnit: number; declared: string }
  tolerance: number
  makeUp: MakeUpStep[] | null
  layers?: string[]
  pieces: number
  expected_mm: Figures
  accept_rel: Accept
  /** drawing's coordinates × mmPerUnit, before any turn */
  torsion_mm?: {
    j: { value: number; accept_rel: number }
    shearCentre: { x: number; y: number; accept_abs: number }
    iw: { value: number; accept_rel?: number; accept_abs?: number }
  }
  variants?: Variant[]
}

const FOLDER = path.resolve(import.meta.dirname, '../../fixtures/cases')

export const casePath = (file: string): string => path.join(FOLDER, file)
export const caseBytes = (file: string): Uint8Array => readFileSync(casePath(file))

/** The 24 drawings of fixtures/cases; how their values were computed is told in the README beside them. */
export const references = (): Reference[] => JSON.parse(readFileSync(path.join(FOLDER, 'expected.json'), 'utf8'))
