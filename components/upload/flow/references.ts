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

/** Overall sizes, what was measured on the board (mm), and the dimensions drawn, largest first. */
export function referencesOf({ answer, drawing }: PreviewResult, measured: number | null): Reference[] {
  const mm = mmPerUnit(answer.recipe)
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
  const drawn = drawing.dimensions
    .map((dimension, i) => ({ dimension, i }))
    .filter(({ dimension }) => LENGTHS.includes(dimension.kind) && dimension.measured > 0)
    .sort((a, b) => b.dimension.measured - a.dimension.measured)
    .slice(0, LISTED)
  for (const { dimension, i } of drawn) {
    const { kind, text, textValue, measured: length, at } = dimension
    const written = textValue === null ? String(Number(length.toPrecision(6))) : text
    found.push({
      key: `drawn ${i}`,
      by: 'drawn',
      name: `drawn dimension ${SIGNS[kind] ?? ''}${written}`,
      drawn: length,
      says: textValue,
      at: [at.x, at.y],
    })
  }
  return found
}
