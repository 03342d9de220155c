import Flatbush from 'flatbush'
import type { EdgeTable } from './edges'
import { insideLoop, insideRows } from './inside'

/** Rows of one large loop in slabs of equal height: slab s holds rows[start[s]] … rows[start[s + 1] − 1]. */
interface Slabs {
  minY: number
  height: number
  start: Uint32Array
  rows: Uint32Array
}

const SMALL_LOOP = 48

function slabsOf(edgeBoxes: Float64Array, from: number, to: number, minY: number, maxY: number): Slabs {
  const count = Math.min(1 << 16, Math.ceil((to - from) / 4))
  const height = (maxY - minY) / count || 1
  const slab = (y: number) => Math.max(0, Math.min(count - 1, Math.floor((y - minY) / height)))
  const start = new Uint32Array(count + 1)
  for (let i = from; i < to; i++) for (let s = slab(edgeBoxes[4 * i + 1]); s <= slab(edgeBoxes[4 * i + 3]); s++) start[s + 1]++
  for (let s = 0; s < count; s++) start[s + 1] += start[s]
  const rows = new Uint32Array(start[count])
  const fill = start.slice()
  for (let i = from; i < to; i++)
    for (let s = slab(edgeBoxes[4 * i + 1]); s <= slab(edgeBoxes[4 * i + 3]); s++) rows[fill[s]++] = i
  return { minY, height, start, rows }
}

export interface Loops {
  edges: EdgeTable
  loopStart: Uint32Array
  count: number
  area: Float64Array
  bounds: Float64Array
}

/** Tests points against loops, each large loop indexed once by height. */
export function loopTester(
  { edges, loopStart, bounds }: Loops,
  edgeBoxes: Float64Array,
): (loop: number, x: number, y: number) => boolean {
  const slabs = new Map<number, Slabs>()
  return (loop, x, y) => {
    if (x < bounds[4 * loop] || y < bounds[4 * loop + 1] || x > bounds[4 * loop + 2] || y > bounds[4 * loop + 3]) return false
    const from = loopStart[loop]
    const to = loopStart[loop + 1]
    if (to - from <= SMALL_LOOP) return insideLoop(edges, from, to, x, y)
    let index = slabs.get(loop)
    if (!index) {
      index = slabsOf(edgeBoxes, from, to, bounds[4 * loop + 1], bounds[4 * loop + 3])
      slabs.set(loop, index)
    }
    const last = index.start.length - 2
    const s = Math.max(0, Math.min(last, Math.floor((y - index.minY) / index.height)))
    return insideRows(edges, index.rows, index.start[s], index.start[s + 1], x, y)
  }
}

const UNKNOWN = -1

/**
 * Nesting depth of each loop: how many other loops hold its probe point (x y per loop), which must lie inside or on the
 * loop and on no other. Candidates come from an index of boxes; a loop can lie only in one of greater area, and one more
 * deep than the smallest that holds it, its parent (−1 outside all), unless that one is among the `crossing`: then all
 * are counted.
 */
export function nest(
  loops: Loops,
  inside: (loop: number, x: number, y: number) => boolean,
  probes: Float64Array,
  crossing: Uint8Array,
): { depth: Int32Array; parent: Int32Array } {
  const depth = new Int32Array(loops.count)
  const parent = new Int32Array(loops.count).fill(-1)
  if (loops.count < 2) return { depth, parent }
  const index = new Flatbush(loops.count)
  const b = loops.bounds
  for (let k = 0; k < loops.count; k++) index.add(b[4 * k], b[4 * k + 1], b[4 * k + 2], b[4 * k + 3])
  index.finish()
  const { area } = loops
  for (let k = 0; k < loops.count; k++) {
    const x = probes[2 * k]
    const y = probes[2 * k + 1]
    let least = -1
    index.search(x, y, x, y, (other) => {
      const between = area[other] > area[k] && (least < 0 || area[other] < area[least])
      if (between && other !== k && inside(other, x, y)) least = other
      return false
    })
    parent[k] = least
    depth[k] = least < 0 ? 0 : UNKNOWN
    if (least < 0 || !crossing[least]) continue
    depth[k] = 0
    index.search(x, y, x, y, (other) => {
      if (other !== k && area[other] > area[k] && inside(other, x, y)) depth[k]++
      return false
    })
  }
  for (let k = 0; k < loops.count; k++) {
    let steps = 0
    let known = k
    for (; depth[known] === UNKNOWN; known = parent[known]) steps++
    for (let at = k; at !== known; at = parent[at]) depth[at] = depth[known] + steps--
  }
  return { depth, parent }
}
