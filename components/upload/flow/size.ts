import type { Recipe, UnitName } from '@/lib/geometry/recipe'
import { mmPerUnit } from '@/lib/geometry/recipe'

/** How a person knows the size: a dimension typed from the order, or one drawn that agrees with what they know. */
export interface SizeClaim {
  by: 'typed' | 'drawn'
  /** what the dimension is: 'overall width', 'drawn dimension 60' … */
  what: string
  /** as known from elsewhere, mm */
  value: number
  /** the same dimension as drawn, drawing units */
  drawn: number
}

/** A tenth of a millimetre or 2 parts in 1000, whichever is more: common practice, no source. */
const allowed = (value: number) => Math.max(0.1, 0.002 * value)

export interface Comparison {
  /** what the drawing gives with this recipe, mm */
  measured: number
  /** measured − value, mm */
  off: number
  agrees: boolean
}

/** What is known against what the drawing gives with this unit, scale and shrinkage. */
export function compare(claim: SizeClaim, recipe: Pick<Recipe, 'unit' | 'scale' | 'shrinkage'>): Comparison {
  const measured = claim.drawn * mmPerUnit(recipe)
  const off = measured - claim.value
  return { measured, off, agrees: Math.abs(off) <= allowed(claim.value) }
}

export const UNITS: readonly UnitName[] = ['mm', 'cm', 'm', 'in', 'ft']

/** A change of recipe under which the claim would agree. */
export type Cure = { kind: 'unit'; unit: UnitName } | { kind: 'scale'; scale: number } | { kind: 'shrinkage'; shrinkage: number }

const DRAWING_SCALES = [0.1, 0.2, 0.5, 2, 2.5, 5, 10, 20, 50, 100]

/**
 * What could explain a dimension that does not agree: another unit, a drawing scale of ISO 5455, or
 * a die cut larger by a shrinkage between 0.2 % and 2.5 %. Empty where it agrees or nothing fits.
 */
export function cures(claim: SizeClaim, recipe: Pick<Recipe, 'unit' | 'scale' | 'shrinkage'>): Cure[] {
  if (compare(claim, recipe).agrees) return []
  const found: Cure[] = []
  for (const unit of UNITS)
    if (unit !== recipe.unit && compare(claim, { ...recipe, unit }).agrees) found.push({ kind: 'unit', unit })
  for (const scale of DRAWING_SCALES) {
    if (scale !== recipe.scale && compare(claim, { ...recipe, scale }).agrees) found.push({ kind: 'scale', scale })
  }
  const shrinkage = (claim.drawn * mmPerUnit({ ...recipe, shrinkage: 1 })) / claim.value
  if (recipe.shrinkage === 1 && shrinkage > 1.002 && shrinkage <= 1.025) {
    found.push({ kind: 'shrinkage', shrinkage: Math.round(shrinkage * 1e4) / 1e4 })
  }
  return found
}
