import type { OutlineSet } from '../outlineSet'
import { containersOf } from './containers'
import type { Step } from './makeUp'
import { type Relations, relationsOf, type Tangle } from './tangle'

/** The default make-up, or the outlines that cross one another and need a person's word. */
export type Default = { steps: Step[]; crossing: null } | { steps: null; crossing: [number, number][] }

/**
 * By nesting among the outlines taken: even depth adds, odd depth cuts, the outer ones first. Outlines that only touch or
 * share edges nest all the same; of coincident ones the first counts; crossing ones have no default.
 */
export function defaultSteps(set: OutlineSet, taken: Uint8Array, tangles: Tangle[]): Default {
  const relations = new Map<number, Relations>()
  const used = taken.slice()
  const crossing: [number, number][] = []
  for (const tangle of tangles) {
    const related = relationsOf(tangle)
    for (const k of tangle.members) relations.set(k, related)
    crossing.push(...related.crossing)
    for (const a of tangle.members) {
      if (tangle.members.some((b) => b < a && related.within(a, b) && related.within(b, a))) used[a] = 0
    }
  }
  if (crossing.length > 0) return { steps: null, crossing }
  const depth = depths(set, used, tangles, relations)
  const order: number[] = []
  for (let k = 0; k < set.count; k++) if (used[k]) order.push(k)
  order.sort((a, b) => depth[a] - depth[b] || a - b)
  return {
    steps: order.map((outline) => ({ outline, does: depth[outline] % 2 === 0 ? 'add' : 'cut', material: 0 })),
    crossing: null,
  }
}

function depths(set: OutlineSet, used: Uint8Array, tangles: Tangle[], relations: Map<number, Relations>): Int32Array {
  if (tangles.length === 0 && used.every((u) => u === 1)) return set.depth
  const depth = new Int32Array(set.count)
  const together = (k: number, other: number) => relations.has(k) && relations.get(k) === relations.get(other)
  containersOf(set, set.at, used, together).forEach((list, k) => {
    depth[k] = list.length
  })
  for (const { members } of tangles) {
    for (const a of members)
      for (const b of members) if (a !== b && used[a] && used[b] && relations.get(a)?.within(a, b)) depth[a]++
  }
  return depth
}
