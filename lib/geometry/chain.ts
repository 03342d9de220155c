import { moveEnd } from './carrier'
import { chordLength } from './chordLength'
import { type EdgeTable, emptyTable, pushCopy } from './edges'
import { emitChain, emitLoop } from './emitLoop'
import { type Join, joinEnds } from './joinEnds'
import { BRANCH, NONE, netLabels, netTables } from './nets'
import type { Tolerances } from './outlineSet'
import { type Ends, snapEnds } from './snapEnds'

/** Loops and open chains, edge by edge in walking order, ends snapped and gaps bridged. */
export interface Chained {
  edges: EdgeTable
  loopStart: number[]
  openEdges: EdgeTable
  openStart: number[]
  /** edges connected with a vertex where more than two meet, one table a net */
  nets: EdgeTable[]
  joins: Join[]
  /** for each given edge 0 where it is in no loop, 1 where a loop walks it as given, 2 where the other way */
  inLoop: Uint8Array
}

/**
 * Joins loose edges into loops and open chains: ends within the snap first, then dangling ends within the chaining
 * tolerance (rules of joinGaps and closeGap). `rows` of `edges` are chained; the table itself is not changed.
 */
export function chain(edges: EdgeTable, rows: Uint32Array, tolerances: Tolerances, mmPerUnit: number): Chained {
  const own = copyRows(edges, rows)
  const ends = snapEnds(edges, rows, tolerances.snap)
  const mate = pairUp(ends)
  for (let end = 0; end < ends.count; end++) {
    const v = ends.vertex[end]
    if (ends.degree[v] > 1) moveEnd(own, end >> 1, (end & 1) as 0 | 1, ends.x[v], ends.y[v])
  }
  const joins = joinEnds(own, ends, mate, tolerances, mmPerUnit)
  const net = netLabels(ends, mate)
  return { ...walk(own, mate, net, tolerances.snap), nets: net ? netTables(own, net) : [], joins }
}

function copyRows(edges: EdgeTable, rows: Uint32Array): EdgeTable {
  const own = emptyTable(rows.length + 16, edges.shapesUsed)
  for (const row of rows) pushCopy(own, edges, row)
  return own
}

/** The end that each end runs into, where exactly two meet. */
function pairUp(ends: Ends): Int32Array {
  const mate = new Int32Array(ends.count).fill(NONE)
  const first = new Int32Array(ends.vertices).fill(NONE)
  for (let end = 0; end < ends.count; end++) {
    const v = ends.vertex[end]
    if (ends.degree[v] > 2) mate[end] = BRANCH
    else if (first[v] === NONE) first[v] = end
    else {
      mate[end] = first[v]
      mate[first[v]] = end
    }
  }
  return mate
}

/**
 * Follows mates: closed walks are loops, walks between ends without mate, and those there and back over the same line,
 * are open chains; nets are left aside.
 */
function walk(own: EdgeTable, mate: Int32Array, net: Int32Array | null, snap: number): Omit<Chained, 'nets' | 'joins'> {
  const seen = new Uint8Array(own.count)
  const edges = emptyTable(own.count + 64, own.shapesUsed)
  const openEdges = emptyTable()
  const loopStart = [0]
  const openStart = [0]
  const inLoop = new Uint8Array(own.count)
  const steps = new Int32Array(own.count)
  for (let k = 0; k < own.count; k++) {
    if (seen[k] || (net && net[k] >= 0)) continue
    let enter = 2 * k
    while (mate[enter] !== NONE && mate[enter] >> 1 !== k) enter = mate[enter] ^ 1
    const closed = mate[enter] !== NONE
    if (closed) enter = 2 * k
    let count = 0
    for (let end = enter; end !== NONE; end = mate[end ^ 1]) {
      if (count > 0 && end === enter) break
      seen[end >> 1] = 1
      steps[count++] = end
    }
    if (closed) {
      const from = edges.count
      const shapes = edges.shapesUsed
      const area = emitLoop(edges, own, steps, count)
      if (Math.abs(area) > snap * chordLength(edges, from, edges.count)) {
        loopStart.push(edges.count)
        for (let n = 0; n < count; n++) inLoop[steps[n] >> 1] = area > 0 === ((steps[n] & 1) === 0) ? 1 : 2
        continue
      }
      edges.count = from
      edges.shapesUsed = shapes
    }
    emitChain(openEdges, own, steps, count)
    openStart.push(openEdges.count)
  }
  return { edges, loopStart, openEdges, openStart, inLoop }
}
