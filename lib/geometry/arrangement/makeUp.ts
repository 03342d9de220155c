import { nearestOn } from '../nearest'
import type { OutlineSet } from '../outlineSet'
import { nearestOutlines } from '../nearestOutlines'
import type { Does, MakeUpStep, XY } from '../recipe'

/** One step of the make-up with its outline found. */
export interface Step {
  outline: number
  does: Does
  /** index into `MakeUp.materials` */
  material: number
}

/** The make-up as the combination reads it: steps in order, without those that leave an outline out. */
export interface MakeUp {
  steps: Step[]
  materials: (string | null)[]
  /** steps of each outline, ascending; an outline without a step is left out */
  stepsOf: Map<number, number[]>
  /** steps that keep in common, ascending */
  commons: number[]
}

/** What fills a face: 0 nothing, else 1 + the material's index; and the two materials where two claim it. */
export interface Filling {
  label: number
  overlap: [number, number] | null
}

/** A make-up from steps in order. */
export function makeUpOf(steps: Step[], materials: (string | null)[]): MakeUp {
  const stepsOf = new Map<number, number[]>()
  const commons: number[] = []
  const taken = steps.filter(({ does }) => does !== 'out')
  taken.forEach(({ outline, does }, n) => {
    const own = stepsOf.get(outline)
    if (own) own.push(n)
    else stepsOf.set(outline, [n])
    if (does === 'common') commons.push(n)
  })
  return { steps: taken, materials, stepsOf, commons }
}

/**
 * Steps of a stated make-up, each with the outline nearest to its point; `off[n]` is how far that is. Outlines
 * that are not taken (`part`) are left out.
 */
export function statedSteps(
  set: OutlineSet,
  makeUp: MakeUpStep[],
  taken: Uint8Array,
): { steps: Step[]; materials: (string | null)[]; off: number[] } {
  const outlines = namedOutlines(
    set,
    makeUp.map(({ at }) => at),
  )
  const materials: (string | null)[] = []
  const indexOf = (material: string | null) => {
    if (!materials.includes(material)) materials.push(material)
    return materials.indexOf(material)
  }
  const off: number[] = []
  const steps = makeUp.map(({ at, does, material }, n): Step => {
    const outline = outlines[n]
    off.push(outline < 0 ? 0 : distanceTo(set, outline, at))
    const used = outline >= 0 && taken[outline] ? does : 'out'
    return { outline, does: used, material: used === 'add' ? indexOf(material ?? null) : 0 }
  })
  return { steps, materials, off }
}

/**
 * The outline each point names: the one whose own point it is, to the last bit, where that is one only (a point that
 * lies on two outlines still means the one it was given for), else the nearest.
 */
function namedOutlines(set: OutlineSet, points: XY[]): Int32Array {
  const own = new Map<string, number>()
  for (let k = 0; k < set.count; k++) {
    const key = `${set.at[2 * k]},${set.at[2 * k + 1]}`
    own.set(key, own.has(key) ? -1 : k)
  }
  const outlines = Int32Array.from(points, ([x, y]) => own.get(`${x},${y}`) ?? -1)
  const rest = points.flatMap((_, n) => (outlines[n] < 0 ? [n] : []))
  const nearest = nearestOutlines(
    set,
    rest.map((n) => points[n]),
  )
  rest.forEach((n, r) => {
    outlines[n] = nearest[r]
  })
  return outlines
}

/** Distance of a point from the boundary of an outline. */
export function distanceTo(set: OutlineSet, outline: number, [x, y]: XY): number {
  let least = Number.POSITIVE_INFINITY
  for (let i = set.loopStart[outline]; i < set.loopStart[outline + 1]; i++) {
    least = Math.min(least, nearestOn(set.edges, i, x, y).distance)
  }
  return least
}

/**
 * What fills the points that lie in the given outlines and in no other. Steps in order, beginning with nothing: add
 * puts its material, cut takes all away inside, common takes all away outside.
 */
export function fillingOf(makeUp: MakeUp, outlines: Iterable<number>): Filling {
  const inside = new Set(outlines)
  const active: number[] = []
  for (const outline of inside) active.push(...(makeUp.stepsOf.get(outline) ?? []))
  for (const n of makeUp.commons) if (!inside.has(makeUp.steps[n].outline)) active.push(n)
  active.sort((a, b) => a - b)
  let label = 0
  let overlap: Filling['overlap'] = null
  for (const n of active) {
    const { does, material, outline } = makeUp.steps[n]
    if (does === 'add') {
      if (label !== 0 && label !== material + 1) overlap = [label - 1, material]
      label = material + 1
    } else if (does === 'cut' || !inside.has(outline)) {
      label = 0
      overlap = null
    }
  }
  return { label, overlap }
}
