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
    const [p, q] = [find(a), find(b)]
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
    const [minX, minY, maxX, maxY] = bounds.subarray(4 * k, 4 * k + 4)
    const known = number.get(root)
    if (known === undefined) {
      group[k] = groups.length
      number.set(root, groups.length)
      groups.push({ minX, minY, maxX, maxY, outlines: 1 })
      continue
    }
    const g = groups[known]
    group[k] = known
    groups[known] = {
      minX: Math.min(g.minX, minX),
      minY: Math.min(g.minY, minY),
      maxX: Math.max(g.maxX, maxX),
      maxY: Math.max(g.maxY, maxY),
      outlines: g.outlines + 1,
    }
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
    const [minX, minY, maxX, maxY] = bounds.subarray(4 * k, 4 * k + 4)
    index.search(minX - reach, minY - reach, maxX + reach, maxY + reach, (n) => {
      if (side(outer[n]) >= own && outer[n] !== k) unite(k, outer[n])
      return false
    })
  }
}
