import Flatbush from 'flatbush'
import type { OutlineSet } from './outlineSet'

/** Outlines that lie apart from all others: a detail of a sheet. */
export interface OutlineGroup {
  minX: number
  minY: number
  maxX: number
  maxY: number
  outlines: number
}

/** Outlines closer than this share of the smaller one's greater side belong together. */
const APART = 0.25

/**
 * Groups outlines by the distance of their boxes: two that no other holds belong together where it is at most a quarter
 * of the smaller one's greater side, and so on from one to the next; what lies inside goes with what holds it. `alone`
 * outlines (frames) are groups of their own and hold nothing. Groups are numbered in the order of their first outline.
 */
export function groupOutlines(
  { bounds, count, parent }: Pick<OutlineSet, 'bounds' | 'count' | 'parent'>,
  alone: Uint8Array,
): { group: Uint32Array; groups: OutlineGroup[] } {
  const leader = new Uint32Array(count).map((_, k) => k)
  const find = (k: number): number => {
    let root = k
    while (leader[root] !== root) {
      leader[root] = leader[leader[root]]
      root = leader[root]
    }
    return root
  }
  const unite = (a: number, b: number) => {
    const p = find(a)
    const q = find(b)
    leader[Math.max(p, q)] = Math.min(p, q)
  }
  const outer: number[] = []
  for (let k = 0; k < count; k++) {
    if (alone[k]) continue
    if (parent[k] >= 0 && !alone[parent[k]]) unite(k, parent[k])
    else outer.push(k)
  }
  uniteNear(bounds, outer, unite)
  const number = new Map<number, number>()
  const group = new Uint32Array(count)
  const groups: OutlineGroup[] = []
  for (let k = 0; k < count; k++) {
    const root = find(k)
    let known = number.get(root)
    if (known === undefined) {
      known = groups.length
      number.set(root, known)
      const nothing = { minX: Number.POSITIVE_INFINITY, minY: Number.POSITIVE_INFINITY }
      groups.push({ ...nothing, maxX: Number.NEGATIVE_INFINITY, maxY: Number.NEGATIVE_INFINITY, outlines: 0 })
    }
    group[k] = known
    const own = groups[known]
    own.minX = Math.min(own.minX, bounds[4 * k])
    own.minY = Math.min(own.minY, bounds[4 * k + 1])
    own.maxX = Math.max(own.maxX, bounds[4 * k + 2])
    own.maxY = Math.max(own.maxY, bounds[4 * k + 3])
    own.outlines++
  }
  return { group, groups }
}

function uniteNear(bounds: Float64Array, outer: number[], unite: (a: number, b: number) => void): void {
  if (outer.length < 2) return
  const side = (k: number) => Math.max(bounds[4 * k + 2] - bounds[4 * k], bounds[4 * k + 3] - bounds[4 * k + 1])
  const index = new Flatbush(outer.length)
  for (const k of outer) index.add(bounds[4 * k], bounds[4 * k + 1], bounds[4 * k + 2], bounds[4 * k + 3])
  index.finish()
  for (const k of outer) {
    const own = side(k)
    const reach = APART * own
    const b = 4 * k
    index.search(bounds[b] - reach, bounds[b + 1] - reach, bounds[b + 2] + reach, bounds[b + 3] + reach, (n) => {
      if (side(outer[n]) >= own && outer[n] !== k) unite(k, outer[n])
      return false
    })
  }
}
