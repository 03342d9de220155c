import { type Finding, placeText } from '../finding'
import type { OutlineSet, Tolerances } from '../outlineSet'
import { nearestOutlines } from '../nearestOutlines'
import type { Bond, Does, MakeUpStep, XY } from '../recipe'
import type { Region, Repair } from '../region'
import { MOST_CROSSINGS } from './arrange'
import { type Combined, combine, loopsWhere } from './combine'
import { defaultSteps } from './defaultSteps'
import type { Narrow } from './facing'
import { combineFinding } from './findings'
import { distanceTo, type MakeUp, makeUpOf, type Step, statedSteps } from './makeUp'
import { narrowPlaces } from './narrow'
import { abutting, overlaps, thinOverlaps } from './questions'
import { regionFrom } from './regionFrom'
import { type Tangle, tangleOf } from './tangle'

/** What of the recipe the combination reads. */
export interface Combination {
  makeUp: MakeUpStep[] | null
  part: XY[] | null
  bonds: Bond[]
}

export interface RegionAnswer {
  /** null where the drawing does not determine it; the findings then hold an error */
  region: Region | null
  /** the metal of each material, shared edges in both */
  parts: { material: string | null; region: Region }[]
  /** what each outline of the set does */
  roles: Does[]
  /** the outlines that take part, in the order of the make-up */
  steps: { outline: number; does: Does; material: string | null }[]
  findings: Finding[]
  /** slits, gaps and walls of a few µm: what a person has to decide */
  narrow: Narrow[]
  /** area that answers about these have added to what the make-up gives */
  answered: number
  /** repairs of the outlines that take part; area as it counts in the region */
  repairs: Repair[]
}

/**
 * The net metal of a set of outlines after the make-up: steps in order, beginning with nothing; add is union, cut
 * difference, common intersection with everything so far, an outline not named is left out. Without a make-up, by nesting
 * depth among the outlines taken (even adds, odd cuts); outlines that cross have no default. Only outlines that meet
 * others are arranged, the rest are taken whole. Edges keep their carriers to the last bit. Drawing units; `mmPerUnit`
 * only for sentences and the 0.05 mm below which a gap is asked about.
 */
export function regionOf(
  set: OutlineSet,
  { makeUp, part, bonds }: Combination,
  tolerances: Tolerances,
  mmPerUnit = 1,
): RegionAnswer {
  const findings: Finding[] = []
  const taken = takenOutlines(set, part)
  const named = makeUp && statedSteps(set, makeUp, taken)
  if (named) findings.push(...pointsOff(makeUp, named.off, tolerances, mmPerUnit))
  if (part) findings.push(...partOff(set, part, tolerances, mmPerUnit))
  const used = named ? usedBy(set.count, named.steps) : taken
  const failed = (finding: Finding): RegionAnswer => ({
    region: null,
    parts: [],
    roles: rolesOf(set.count, named?.steps ?? []),
    steps: [],
    findings: [...findings, finding],
    narrow: [],
    answered: 0,
    repairs: [],
  })
  if (!used.includes(1)) return failed(combineFinding('no-outlines', {}))

  const tangles: Tangle[] = []
  for (const cluster of set.clusters) {
    const members = cluster.filter((k) => used[k])
    if (members.length === 0 || (members.length === 1 && cluster.length > 1)) continue
    const tangle = tangleOf(set, members, tolerances.snap)
    const at: XY = [set.at[2 * members[0]], set.at[2 * members[0] + 1]]
    if (!tangle) return failed(combineFinding('too-many-crossings', { x: at[0], y: at[1], most: MOST_CROSSINGS }, at))
    tangles.push(tangle)
  }

  let { steps, materials } = named ?? { steps: [], materials: [null] }
  if (!named) {
    const open = undecidedFinding(set, taken)
    if (open) return failed(open)
    const byNesting = defaultSteps(set, taken, tangles)
    if (byNesting.crossing) return failed(crossingFinding(set, byNesting.crossing))
    steps = byNesting.steps
  }
  const plan = makeUpOf(steps, materials)
  const combined = combine(set, plan, tangles, !named)
  const { loops, faults } = loopsWhere(set, combined, ({ label }) => label > 0)
  if (faults.length > 0) return failed(combineFinding('boundary-unclear', { x: faults[0][0], y: faults[0][1] }, faults[0]))
  if (loops.area.length === 0) return failed(combineFinding('no-metal', {}))
  const region = regionFrom(loops)
  if (!named) findings.push(...abutting(combined, mmPerUnit))
  findings.push(...overlaps(set, combined, materials, bonds, mmPerUnit))
  const narrow = narrowPlaces(region, loops.area, bonds, tolerances, mmPerUnit)
  findings.push(...narrow.findings, ...thinOverlaps(combined, tolerances.duplicate, narrow.findings, mmPerUnit))
  return {
    region,
    parts: partsOf(set, combined, plan, region),
    roles: rolesOf(set.count, steps),
    steps: plan.steps.map(({ outline, does, material }) => ({ outline, does, material: materials[material] ?? null })),
    findings,
    narrow: narrow.narrow,
    answered: 0,
    repairs: repairsOf(set, plan),
  }
}

function takenOutlines(set: OutlineSet, part: XY[] | null): Uint8Array {
  if (!part) return new Uint8Array(set.count).fill(1)
  const taken = new Uint8Array(set.count)
  for (const k of nearestOutlines(set, part)) if (k >= 0) taken[k] = 1
  return taken
}

function usedBy(count: number, steps: Step[]): Uint8Array {
  const used = new Uint8Array(count)
  for (const { outline, does } of steps) if (does !== 'out') used[outline] = 1
  return used
}

function rolesOf(count: number, steps: Step[]): Does[] {
  const roles = new Array<Does>(count).fill('out')
  for (const { outline, does } of steps) if (outline >= 0 && does !== 'out') roles[outline] = does
  return roles
}

function pointsOff(makeUp: MakeUpStep[], off: number[], { chaining }: Tolerances, mmPerUnit: number): Finding[] {
  const far = makeUp.flatMap(({ at }, n) => (off[n] > 10 * chaining ? [{ at, n }] : []))
  return far.map(({ at, n }) =>
    combineFinding('make-up-point-off', { step: n + 1, x: at[0], y: at[1], distance: off[n] * mmPerUnit }, at, off[n]),
  )
}

/** Share of the nearest outline's size beyond which a point of the part names nothing. */
const FARTHEST = 0.05

function partOff(set: OutlineSet, part: XY[], { chaining }: Tolerances, mmPerUnit: number): Finding[] {
  const outlines = nearestOutlines(set, part)
  return part.flatMap(([x, y], n) => {
    const k = outlines[n]
    const off = k < 0 ? 0 : distanceTo(set, k, [x, y])
    if (off <= 10 * chaining) return []
    const { bounds } = set
    const size = Math.max(bounds[4 * k + 2] - bounds[4 * k], bounds[4 * k + 3] - bounds[4 * k + 1])
    // a point on each outline is asked for; one this far away means no outline at all, and a figure would be a guess
    const code = off > FARTHEST * size ? 'part-not-found' : 'part-point-off'
    return [combineFinding(code, { x, y, distance: off * mmPerUnit }, [x, y], off)]
  })
}

/** Faces that wait for "metal or void?" among the outlines taken: nesting would guess. */
function undecidedFinding(set: OutlineSet, taken: Uint8Array): Finding | null {
  const waiting = Array.from({ length: set.count }, (_, k) => k).filter((k) => taken[k] && set.undecided[k])
  if (waiting.length === 0) return null
  const [x, y] = [set.at[2 * waiting[0]], set.at[2 * waiting[0] + 1]]
  return combineFinding('faces-undecided', { count: waiting.length, x, y }, [x, y])
}

const NAMED = 6

function crossingFinding(set: OutlineSet, crossing: [number, number][]): Finding {
  const outlines = [...new Set(crossing.flat())]
  const point = (k: number): XY => [set.at[2 * k], set.at[2 * k + 1]]
  const names = outlines.slice(0, NAMED).map((k) => placeText({ x: point(k)[0], y: point(k)[1] }))
  const places = outlines.length > NAMED ? `${names.join(', ')} and further` : names.join(', ')
  const [x, y] = point(outlines[0])
  return combineFinding('make-up-needed', { count: outlines.length, places, x, y }, [x, y])
}

function partsOf(set: OutlineSet, combined: Combined, { materials, steps }: MakeUp, region: Region): RegionAnswer['parts'] {
  const adding = [...new Set(steps.filter(({ does }) => does === 'add').map(({ material }) => material))]
  if (adding.length === 1) return [{ material: materials[adding[0]], region }]
  return adding.flatMap((material) => {
    const { loops } = loopsWhere(set, combined, ({ label }) => label === material + 1)
    return loops.area.length === 0 ? [] : [{ material: materials[material], region: regionFrom(loops) }]
  })
}

function repairsOf(set: OutlineSet, { stepsOf, steps }: MakeUp): Repair[] {
  if (set.repairs.length === 0) return []
  const outlines = nearestOutlines(
    set,
    set.repairs.map(({ x, y }): XY => [x, y]),
  )
  return set.repairs.flatMap((repair, n) => {
    const own = stepsOf.get(outlines[n])
    if (!own) return []
    return [steps[own[own.length - 1]].does === 'cut' ? { ...repair, area: -repair.area } : repair]
  })
}
