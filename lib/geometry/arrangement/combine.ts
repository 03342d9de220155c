import { pushCopy } from '../edges'
import type { OutlineSet } from '../outlineSet'
import { reverseEdge } from '../reverseEdge'
import { containersOf } from './containers'
import { joinLoops, type Loops, noLoops } from './loops'
import { type Filling, fillingOf, type MakeUp } from './makeUp'
import { type Tangle, unclearAt } from './tangle'

/** What lies on both sides of every boundary: of whole outlines that meet no other, and of tangles by set. */
export interface Combined {
  whole: { outline: number; inside: Filling; outside: Filling }[]
  tangled: { tangle: Tangle; fillings: Filling[] }[]
}

/**
 * Fills every face by the make-up. An outline that meets no other is taken whole: what holds it decides what is on
 * either side. `nested`: the make-up is by nesting depth, so inside and outside always differ.
 */
export function combine(set: OutlineSet, makeUp: MakeUp, tangles: Tangle[], nested: boolean): Combined {
  const inTangle = new Int32Array(set.count).fill(-1)
  tangles.forEach(({ members }, n) => {
    for (const k of members) inTangle[k] = n
  })
  if (nested && tangles.length === 0) {
    const full: Filling = { label: 1, overlap: null }
    const empty: Filling = { label: 0, overlap: null }
    const whole = makeUp.steps.map(({ outline, does }) =>
      does === 'add' ? { outline, inside: full, outside: empty } : { outline, inside: empty, outside: full },
    )
    return { whole, tangled: [] }
  }
  const used = new Uint8Array(set.count)
  for (const outline of makeUp.stepsOf.keys()) used[outline] = 1
  const together = (k: number, other: number) => inTangle[k] >= 0 && inTangle[k] === inTangle[other]
  const containers = containersOf(set, set.at, used, together)
  const whole: Combined['whole'] = []
  for (let k = 0; k < set.count; k++) {
    if (!used[k] || inTangle[k] >= 0) continue
    whole.push({ outline: k, inside: fillingOf(makeUp, [...containers[k], k]), outside: fillingOf(makeUp, containers[k]) })
  }
  const tangled = tangles.map((tangle) => {
    const first = tangle.members.find((k) => used[k])
    const round = first === undefined ? [] : containers[first]
    return { tangle, fillings: tangle.sets.map((held) => fillingOf(makeUp, [...round, ...held])) }
  })
  return { whole, tangled }
}

/** The loops round all faces for which `is` holds, and the places where a boundary did not close (a fault). */
export function loopsWhere(set: OutlineSet, { whole, tangled }: Combined, is: (f: Filling) => boolean) {
  const loops = noLoops(set.edges.count, set.edges.shapesUsed)
  const faults: [number, number][] = []
  for (const { outline, inside, outside } of whole) {
    const side = Number(is(inside)) - Number(is(outside))
    if (side !== 0) pushWhole(loops, set, outline, side)
  }
  for (const { tangle, fillings } of tangled) {
    const a = tangle.arrangement
    const full = fillings.map(is)
    const unclear = unclearAt(tangle, set, full)
    if (unclear !== null) faults.push([a.x[unclear], a.y[unclear]])
    for (const v of joinLoops(a, (u) => Number(full[a.left[u]]) - Number(full[a.right[u]]), loops)) faults.push([a.x[v], a.y[v]])
  }
  return { loops, faults }
}

function pushWhole(to: Loops, set: OutlineSet, outline: number, side: number): void {
  const [from, end] = [set.loopStart[outline], set.loopStart[outline + 1]]
  for (let n = 0; n < end - from; n++) {
    if (side > 0) pushCopy(to.edges, set.edges, from + n)
    else reverseEdge(to.edges, pushCopy(to.edges, set.edges, end - 1 - n))
  }
  to.loopStart.push(to.edges.count)
  to.area.push(side * set.area[outline])
}
