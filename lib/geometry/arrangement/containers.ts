import Flatbush from 'flatbush'
import { boundsOfEdges } from '../bounds'
import { type Loops, loopTester } from '../nest'

/**
 * Which loops hold each loop's probe point (x y per loop), among the loops for which `used` is 1. A loop can lie only
 * in one of greater area. `skip(k, other)` leaves out pairs that are known otherwise.
 */
export function containersOf(
  loops: Loops,
  probes: Float64Array,
  used: Uint8Array,
  skip: (k: number, other: number) => boolean,
  edgeBoxes = boundsOfEdges(loops.edges),
): number[][] {
  const { count, bounds: b, area } = loops
  const lists: number[][] = Array.from({ length: count }, () => [])
  const rows: number[] = []
  for (let k = 0; k < count; k++) if (used[k]) rows.push(k)
  if (rows.length < 2) return lists
  const index = new Flatbush(rows.length)
  for (const k of rows) index.add(b[4 * k], b[4 * k + 1], b[4 * k + 2], b[4 * k + 3])
  index.finish()
  const inside = loopTester(loops, edgeBoxes)
  for (const k of rows) {
    const x = probes[2 * k]
    const y = probes[2 * k + 1]
    index.search(x, y, x, y, (n) => {
      const other = rows[n]
      if (other !== k && Math.abs(area[other]) > Math.abs(area[k]) && !skip(k, other) && inside(other, x, y)) lists[k].push(other)
      return false
    })
    lists[k].sort((p, q) => p - q)
  }
  return lists
}
