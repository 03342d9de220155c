import Flatbush from 'flatbush'
import { boundsOfEdges } from './bounds'
import { visitBoxPairs } from './boxPairs'
import { moveEnd } from './carrier'
import { ARC, type EdgeTable, emptyTable, LINE, pushCopy } from './edges'
import { jetAt, lengthOf, newJet } from './evaluate'
import { liesOnEdge, mayOverlap, overlapOf, stretchAlong } from './overlap'

/** Pairs of boxes looked at most; edges doubled beyond it stay, and are reported as branches. */
const MOST_PAIRS = 200_000_000

/** Loose edges after what was drawn twice is merged. */
export interface Merged {
  edges: EdgeTable
  /** edges that went into another one, and the length drawn twice */
  count: number
  length: number
  at: [number, number] | null
}

/** Loose edges that lie wholly on one edge of a closed outline. */
function onOutlines(loose: EdgeTable, boxes: Float64Array, closed: EdgeTable, tolerance: number): Uint8Array {
  const dropped = new Uint8Array(loose.count)
  if (closed.count === 0) return dropped
  const index = new Flatbush(loose.count)
  for (let i = 0; i < loose.count; i++) index.add(boxes[4 * i], boxes[4 * i + 1], boxes[4 * i + 2], boxes[4 * i + 3])
  index.finish()
  const closedBoxes = boundsOfEdges(closed)
  for (let j = 0; j < closed.count; j++) {
    const [minX, minY, maxX, maxY] = closedBoxes.subarray(4 * j, 4 * j + 4)
    index.search(minX - tolerance, minY - tolerance, maxX + tolerance, maxY + tolerance, (i) => {
      if (!dropped[i] && loose.kind[i] === closed.kind[j] && liesOnEdge(loose, i, closed, j, tolerance)) dropped[i] = 1
      return false
    })
  }
  return dropped
}

/** The edge that a group of overlapping edges becomes: the longest one's carrier over the whole stretch. */
function pushUnion(to: EdgeTable, edges: EdgeTable, group: number[], tolerance: number): void {
  const longest = group.reduce((best, i) => (lengthOf(edges, i) > lengthOf(edges, best) ? i : best))
  const length = lengthOf(edges, longest)
  const row = pushCopy(to, edges, longest)
  if (edges.kind[longest] !== LINE && edges.kind[longest] !== ARC) return
  let from = { s: 0, edge: longest }
  let until = { s: length, edge: longest }
  for (const edge of group) {
    const stretch = stretchAlong(edges, longest, edge, 4 * tolerance)
    if (!stretch) continue
    if (stretch[0] < from.s) from = { s: stretch[0], edge }
    if (stretch[1] > until.s) until = { s: stretch[1], edge }
  }
  const jet = newJet()
  if (edges.kind[longest] === ARC && until.s - from.s >= 2 * Math.PI * edges.shapes[edges.shape[longest] + 2] - tolerance) {
    const k = to.shape[row]
    to.shapes[k + 4] = 2 * Math.PI * Math.sign(to.shapes[k + 4])
    to.ends.copyWithin(4 * row + 2, 4 * row, 4 * row + 2)
    return
  }
  const place = (s: number, edge: number): [number, number] => {
    jetAt(edges, longest, s / length, jet)
    const e = edges.ends
    const own = [0, 2].find((end) => Math.hypot(e[4 * edge + end] - jet.x, e[4 * edge + end + 1] - jet.y) <= tolerance)
    return own === undefined ? [jet.x, jet.y] : [e[4 * edge + own], e[4 * edge + own + 1]]
  }
  if (from.edge !== longest) moveEnd(to, row, 0, ...place(from.s, from.edge))
  if (until.edge !== longest) moveEnd(to, row, 1, ...place(until.s, until.edge))
}

/**
 * Merges loose edges drawn twice: an edge that lies on an edge of a closed outline goes, collinear lines and arcs of
 * one circle that run along one another within the tolerance become one edge on the longest one's carrier, elliptical
 * arcs and Bézier pieces that lie on another one go.
 */
export function mergeDuplicates(loose: EdgeTable, closed: EdgeTable, tolerance: number): Merged {
  const boxes = boundsOfEdges(loose)
  const dropped = onOutlines(loose, boxes, closed, tolerance)
  const parent = new Int32Array(loose.count).map((_, i) => i)
  const find = (i: number): number => {
    let root = i
    while (parent[root] !== root) {
      parent[root] = parent[parent[root]]
      root = parent[root]
    }
    return root
  }
  let length = 0
  let looked = 0
  visitBoxPairs(boxes, loose.count, 0.5 * tolerance, (i, j) => {
    if (dropped[i] || dropped[j] || !mayOverlap(loose, i, j, tolerance)) return ++looked < MOST_PAIRS
    const a = find(i)
    const b = find(j)
    const common = a === b ? 0 : overlapOf(loose, i, j, tolerance)
    if (common > 0) {
      parent[Math.max(a, b)] = Math.min(a, b)
      length += common
    }
    return ++looked < MOST_PAIRS
  })
  const groups = new Map<number, number[]>()
  for (let i = 0; i < loose.count; i++) {
    if (dropped[i]) length += lengthOf(loose, i)
    else groups.set(find(i), [...(groups.get(find(i)) ?? []), i])
  }
  const edges = emptyTable(loose.count, loose.shapesUsed)
  let first = dropped.indexOf(1)
  for (const [, group] of groups) {
    if (group.length === 1) pushCopy(edges, loose, group[0])
    else {
      pushUnion(edges, loose, group, tolerance)
      if (first < 0 || group[1] < first) first = group[1]
    }
  }
  const jet = newJet()
  if (first >= 0) jetAt(loose, first, 0.5, jet)
  return { edges, count: loose.count - edges.count, length, at: first >= 0 ? [jet.x, jet.y] : null }
}
