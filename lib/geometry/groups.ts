import Flatbush from 'flatbush'

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
 * Groups outlines by the distance of their boxes: two belong together where it is at most a quarter of the smaller
 * one's greater side, and so on from one to the next. `alone` outlines (frames) are groups of their own. Groups are
 * numbered in the order of their first outline.
 */
export function groupOutlines(
  bounds: Float64Array,
  count: number,
  alone: Uint8Array,
): { group: Uint32Array; groups: OutlineGroup[] } {
  const parent = new Uint32Array(count).map((_, k) => k)
  const find = (k: number): number => {
    let root = k
    while (parent[root] !== root) {
      parent[root] = parent[parent[root]]
      root = parent[root]
    }
    return root
  }
  const side = (k: number) => Math.max(bounds[4 * k + 2] - bounds[4 * k], bounds[4 * k + 3] - bounds[4 * k + 1])
  if (count > 1) {
    const index = new Flatbush(count)
    for (let k = 0; k < count; k++) index.add(bounds[4 * k], bounds[4 * k + 1], bounds[4 * k + 2], bounds[4 * k + 3])
    index.finish()
    for (let k = 0; k < count; k++) {
      if (alone[k]) continue
      const own = side(k)
      const reach = APART * own
      const [minX, minY, maxX, maxY] = bounds.subarray(4 * k, 4 * k + 4)
      index.search(minX - reach, minY - reach, maxX + reach, maxY + reach, (other) => {
        if (!alone[other] && (side(other) > own || (side(other) === own && other < k))) {
          const [a, b] = [find(k), find(other)]
          parent[Math.max(a, b)] = Math.min(a, b)
        }
        return false
      })
    }
  }
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
