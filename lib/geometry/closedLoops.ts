import { chain } from './chain'
import { chainsOnLoops } from './chainsOnLoops'
import { mergeDuplicates } from './duplicates'
import { type EdgeTable, emptyTable, pushCopy, reserve, shapeLength } from './edges'
import { emitLoop } from './emitLoop'
import type { Finding } from './finding'
import { geometryFinding } from './findings'
import { reportJoins } from './joinEnds'
import { sortEdges } from './looseEdges'
import type { Tolerances } from './outlineSet'
import type { Repair } from './region'
import { splitAtEnds } from './splitAtEnds'
import { withoutArea } from './withoutArea'

/** Closed loops (counter-clockwise), what stayed open, and what branches. */
export interface ClosedLoops {
  edges: EdgeTable
  loopStart: number[]
  openEdges: EdgeTable
  openStart: Uint32Array
  nets: EdgeTable[]
  /** open chains and nets that outlines close, with these outlines; null for none */
  onLoops: EdgeTable | null
  repairs: Repair[]
  findings: Finding[]
}

/**
 * Closes what closes: entities drawn closed are loops as they are; loose edges are chained; what is left then is freed
 * of edges drawn twice, cut where ends lie on edges, and chained again. So doubled edges are merged only where they keep
 * outlines from closing: two outlines that share an edge keep one each.
 */
export function closedLoops(edges: EdgeTable, take: Uint32Array, tolerances: Tolerances, mmPerUnit: number): ClosedLoops {
  const findings: Finding[] = []
  const sorted = sortEdges(edges, take, tolerances.snap)
  if (sorted.empty.length > 0) {
    const at: [number, number] = [edges.ends[4 * sorted.empty[0]], edges.ends[4 * sorted.empty[0] + 1]]
    findings.push(geometryFinding('edges-without-length', { count: sorted.empty.length, x: at[0], y: at[1] }, at))
  }
  const first = chain(edges, sorted.loose, tolerances, mmPerUnit)
  const { loopStart } = first
  addClosed(first.edges, loopStart, edges, sorted.closedRows, sorted.closedStart)
  if (first.nets.length === 0 && first.openStart.length === 1) {
    const { repairs, findings: closings } = reportJoins(first.joins, first.inLoop, false, mmPerUnit)
    return { ...first, onLoops: null, openStart: Uint32Array.of(0), repairs, findings: [...findings, ...closings] }
  }
  const left = emptyTable()
  for (const [k, row] of sorted.loose.entries()) if (!first.inLoop[k]) pushCopy(left, edges, row)
  const merged = mergeDuplicates(left, first.edges, tolerances.duplicate)
  if (merged.at) {
    const { count, length, at } = merged
    findings.push(geometryFinding('edges-doubled', { count, length: length * mmPerUnit, x: at[0], y: at[1] }, at, length))
  }
  const cut = splitAtEnds(merged.edges, tolerances.snap, tolerances.chaining)
  const second = chain(
    cut,
    new Uint32Array(cut.count).map((_, i) => i),
    tolerances,
    mmPerUnit,
  )
  for (let k = 0; k + 1 < second.loopStart.length; k++) {
    for (let i = second.loopStart[k]; i < second.loopStart[k + 1]; i++) pushCopy(first.edges, second.edges, i)
    loopStart.push(first.edges.count)
  }
  const { net, nets, openEdges, openStart } = chainsOnLoops(first.edges, loopStart, second, tolerances)
  const before = reportJoins(first.joins, first.inLoop, true, mmPerUnit)
  const after = reportJoins(second.joins, second.inLoop, false, mmPerUnit)
  return {
    edges: first.edges,
    loopStart,
    openEdges,
    openStart: Uint32Array.from(openStart),
    nets,
    onLoops: net,
    repairs: [...before.repairs, ...after.repairs],
    findings: [
      ...findings,
      ...before.findings,
      ...after.findings,
      ...openFindings(openEdges, openStart, tolerances.snap, mmPerUnit),
    ],
  }
}

/** Appends the entities that were drawn closed. */
function addClosed(to: EdgeTable, loopStart: number[], edges: EdgeTable, rows: Uint32Array, start: number[]): void {
  let shapes = 0
  for (let r = 0; r < rows.length; r++) shapes += shapeLength(edges, rows[r])
  reserve(to, rows.length, shapes)
  const steps = rows.map((row) => 2 * row)
  for (let k = 0; k + 1 < start.length; k++) {
    emitLoop(to, edges, steps.subarray(start[k], start[k + 1]), start[k + 1] - start[k])
    loopStart.push(to.count)
  }
}

function openFindings(openEdges: EdgeTable, openStart: number[], snap: number, mmPerUnit: number): Finding[] {
  const e = openEdges.ends
  return openStart.slice(1).map((to, k) => {
    const from = openStart[k]
    const [x0, y0] = [e[4 * from], e[4 * from + 1]]
    const [x1, y1] = [e[4 * to - 2], e[4 * to - 1]]
    const gap = Math.hypot(x1 - x0, y1 - y0)
    const at: [number, number] = [0.5 * (x0 + x1), 0.5 * (y0 + y1)]
    if (gap <= snap) return withoutArea(openEdges, from, to, snap)
    return geometryFinding('chain-open', { gap: gap * mmPerUnit, x: at[0], y: at[1], edges: to - from, x0, y0, x1, y1 }, at, gap)
  })
}
