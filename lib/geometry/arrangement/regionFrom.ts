import Flatbush from 'flatbush'
import { boundsOfEdges, boundsOfLoops } from '../bounds'
import { jetAt, lengthOf, newJet } from '../evaluate'
import { loopTester } from '../nest'
import type { Region } from '../region'
import type { Loops } from './loops'

/** A region of loops that do not cross: each hole belongs to the piece of the smallest outer loop round it. */
export function regionFrom({ edges, loopStart: start, area: signed }: Loops): Region {
  const count = signed.length
  const loopStart = Uint32Array.from(start)
  const hole = new Uint8Array(count)
  const piece = new Uint32Array(count)
  let pieces = 0
  for (let k = 0; k < count; k++) {
    if (signed[k] < 0) hole[k] = 1
    else piece[k] = pieces++
  }
  if (pieces > 0 && pieces < count) {
    const edgeBoxes = boundsOfEdges(edges)
    const bounds = boundsOfLoops(edgeBoxes, start)
    const area = Float64Array.from(signed, Math.abs)
    const inside = loopTester({ edges, loopStart, count, area, bounds }, edgeBoxes)
    const outer: number[] = []
    const index = new Flatbush(pieces)
    for (let k = 0; k < count; k++) {
      if (hole[k]) continue
      outer.push(k)
      index.add(bounds[4 * k], bounds[4 * k + 1], bounds[4 * k + 2], bounds[4 * k + 3])
    }
    index.finish()
    const jet = newJet()
    for (let k = 0; k < count; k++) {
      if (!hole[k]) continue
      jetAt(edges, longestEdge(edges.ends, start[k], start[k + 1]), 0.5, jet)
      const { x, y } = jet
      let round = -1
      index.search(x, y, x, y, (n) => {
        const o = outer[n]
        if ((round < 0 || area[o] < area[round]) && area[o] >= area[k] && inside(o, x, y)) round = o
        return false
      })
      piece[k] = round < 0 ? 0 : piece[round]
    }
  }
  return { edges, loopStart, hole, piece, pieces }
}

function longestEdge(e: Float64Array, from: number, to: number): number {
  let best = from
  let longest = -1
  for (let i = from; i < to; i++) {
    const square = (e[4 * i + 2] - e[4 * i]) ** 2 + (e[4 * i + 3] - e[4 * i + 1]) ** 2
    if (square > longest) {
      longest = square
      best = i
    }
  }
  return best
}

/** Length of all edges of loop k. */
export function perimeterOf(region: Pick<Region, 'edges' | 'loopStart'>, k: number): number {
  let sum = 0
  for (let i = region.loopStart[k]; i < region.loopStart[k + 1]; i++) sum += lengthOf(region.edges, i)
  return sum
}
