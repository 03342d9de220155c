import Flatbush from 'flatbush'
import { boundsOfEdges } from './bounds'
import { moveEnd } from './carrier'
import { type EdgeTable, emptyTable, LINE, pushCopy } from './edges'
import { nearestOn } from './nearest'
import { selectLoops } from './selectLoops'
import { snapEnds } from './snapEnds'
import { wallLines } from './wallLines'

/** Open chains and nets that outlines close: the net they form with these, and what is left of both. */
export interface ChainsOnLoops {
  net: EdgeTable | null
  openEdges: EdgeTable
  openStart: number[]
  nets: EdgeTable[]
}

/** Where an end lies on a loop. */
interface Foot {
  /** row and end in the table of the chain or net */
  row: number
  end: 0 | 1
  x: number
  y: number
  loop: number
}

/**
 * Finds open chains both ends of which lie on closed loops within the tolerance (a lug of three lines on the side of a
 * plate), and nets with two such ends (webs that cross inside a chamber): together with the loops they bound faces. Their
 * ends are brought onto the loops. A straight line across an outline bounds no thickness and stays open unless another
 * line beside it may make a wall of both.
 */
export function chainsOnLoops(
  edges: EdgeTable,
  loopStart: ArrayLike<number>,
  { openEdges, openStart, nets }: Omit<ChainsOnLoops, 'net'>,
  { chaining, snap }: { chaining: number; snap: number },
): ChainsOnLoops {
  const chains = openStart.length - 1
  if (edges.count === 0 || chains + nets.length === 0) return { net: null, openEdges, openStart, nets }
  const footOf = footFinder(edges, loopStart, chaining)
  const feetOfChain = Array.from({ length: chains }, (_, k): Foot[] => {
    const feet = [footOf(openEdges, openStart[k], 0), footOf(openEdges, openStart[k + 1] - 1, 1)]
    return feet.flatMap((foot) => foot ?? [])
  })
  const isStraight = (k: number) => openStart[k + 1] - openStart[k] === 1 && openEdges.kind[openStart[k]] === LINE
  const onLoops = feetOfChain.flatMap((feet, k) => (feet.length === 2 ? [k] : []))
  const straight = onLoops.filter(isStraight).map((k) => {
    const [a, b] = feetOfChain[k]
    return { chain: k, a, b }
  })
  const feetOfNet = nets.map((table) => freeEnds(table, snap).flatMap(([row, end]) => footOf(table, row, end) ?? []))
  const bent = onLoops.filter((k) => !isStraight(k))
  const asked = [...feetOfNet.filter((feet) => feet.length > 1), ...bent.map((k) => feetOfChain[k])].flat()
  const walls = wallLines(straight, new Set(asked.map(({ loop }) => loop)))
  const takenChains = new Set([...bent, ...walls])
  const net = emptyTable()
  const touched = new Set<number>()
  const take = (table: EdgeTable, from: number, to: number, feet: Foot[]) => {
    const shift = net.count - from
    for (let i = from; i < to; i++) pushCopy(net, table, i)
    for (const { row, end, x, y, loop } of feet) {
      moveEnd(net, row + shift, end, x, y)
      touched.add(loop)
    }
  }
  for (const k of takenChains) take(openEdges, openStart[k], openStart[k + 1], feetOfChain[k])
  nets.forEach((table, n) => {
    if (feetOfNet[n].length > 1) take(table, 0, table.count, feetOfNet[n])
  })
  if (net.count === 0) return { net: null, openEdges, openStart, nets }
  for (const k of touched) for (let i = loopStart[k]; i < loopStart[k + 1]; i++) pushCopy(net, edges, i)
  const open = selectLoops(openEdges, Uint32Array.from(openStart), (k) => !takenChains.has(k))
  return {
    net,
    openEdges: open.edges,
    openStart: [...open.loopStart],
    nets: nets.filter((_, n) => feetOfNet[n].length < 2),
  }
}

/** Finds the nearest point on the loops within the tolerance of an end. */
function footFinder(edges: EdgeTable, loopStart: ArrayLike<number>, tolerance: number) {
  const boxes = boundsOfEdges(edges)
  const index = new Flatbush(edges.count)
  for (let i = 0; i < edges.count; i++) index.add(boxes[4 * i], boxes[4 * i + 1], boxes[4 * i + 2], boxes[4 * i + 3])
  index.finish()
  return (table: EdgeTable, row: number, end: 0 | 1): Foot | null => {
    const [x, y] = table.ends.subarray(4 * row + 2 * end, 4 * row + 2 * end + 2)
    const nearest = index
      .search(x - tolerance, y - tolerance, x + tolerance, y + tolerance)
      .map((i) => ({ i, ...nearestOn(edges, i, x, y) }))
      .filter(({ distance }) => distance <= tolerance)
      .sort((a, b) => a.distance - b.distance || a.i - b.i)[0]
    return nearest ? { row, end, x: nearest.x, y: nearest.y, loop: loopOf(loopStart, nearest.i) } : null
  }
}

/** Ends of a net at which nothing else ends. */
function freeEnds(table: EdgeTable, snap: number): [number, 0 | 1][] {
  const rows = Uint32Array.from({ length: table.count }, (_, i) => i)
  const { vertex, degree } = snapEnds(table, rows, snap)
  const free: [number, 0 | 1][] = []
  vertex.forEach((v, end) => {
    if (degree[v] === 1) free.push([end >> 1, (end & 1) as 0 | 1])
  })
  return free
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
