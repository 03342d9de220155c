import { mmPerUnit } from '@/lib/geometry/recipe'
import type { PreviewResult } from '@/lib/jobs/browser-pool'

/** A dimension of the drawing that a person may know from elsewhere. */
export interface Reference {
  key: string
  by: 'typed' | 'drawn'
  name: string
  /** as drawn, drawing units */
  drawn: number
  /** what its text says, in the text's own unit; null where it says nothing else than the length */
  says: number | null
  /** its place, drawing units */
  at?: [number, number]
}

const LENGTHS = ['linear', 'aligned', 'diameter', 'radius', 'ordinate', 'arc']
const SIGNS: Record<string, string> = { diameter: 'Ø ', radius: 'R ' }
/** A sheet can hold hundreds of dimensions; the largest are the ones an order names. */
const LISTED = 60
/** How far beside the outlines the ends of their dimensions may lie, as a part of their size: common practice, no source. */
const CLOSE = 0.1

/** Overall sizes, what was measured on the board (mm), and the dimensions drawn, largest first. */
export function referencesOf({ answer, drawing, outlines, roles }: PreviewResult, measured: number | null): Reference[] {
  const { recipe } = answer
  const mm = mmPerUnit(recipe)
  const found: Reference[] = []
  const typed = (key: string, name: string, length: number) => {
    if (length > 0) found.push({ key, by: 'typed', name, drawn: length / mm, says: null })
  }
  if (answer.section) {
    const { extents, circle } = answer.section
    typed('width', 'overall width', extents.maxX - extents.minX)
    typed('height', 'overall height', extents.maxY - extents.minY)
    typed('circle', 'circumscribing circle, Ø', 2 * circle.radius)
  }
  if (measured !== null) typed('measured', 'measured on the board', measured)
  const beside = recipe.part ? besidePart(outlines, roles) : () => true
  const drawn = drawing.dimensions
    .map((dimension, i) => ({ dimension, i }))
    .filter(({ dimension }) => LENGTHS.includes(dimension.kind) && dimension.measured > 0 && beside(dimension))
    .sort((a, b) => b.dimension.measured - a.dimension.measured)
  const named = new Set<string>()
  for (const { dimension, i } of drawn) {
    if (named.size === LISTED) break
    const { kind, text, textValue, measured: length, at } = dimension
    const written = textValue === null ? String(Number(length.toPrecision(6))) : text
    const name = `drawn dimension ${SIGNS[kind] ?? ''}${written}`
    if (named.has(name)) continue
    named.add(name)
    found.push({
      key: `drawn ${i}`,
      by: 'drawn',
      name,
      drawn: length,
      says: textValue,
      at: [at.x, at.y],
    })
  }
  return found
}

type Dimension = PreviewResult['drawing']['dimensions'][number]

/** Whether a dimension measures what is taken: both its ends lie on or close to it, not on another detail of the sheet. */
function besidePart(
  { bounds, count }: PreviewResult['outlines'],
  roles: PreviewResult['roles'],
): (dimension: Dimension) => boolean {
  let [minX, minY, maxX, maxY] = [
    Number.POSITIVE_INFINITY,
    Number.POSITIVE_INFINITY,
    Number.NEGATIVE_INFINITY,
    Number.NEGATIVE_INFINITY,
  ]
  for (let k = 0; k < count; k++) {
    if (roles[k] === 'out') continue
    minX = Math.min(minX, bounds[4 * k])
    minY = Math.min(minY, bounds[4 * k + 1])
    maxX = Math.max(maxX, bounds[4 * k + 2])
    maxY = Math.max(maxY, bounds[4 * k + 3])
  }
  const reach = CLOSE * Math.max(maxX - minX, maxY - minY)
  const near = ({ x, y }: { x: number; y: number }) =>
    x >= minX - reach && x <= maxX + reach && y >= minY - reach && y <= maxY + reach
  return ({ a, b }) => near(a) && near(b)
}
