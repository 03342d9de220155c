import type { Recipe } from '../geometry/recipe'
import type { Section } from './types'

/** What the figures suppose and who must check them, in sentences; stands wherever figures are used. */
export function cautionsOf(section: Pick<Section, 'pieces'> | null, recipe: Pick<Recipe, 'shrinkage'>): string[] {
  const pieces = section?.pieces ?? 1
  const shrunk = recipe.shrinkage !== 1 ? ' with the die’s shrinkage undone' : ''
  const suppose = `The figures suppose one homogeneous material, the nominal size as drawn${shrunk}, and a cross-section that stays flat and keeps its shape.`
  const joined = `The section has ${pieces} pieces: every figure with a distance to a common axis supposes that they are joined and act as one; the sums without it stand beside.`
  const check = 'A competent person checks each figure before it is relied on. Local codes and licensed practice decide.'
  return pieces > 1 ? [suppose, joined, check] : [suppose, check]
}
