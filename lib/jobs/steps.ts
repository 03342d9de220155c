import type { Drawing } from '../dxf/drawing'
import { type Selection, selectEdges } from '../dxf/select'
import type { Finding } from '../geometry/finding'
import type { OutlineSet, Tolerances } from '../geometry/outlineSet'
import { outlinesOf } from '../geometry/outlines'
import { mmPerUnit, type Recipe } from '../geometry/recipe'
import type { Region, Repair } from '../geometry/region'
import { cosSin, transformRegion } from '../geometry/transform'
import type { Combination } from '../opinions/combination'
import { sectionOf } from '../section/section'
import type { Section } from '../section/types'
import type { UsedMaterial } from './answer'
import { taskFinding } from './findings'
import { nestedRegion } from './nestedRegion'
import type { Role } from './previewProtocol'
import { tolerancesOf } from './tolerances'

/** Which parts of a recipe each step depends on; a step whose key stays the same is not done again. */
export function keysOf(recipe: Recipe, materials: Record<string, UsedMaterial>): Record<'chain' | 'combine' | 'figures', string> {
  const { layers, lineTypes, space, hatches, arcs, tolerance, part, bonds, makeUp, turn, material } = recipe
  // sentences of chaining speak mm, so the unit is among its parts
  const chain = JSON.stringify([layers, lineTypes, space, hatches, arcs, tolerance, mmPerUnit(recipe)])
  const combine = JSON.stringify([chain, part, bonds, makeUp])
  return { chain, combine, figures: JSON.stringify([combine, turn, material, materials]) }
}

export interface Chained {
  selection: Selection
  outlines: OutlineSet
  tolerances: Tolerances
}

/** Drawing to closed outlines, drawing units. */
export function chainStep(drawing: Drawing, recipe: Recipe): Chained {
  const selection = selectEdges(drawing, recipe)
  const tolerances = tolerancesOf(drawing, selection.edges, recipe)
  const options = { arcs: recipe.arcs, mmPerUnit: mmPerUnit(recipe) }
  return { selection, tolerances, outlines: outlinesOf(drawing.edges, selection.edges, tolerances, options) }
}

export interface Combined {
  /** drawing units, before the turn */
  metal: Region | null
  roles: Role[]
  combination: Combination
  findings: Finding[]
}

/** Outlines to net metal, drawing units. */
export function combineStep({ outlines, tolerances }: Chained, recipe: Recipe): Combined {
  return nestedRegion(outlines, tolerances, recipe)
}

export interface Figures {
  section: Section | null
  /** mm, turned */
  region: Region | null
  findings: Finding[]
}

/** Net metal to section: scaled to mm and turned first. */
export function figuresStep(
  drawing: Drawing,
  { outlines }: Chained,
  { metal }: Combined,
  recipe: Recipe,
  materials: Record<string, UsedMaterial>,
): Figures {
  if (!metal) return { section: null, region: null, findings: [] }
  const scale = mmPerUnit(recipe)
  const region = transformRegion(metal, { scale, turn: recipe.turn })
  const material = recipe.material === null ? undefined : materials[recipe.material]
  const { section, findings } = sectionOf(region, {
    lastDigit: drawing.lastDigit * scale,
    repairs: placed(outlines.repairs, scale, recipe.turn),
    ...(material && { density: material.density }),
  })
  const unknown = recipe.material !== null && !material ? [taskFinding('material-unknown', { material: recipe.material })] : []
  return { section, region, findings: [...findings, ...unknown] }
}

function placed(repairs: Repair[], scale: number, turn: number): Repair[] {
  const [cos, sin] = cosSin(turn)
  return repairs.map(({ x, y, gap, area }) => ({
    x: scale * (cos * x - sin * y),
    y: scale * (sin * x + cos * y),
    gap: gap * scale,
    area: area * scale * scale,
  }))
}

/** A profile outside these sizes (mm) is more likely read in the wrong unit. */
const SMALLEST = 0.5
const LARGEST = 20_000

/** Findings of the whole: no outline at all, a unit other than declared, an unusual size. */
export function sayings(drawing: Drawing, outlines: OutlineSet, recipe: Recipe, section: Section | null): Finding[] {
  const findings: Finding[] = []
  const alreadyFatal = [...drawing.findings, ...outlines.findings].some(({ severity }) => severity === 'error')
  if (outlines.count === 0 && !alreadyFatal) findings.push(taskFinding('outlines-none', { open: outlines.openStart.length - 1 }))
  const taken = mmPerUnit({ unit: recipe.unit, scale: 1, shrinkage: 1 })
  if (drawing.declaredMm !== null && Math.abs(taken - drawing.declaredMm) > 1e-9 * taken) {
    findings.push(taskFinding('unit-differs', { declared: drawing.declared, taken: recipe.unit }))
  }
  if (section) {
    const { minX, minY, maxX, maxY } = section.extents
    const [width, height] = [maxX - minX, maxY - minY]
    const size = Math.max(width, height)
    if (size <= SMALLEST || size >= LARGEST) findings.push(taskFinding('unit-size', { width, height }))
  }
  return findings
}
