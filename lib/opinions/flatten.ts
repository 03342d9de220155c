import Flatten from '@flatten-js/core'
import { ARC, LINE } from '../geometry/edges'
import { type Combination, digits, edgesIn, type Frame, frameOf, lengthOf } from './combination'
import type { Opinion } from './opinion'

const library = '@flatten-js/core'
/** its cost grows faster than the number of edges, and a save waits for no opinion */
const MOST_EDGES = 3000
const MOST_STEPS = 300
/**
 * On axis-parallel drawings the extreme point of one operand's arc often falls on a vertex of the
 * other, which this library gets wrong without a word; turned by 0.3 rad it did not (0 of 2,400).
 */
const TURN = 0.3
/** the size that drawings are brought to, so that its fixed tolerance of 1e-6 means the same for all */
const SIZE = 1000
const LIBRARY_TOLERANCE = 1e-6

const COS = Math.cos(TURN)
const SIN = Math.sin(TURN)

/** Combines the outlines again with lines and circular arcs kept, and compares the net area. */
export function flattenOpinion(combination: Combination): Opinion {
  const { outlines, steps, area } = combination
  const notAsked = (why: string): Opinion => ({ library, agrees: null, sentence: `Not asked: ${why}` })
  if (steps.length === 0) return notAsked('there is nothing to combine.')
  if (steps.length > MOST_STEPS || edgesIn(combination) > MOST_EDGES)
    return notAsked(`more than ${MOST_STEPS} outlines or ${MOST_EDGES} edges.`)
  const frame = frameOf(combination)
  const scale = SIZE / frame.size
  let metal: Flatten.Polygon | null = null
  try {
    for (const { outline, does } of steps) {
      const polygon = polygonOf(combination, outline, frame, scale)
      if (!polygon) return notAsked('it knows lines and circular arcs only.')
      if (metal === null) metal = does === 'add' ? polygon : new Flatten.Polygon()
      else metal = combine(metal, polygon, does)
    }
  } catch (error) {
    return { library, agrees: null, sentence: `It could not combine the outlines (${textOf(error)}).` }
  }
  const found = (metal?.faces.size ? metal.area() : 0) / scale ** 2
  const allowed =
    (LIBRARY_TOLERANCE * lengthOf(combination)) / scale + 1e-9 * Math.max(area, ...steps.map((s) => outlines.area[s.outline]))
  const agrees = Math.abs(found - area) <= allowed
  const sentence = agrees
    ? `Combined again with arcs kept: area ${digits(found)} drawing units², within ${digits(allowed)}.`
    : `Combined again with arcs kept, the area is ${digits(found)} drawing units² and not ${digits(area)}.`
  return { library, agrees, sentence }
}

function combine(metal: Flatten.Polygon, polygon: Flatten.Polygon, does: 'add' | 'cut' | 'common'): Flatten.Polygon {
  const empty = metal.faces.size === 0
  if (empty) return does === 'add' ? polygon : metal
  if (does === 'add') return Flatten.BooleanOperations.unify(metal, polygon)
  if (does === 'cut') return Flatten.BooleanOperations.subtract(metal, polygon)
  return Flatten.BooleanOperations.intersect(metal, polygon)
}

function polygonOf({ outlines }: Combination, outline: number, frame: Frame, scale: number): Flatten.Polygon | null {
  const { edges, loopStart } = outlines
  const { kind, ends, shape, shapes } = edges
  const point = (x: number, y: number) => {
    const dx = (x - frame.x) * scale
    const dy = (y - frame.y) * scale
    return Flatten.point(COS * dx - SIN * dy, SIN * dx + COS * dy)
  }
  const faces: (Flatten.Segment | Flatten.Arc)[] = []
  for (let i = loopStart[outline]; i < loopStart[outline + 1]; i++) {
    if (kind[i] === LINE) {
      faces.push(Flatten.segment(point(ends[4 * i], ends[4 * i + 1]), point(ends[4 * i + 2], ends[4 * i + 3])))
    } else if (kind[i] === ARC) {
      const [cx, cy, r, start, sweep] = shapes.subarray(shape[i], shape[i] + 5)
      const parts = Math.max(1, Math.ceil(Math.abs(sweep) / Math.PI - 1e-9))
      for (let part = 0; part < parts; part++) {
        const from = start + (sweep * part) / parts + TURN
        faces.push(Flatten.arc(point(cx, cy), r * scale, from, from + sweep / parts, sweep > 0))
      }
    } else return null
  }
  const polygon = new Flatten.Polygon()
  polygon.addFace(faces)
  return polygon
}

const textOf = (error: unknown) => (error instanceof Error ? error.message : String(error))
