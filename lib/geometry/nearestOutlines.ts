import Flatbush from 'flatbush'
import { boundsOfEdges } from './bounds'
import { nearestOn } from './nearest'
import type { OutlineSet } from './outlineSet'
import type { XY } from './recipe'

/**
 * For each point the outline nearest to it (distance to its boundary; of equally near ones the smaller in area), −1
 * where there are no outlines. This is how recipes name outlines.
 */
export function nearestOutlines(set: Pick<OutlineSet, 'edges' | 'loopStart' | 'count' | 'area'>, points: XY[]): Int32Array {
  const picked = new Int32Array(points.length).fill(-1)
  const { edges, loopStart, count, area } = set
  if (count === 0 || points.length === 0) return picked
  const boxes = boundsOfEdges(edges)
  const index = new Flatbush(edges.count)
  for (let i = 0; i < edges.count; i++) index.add(boxes[4 * i], boxes[4 * i + 1], boxes[4 * i + 2], boxes[4 * i + 3])
  index.finish()
  const loopOf = new Uint32Array(edges.count)
  for (let k = 0; k < count; k++) loopOf.fill(k, loopStart[k], loopStart[k + 1])
  for (const [p, [x, y]] of points.entries()) {
    const reach = nearestOn(edges, index.neighbors(x, y, 1)[0], x, y).distance * (1 + 1e-12) + 1e-300
    const near = index
      .search(x - reach, y - reach, x + reach, y + reach)
      .map((i) => ({ loop: loopOf[i], distance: nearestOn(edges, i, x, y).distance }))
    const least = near.reduce((d, { distance }) => Math.min(d, distance), Number.POSITIVE_INFINITY)
    const tie = least + 1e-12 * Math.max(Math.abs(x), Math.abs(y), least)
    for (const { loop, distance } of near) {
      const before = picked[p]
      const smaller = before < 0 || area[loop] < area[before] || (area[loop] === area[before] && loop < before)
      if (distance <= tie && smaller) picked[p] = loop
    }
  }
  return picked
}
