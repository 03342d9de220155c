import type { Drawing } from '../dxf/drawing'
import { type Selection, selectEdges } from '../dxf/select'
import { type RegionAnswer, regionOf } from '../geometry/arrangement/regionOf'
import type { Finding } from '../geometry/finding'
import { outlinesOf } from '../geometry/outlines'
import type { OutlineSet, Tolerances } from '../geometry/outlineSet'
import { mmPerUnit, type Recipe } from '../geometry/recipe'
import type { Region, Repair } from '../geometry/region'
import { cosSin, transformRegion } from '../geometry/transform'
import { edgeFigures, withTorsion } from '../section/section'
import type { Section } from '../section/types'
import type { UsedMaterial } from './answer'
import { taskFinding } from './findings'
import { massesOf } from './masses'
import { asAnswered } from './narrow'
import { tolerancesOf } from './tolerances'

/** Which parts of a recipe each step depends on; a step whose key stays the same is not done again. */
export function keysOf(recipe: Recipe, materials: Record<string, UsedMaterial>): Record<'chain' | 'combine' | 'figures', string> {
  const { layers, lineTypes, space, hatches, arcs, tolerance, part, bonds, makeUp, turn, material } = recipe
  // sentences of chaining speak mm, so the unit is among its parts
  const chain = JSON.stringify([layers, lineTypes, space, hatches, arcs, bonds, tolerance, mmPerUnit(recipe)])
  const combine = JSON.stringify([chain, part, makeUp])
  return { chain, combine, figures: JSON.stringify([combine, turn, material, materials]) }
}

export interface Chained {
  drawing: Drawing
  selection: Selection
  outlines: OutlineSet
  tolerances: Tolerances
}

/** Drawing to closed outlines, drawing units. */
export function chainStep(drawing: Drawing, recipe: Recipe): Chained {
  const selection = selectEdges(drawing, recipe)
  const tolerances = tolerancesOf(drawing, selection.edges, recipe)
  const options = { arcs: recipe.arcs, bonds: recipe.bonds, mmPerUnit: mmPerUnit(recipe) }
  return { drawing, selection, tolerances, outlines: outlinesOf(drawing.edges, selection.edges, tolerances, options) }
}

/** Outlines to net metal, drawing units, before the turn. */
export function combineStep({ drawing, selection, outlines, tolerances }: Chained, recipe: Recipe): RegionAnswer {
  const scale = mmPerUnit(recipe)
  if (outlines.count > 0) return asAnswered(regionOf(outlines, recipe, tolerances, scale), tolerances, scale)
  // an error before this one says why there is nothing
  const isExplained = [drawing, selection, outlines].some((step) => step.findings.some(({ severity }) => severity === 'error'))
  const findings = isExplained ? [] : [taskFinding('outlines-none', { open: outlines.openStart.length - 1 })]
  return { region: null, parts: [], roles: [], steps: [], findings, narrow: [], answered: 0, repairs: [] }
}

export interface Figures {
  section: Section | null
  /** mm, turned */
  region: Region | null
  findings: Finding[]
  /** the repairs of the outlines taken, where the section has them: mm, turned */
  repairs: Repair[]
}

export const NO_FIGURES: Figures = { section: null, region: null, findings: [], repairs: [] }

/** Net metal to section: scaled to mm and turned first. */
export function figuresStep(
  drawing: Drawing,
  combined: RegionAnswer,
  recipe: Recipe,
  materials: Record<string, UsedMaterial>,
): Figures {
  if (!combined.region) return NO_FIGURES
  const scale = mmPerUnit(recipe)
  const placed = (region: Region) => transformRegion(region, { scale, turn: recipe.turn })
  const region = placed(combined.region)
  const { masses, findings } = massesOf(combined.parts, recipe.material, materials, placed)
  const repairs = placedRepairs(combined.repairs, scale, recipe.turn)
  const inputs = { lastDigit: drawing.lastDigit * scale, repairs, ...masses }
  const result = edgeFigures(region, inputs)
  return { section: result.section, region, findings: [...findings, ...result.findings], repairs }
}

/** Torsion and shear figures, which take longer than all before, added to the others. */
export function torsionStep(figures: Figures): Figures {
  const { section, region, findings } = figures
  return section && region ? { ...figures, ...withTorsion(section, region, findings) } : figures
}

function placedRepairs(repairs: Repair[], scale: number, turn: number): Repair[] {
  const [cos, sin] = cosSin(turn)
  return repairs.map(({ x, y, gap, area }) => ({
    x: scale * (cos * x - sin * y),
    y: scale * (sin * x + cos * y),
    gap: gap * scale,
    area: area * scale * scale,
  }))
}
