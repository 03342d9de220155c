import Flatbush from 'flatbush'
import { boundsOfEdges } from './bounds'
import { moveEnd } from './carrier'
import { type EdgeTable, emptyTable, LINE, pushCopy } from './edges'
import { nearestOn } from './nearest'
import { selectLoops } from './selectLoops'

/** Open chains that outlines close: the net they form with these, and the chains that stay open. */
export interface ChainsOnLoops {
  net: EdgeTable | null
  openEdges: EdgeTable
  openStart: number[]
}

/**
 * Finds open chains both ends of which lie on closed loops within the tolerance (a lug of three lines on the side of a
 * plate): together with the loop they bound a face. Their ends are brought onto the loop. A single straight line bounds
 * no thickness and stays open.
 */
export function chainsOnLoops(
  edges: EdgeTable,
  loopStart: ArrayLike<number>,
  openEdges: EdgeTable,
  openStart: number[],
  tolerance: number,
): ChainsOnLoops {
  const chains = openStart.length - 1
  const bent = (k: number) => openStart[k + 1] - openStart[k] > 1 || openEdges.kind[openStart[k]] !== LINE
  const asked = Array.from({ length: chains }, (_, k) => k).filter(bent)
  if (asked.length === 0 || edges.count === 0) return { net: null, openEdges, openStart }
  const boxes = boundsOfEdges(edges)
  const index = new Flatbush(edges.count)
  for (let i = 0; i < edges.count; i++) index.add(boxes[4 * i], boxes[4 * i + 1], boxes[4 * i + 2], boxes[4 * i + 3])
  index.finish()
  const footOf = (x: number, y: number) =>
    index
      .search(x - tolerance, y - tolerance, x + tolerance, y + tolerance)
      .map((i) => ({ i, ...nearestOn(edges, i, x, y) }))
      .filter(({ distance }) => distance <= tolerance)
      .sort((a, b) => a.distance - b.distance || a.i - b.i)[0]
  const net = emptyTable()
  const onLoop = new Uint8Array(chains)
  const touched = new Set<number>()
  for (const k of asked) {
    const e = openEdges.ends
    const first = footOf(e[4 * openStart[k]], e[4 * openStart[k] + 1])
    const last = footOf(e[4 * openStart[k + 1] - 2], e[4 * openStart[k + 1] - 1])
    if (!first || !last) continue
    onLoop[k] = 1
    const from = net.count
    for (let i = openStart[k]; i < openStart[k + 1]; i++) pushCopy(net, openEdges, i)
    moveEnd(net, from, 0, first.x, first.y)
    moveEnd(net, net.count - 1, 1, last.x, last.y)
    for (const { i } of [first, last]) touched.add(loopOf(loopStart, i))
  }
  if (net.count === 0) return { net: null, openEdges, openStart }
  for (const k of touched) for (let i = loopStart[k]; i < loopStart[k + 1]; i++) pushCopy(net, edges, i)
  const open = selectLoops(openEdges, Uint32Array.from(openStart), (k) => onLoop[k] === 0)
  return { net, openEdges: open.edges, openStart: [...open.loopStart] }
}

function loopOf(loopStart: ArrayLike<number>, row: number): number {
  let low = 0
  let high = loopStart.length - 1
  while (high - low > 1) {
    const middle = (low + high) >> 1
    if (loopStart[middle] <= row) low = middle
    else high = middle
  }
  return low
}
