import clipping, { type MultiPolygon } from 'polygon-clipping'
import { type Pair, pushChords } from './chords'
import { type Combination, digits, frameOf, lengthOf } from './combination'
import type { Opinion } from './opinion'

const library = 'polygon-clipping'
const SAGITTA_PER_SIZE = 2e-5
const MOST_POINTS = 40_000

/** Combines the outlines again on chords; their area agrees within sagitta × length of the curves. */
export function polygonClippingOpinion(combination: Combination): Opinion {
  const { outlines, steps, area } = combination
  const notAsked = (why: string): Opinion => ({ library, agrees: null, sentence: `Not asked: ${why}` })
  if (steps.length === 0) return notAsked('there is nothing to combine.')
  const frame = frameOf(combination)
  const sagitta = SAGITTA_PER_SIZE * frame.size
  const rings: Pair[][] = []
  let total = 0
  for (const { outline } of steps) {
    const ring: Pair[] = []
    for (let i = outlines.loopStart[outline]; i < outlines.loopStart[outline + 1]; i++)
      pushChords(ring, outlines.edges, i, sagitta)
    for (const point of ring) {
      point[0] -= frame.x
      point[1] -= frame.y
    }
    rings.push(ring)
    total += ring.length
    if (total > MOST_POINTS) return notAsked(`more than ${MOST_POINTS} chords.`)
  }
  let metal: MultiPolygon
  try {
    metal = combine(combination.steps, rings)
  } catch (error) {
    const text = error instanceof Error ? error.message : String(error)
    return { library, agrees: null, sentence: `It could not combine the outlines (${text}).` }
  }
  const found = metal.flat().reduce((sum, ring) => sum + signedArea(ring), 0)
  const allowed = sagitta * lengthOf(combination, true) + 1e-9 * frame.size ** 2
  const agrees = Math.abs(found - area) <= allowed
  const sentence = agrees
    ? `Combined again on chords: area ${digits(found)} drawing units², within ${digits(allowed)}.`
    : `Combined again on chords, the area is ${digits(found)} drawing units² and not ${digits(area)} (within ${digits(allowed)}).`
  return { library, agrees, sentence }
}

/** Steps of one kind in a row go in one sweep. */
function combine(steps: Combination['steps'], rings: Pair[][]): MultiPolygon {
  let metal: MultiPolygon = []
  for (let first = 0; first < steps.length; ) {
    const { does } = steps[first]
    let end = first + 1
    while (end < steps.length && does !== 'common' && steps[end].does === does) end++
    const polygons = rings.slice(first, end).map((ring) => [ring])
    if (does === 'add') metal = clipping.union(metal, ...polygons)
    else if (metal.length > 0)
      metal = does === 'cut' ? clipping.difference(metal, ...polygons) : clipping.intersection(metal, ...polygons)
    first = end
  }
  return metal
}

function signedArea(ring: Pair[]): number {
  let sum = 0
  for (let j = 0; j < ring.length; j++) {
    const [x0, y0] = ring[j]
    const [x1, y1] = ring[(j + 1) % ring.length]
    sum += x0 * y1 - x1 * y0
  }
  return sum / 2
}
