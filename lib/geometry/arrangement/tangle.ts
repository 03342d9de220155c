import { type EdgeTable, emptyTable, pushCopy } from '../edges'
import type { OutlineSet } from '../outlineSet'
import { type Arrangement, arrange } from './arrange'
import { contradictions } from './contradictions'
import { joinLoops, noLoops } from './loops'
import { perimeterOf } from './regionFrom'

/** Outlines of one cluster arranged together; owner n of the arrangement is outline members[n]. */
export interface Tangle {
  members: number[]
  arrangement: Arrangement
  /** members that hold each set's faces, as outlines */
  sets: number[][]
}

/** Arranges the members of a cluster; null where they cross too often. */
export function tangleOf(set: OutlineSet, members: number[], snap: number): Tangle | null {
  const edges: EdgeTable = emptyTable()
  const owner: number[] = []
  members.forEach((k, n) => {
    for (let i = set.loopStart[k]; i < set.loopStart[k + 1]; i++) {
      pushCopy(edges, set.edges, i)
      owner.push(n)
    }
  })
  const arrangement = arrange(edges, Uint32Array.from(owner), members.length, snap)
  return arrangement && { members, arrangement, sets: arrangement.sets.map((held) => Array.from(held, (n) => members[n])) }
}

/** How the members of a tangle lie to one another: faces held by each, and by each two that have one in common. */
export interface Relations {
  /** whether a lies in b or is the same as b */
  within: (a: number, b: number) => boolean
  /** two that each have parts inside and outside the other */
  crossing: [number, number][]
}

export function relationsOf({ arrangement, sets, members }: Tangle): Relations {
  const { count, left, right } = arrangement
  const seen = new Uint8Array(sets.length)
  for (let u = 0; u < count; u++) {
    seen[left[u]] = 1
    seen[right[u]] = 1
  }
  const faces = new Map<number, number>()
  const common = new Map<number, Map<number, number>>(members.map((k) => [k, new Map()]))
  sets.forEach((held, n) => {
    if (!seen[n]) return
    for (const a of held) {
      faces.set(a, (faces.get(a) ?? 0) + 1)
      const own = common.get(a)
      for (const b of held) if (b !== a) own?.set(b, (own.get(b) ?? 0) + 1)
    }
  })
  const shared = (a: number, b: number) => common.get(a)?.get(b) ?? 0
  const within = (a: number, b: number) => shared(a, b) > 0 && shared(a, b) === faces.get(a)
  const crossing: [number, number][] = []
  for (const a of members) {
    for (const b of common.get(a)?.keys() ?? []) if (a < b && !within(a, b) && !within(b, a)) crossing.push([a, b])
  }
  return { within, crossing }
}

/**
 * A vertex where rays and order contradict one another in earnest: `full` tells by set what is inside, and some member,
 * put together again from its own faces, has not the area it was drawn with. Null where all is well.
 */
export function unclearAt({ arrangement: a, members }: Tangle, set: OutlineSet, full: boolean[]): number | null {
  const [vertex] = contradictions(a, full)
  if (vertex === undefined) return null
  const sound = members.every((k, n) => {
    const inside = a.sets.map((held) => held.includes(n))
    const loops = noLoops()
    const faults = joinLoops(a, (u) => Number(inside[a.left[u]]) - Number(inside[a.right[u]]), loops)
    const area = loops.area.reduce((sum, v) => sum + v, 0)
    const allowed = 8 * a.tolerance * perimeterOf(set, k) + 1e-9 * set.area[k]
    return faults.length === 0 && Math.abs(area - set.area[k]) <= allowed
  })
  return sound ? null : vertex
}
