import type { Drawing } from '../dxf/drawing'
import { ARC, type EdgeTable, ELLIPSE } from '../geometry/edges'
import type { Tolerances } from '../geometry/outlineSet'
import { mmPerUnit, type Recipe } from '../geometry/recipe'

/** Rounding of coordinates is far below this share of the size, any drawn feature far above it. */
const SNAP = 1e-9
const DUPLICATE = 1e-6

/** The four tolerances in drawing units for the edges taken. */
export function tolerancesOf({ edges, lastDigit }: Drawing, take: Uint32Array, recipe: Recipe): Tolerances {
  const size = sizeOf(edges, take)
  const snap = SNAP * size
  // ends within rounding are one whatever the recipe says
  const chaining = Math.max(snap, recipe.tolerance / mmPerUnit(recipe))
  return { lastDigit, chaining, duplicate: Math.max(snap, Math.min(chaining, Math.max(2 * lastDigit, DUPLICATE * size))), snap }
}

/** Greatest extent of the ends, or of one curve where that is more (a circle's ends say nothing). */
function sizeOf({ kind, ends, shape, shapes }: EdgeTable, take: Uint32Array): number {
  let [minX, minY, maxX, maxY] = [
    Number.POSITIVE_INFINITY,
    Number.POSITIVE_INFINITY,
    Number.NEGATIVE_INFINITY,
    Number.NEGATIVE_INFINITY,
  ]
  let curve = 0
  for (const row of take) {
    for (let k = 4 * row; k < 4 * row + 4; k += 2) {
      if (ends[k] < minX) minX = ends[k]
      if (ends[k] > maxX) maxX = ends[k]
      if (ends[k + 1] < minY) minY = ends[k + 1]
      if (ends[k + 1] > maxY) maxY = ends[k + 1]
    }
    const s = shape[row]
    if (kind[row] === ARC) curve = Math.max(curve, shapes[s + 2] * Math.min(2, Math.abs(shapes[s + 4])))
    else if (kind[row] === ELLIPSE) {
      const axis = Math.hypot(shapes[s + 2], shapes[s + 3], shapes[s + 4], shapes[s + 5])
      curve = Math.max(curve, axis * Math.min(2, Math.abs(shapes[s + 7])))
    }
  }
  return Math.max(curve, take.length > 0 ? Math.max(maxX - minX, maxY - minY) : 0)
}
