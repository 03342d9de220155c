import { moveEnd } from './carrier'
import { closeGap, type EndRef } from './closeGap'
import { ARC, type EdgeTable, ELLIPSE, emptyTable, pushCopy } from './edges'
import { emitChain, emitLoop } from './emitLoop'
import { lengthOf } from './evaluate'
import type { Finding } from './finding'
import { geometryFinding } from './findings'
import { joinGaps } from './joinGaps'
import { BRANCH, NONE, netLabels, netTables } from './nets'
import type { Tolerances } from './outlineSet'
import type { Repair } from './region'
import { type Ends, snapEnds } from './snapEnds'

/** Loops and open chains, edge by edge in walking order, ends snapped and gaps bridged. */
export interface Chained {
  edges: EdgeTable
  loopStart: number[]
  openEdges: EdgeTable
  openStart: number[]
  /** edges connected with a vertex where more than two meet, one table a net */
  nets: EdgeTable[]
  repairs: Repair[]
  findings: Finding[]
}

/**
 * Joins loose edges into loops and open chains: ends within the snap first, then dangling ends within the chaining
 * tolerance (rules of joinGaps and closeGap). `rows` of `edges` are chained; the table itself is not changed.
 */
export function chain(edges: EdgeTable, rows: Uint32Array, tolerances: Tolerances, mmPerUnit: number): Chained {
  const own = copyRows(edges, rows)
  const all = new Uint32Array(rows.length).map((_, k) => k)
  const ends = snapEnds(own, all, tolerances.snap)
  const mate = pairUp(ends)
  for (let end = 0; end < ends.count; end++) {
    const v = ends.vertex[end]
    if (ends.degree[v] > 1) moveEnd(own, end >> 1, (end & 1) as 0 | 1, ends.x[v], ends.y[v])
  }
  const repairs: Repair[] = []
  const findings: Finding[] = []
  joinWithinTolerance(own, ends, mate, tolerances, mmPerUnit, repairs, findings)
  const net = netLabels(ends, mate)
  return { ...walk(own, mate, net), nets: net ? netTables(own, net) : [], repairs, findings }
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

/** How much the last digit of the drawing can move an end: an arc's end by its radius' and its angles' digits too. */
function leverArm(edges: EdgeTable, row: number): number {
  const s = edges.shapes
  const k = edges.shape[row]
  switch (edges.kind[row]) {
    case ARC:
      return 2 + (s[k + 2] * Math.PI) / 180
    case ELLIPSE:
      return 2 + Math.max(Math.hypot(s[k + 2], s[k + 3]), Math.hypot(s[k + 4], s[k + 5]))
    default:
      return 1
  }
}

function joinWithinTolerance(
  own: EdgeTable,
  ends: Ends,
  mate: Int32Array,
  tolerances: Tolerances,
  mmPerUnit: number,
  repairs: Repair[],
  findings: Finding[],
): void {
  const joins = joinGaps(ends, tolerances.chaining, (k) => lengthOf(own, k) > 4 * tolerances.chaining)
  const ref = (end: number): EndRef => ({
    row: end >> 1,
    end: (end & 1) as 0 | 1,
    x: ends.x[ends.vertex[end]],
    y: ends.y[ends.vertex[end]],
  })
  let notes = 0
  let widest = 0
  for (let j = 0; j < joins.pairs.length; j += 2) {
    const p = ref(joins.pairs[j])
    const q = ref(joins.pairs[j + 1])
    const gap = Math.hypot(p.x - q.x, p.y - q.y)
    const explained = 2 * tolerances.lastDigit * Math.max(leverArm(own, p.row), leverArm(own, q.row))
    const small = gap <= Math.max(explained, 2 * tolerances.snap)
    const { how, meet, area } = closeGap(own, p, q, tolerances.chaining, small)
    if (meet) for (const e of [p, q]) moveEnd(own, e.row, e.end, meet[0], meet[1])
    mate[joins.pairs[j]] = joins.pairs[j + 1]
    mate[joins.pairs[j + 1]] = joins.pairs[j]
    const x = 0.5 * (p.x + q.x)
    const y = 0.5 * (p.y + q.y)
    repairs.push({ x, y, gap, area })
    if (small) {
      notes++
      widest = Math.max(widest, gap)
    } else
      findings.push(
        geometryFinding('gap-closed', { gap: gap * mmPerUnit, how, x, y, area: Math.abs(area) * mmPerUnit ** 2 }, [x, y], gap),
      )
  }
  if (notes > 0) findings.push(geometryFinding('gaps-within-digits', { count: notes, widest: widest * mmPerUnit }))
  for (const members of joins.merges) {
    const at = members.map(ref).reduce((a, b) => (b.x < a.x || (b.x === a.x && b.y < a.y) ? b : a))
    for (const end of members) {
      const v = ends.vertex[end]
      for (let e = 0; e < ends.count; e++)
        if (ends.vertex[e] === v) {
          mate[e] = BRANCH
          moveEnd(own, e >> 1, (e & 1) as 0 | 1, at.x, at.y)
        }
    }
  }
  for (const members of joins.ambiguous) {
    const at = members.map(ref)
    let width = 0
    for (const a of at) for (const b of at) width = Math.max(width, Math.hypot(a.x - b.x, a.y - b.y))
    const { x, y } = at[0]
    findings.push(geometryFinding('ends-ambiguous', { ends: at.length, width: width * mmPerUnit, x, y }, [x, y], width))
  }
}

/** Follows mates: closed walks are loops, walks between ends without mate are open chains; nets are left aside. */
function walk(
  own: EdgeTable,
  mate: Int32Array,
  net: Int32Array | null,
): Pick<Chained, 'edges' | 'loopStart' | 'openEdges' | 'openStart'> {
  const seen = new Uint8Array(own.count)
  const edges = emptyTable(own.count + 64, own.shapesUsed)
  const openEdges = emptyTable()
  const loopStart = [0]
  const openStart = [0]
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
      emitLoop(edges, own, steps, count)
      loopStart.push(edges.count)
    } else {
      emitChain(openEdges, own, steps, count)
      openStart.push(openEdges.count)
    }
  }
  return { edges, loopStart, openEdges, openStart }
}
