import { mmPerUnit, type Recipe, type XY } from '@/lib/geometry/recipe'
import { cosSin } from '@/lib/geometry/transform'

/** A place on the board (mm of the section, after the turn) in drawing units. */
export function placeInDrawing({ x, y }: { x: number; y: number }, recipe: Recipe): XY {
  const [cos, sin] = cosSin(recipe.turn)
  const mm = mmPerUnit(recipe)
  return [(cos * x + sin * y) / mm, (cos * y - sin * x) / mm]
}
