import { boundsOfEdges, unionOfBoxes } from './bounds'
import { type Chained, chain } from './chain'
import { loopArea } from './edgeArea'
import type { EdgeTable } from './edges'
import { emitLoop } from './emitLoop'
import { jetAt, newJet } from './evaluate'
import type { Finding } from './finding'
import { geometryFinding } from './findings'
import { sortEdges } from './looseEdges'
import { loopTester, nest } from './nest'
import type { OutlineSet, Tolerances } from './outlineSet'
import type { ArcRun } from './recipe'

export interface OutlineOptions {
  arcs: ArcRun[]
  mmPerUnit: number
}

/**
 * The closed outlines of the taken edges (rows of `edges`, ascending): chained within the tolerances, counter-clockwise,
 * nested and grouped; what does not close is kept beside them. Lengths in drawing units; sentences speak mm.
 */
export function outlinesOf(edges: EdgeTable, take: Uint32Array, tolerances: Tolerances, options: OutlineOptions): OutlineSet {
  const { mmPerUnit } = options
  const findings: Finding[] = []
  const sorted = sortEdges(edges, take, tolerances.snap)
  if (sorted.empty.length > 0) {
    const at: [number, number] = [edges.ends[4 * sorted.empty[0]], edges.ends[4 * sorted.empty[0] + 1]]
    findings.push(geometryFinding('edges-without-length', { count: sorted.empty.length, x: at[0], y: at[1] }, at))
  }
  const chained = chain(edges, sorted.loose, tolerances, mmPerUnit)
  findings.push(...chained.findings, ...openFindings(chained, mmPerUnit))
  const loopStart = addClosed(chained, edges, sorted.closedRows, sorted.closedStart)
  return {
    ...described(chained.edges, loopStart),
    openEdges: chained.openEdges,
    openStart: Uint32Array.from(chained.openStart),
    repairs: chained.repairs,
    findings,
  }
}

/** Appends the outlines that were drawn closed to the chained ones. */
function addClosed(chained: Chained, edges: EdgeTable, rows: Uint32Array, start: number[]): Uint32Array {
  const loopStart = chained.loopStart
  for (let k = 0; k + 1 < start.length; k++) {
    const steps = new Int32Array(start[k + 1] - start[k])
    for (let s = 0; s < steps.length; s++) steps[s] = 2 * rows[start[k] + s]
    emitLoop(chained.edges, edges, steps, steps.length)
    loopStart.push(chained.edges.count)
  }
  return Uint32Array.from(loopStart)
}

function openFindings({ openEdges, openStart }: Chained, mmPerUnit: number): Finding[] {
  const e = openEdges.ends
  return openStart.slice(1).map((to, k) => {
    const from = openStart[k]
    const [x0, y0] = [e[4 * from], e[4 * from + 1]]
    const [x1, y1] = [e[4 * to - 2], e[4 * to - 1]]
    const gap = Math.hypot(x1 - x0, y1 - y0)
    const at: [number, number] = [0.5 * (x0 + x1), 0.5 * (y0 + y1)]
    return geometryFinding('chain-open', { gap: gap * mmPerUnit, x: at[0], y: at[1], edges: to - from, x0, y0, x1, y1 }, at, gap)
  })
}

type Described = Omit<OutlineSet, 'openEdges' | 'openStart' | 'repairs' | 'findings'>

function described(edges: EdgeTable, loopStart: Uint32Array): Described {
  const count = loopStart.length - 1
  const boxes = boundsOfEdges(edges)
  const area = new Float64Array(count)
  const bounds = new Float64Array(4 * count)
  const at = new Float64Array(2 * count)
  const source = new Uint32Array(count)
  const jet = newJet()
  for (let k = 0; k < count; k++) {
    const from = loopStart[k]
    area[k] = loopArea(edges, from, loopStart[k + 1])
    bounds.set(unionOfBoxes(boxes, from, loopStart[k + 1]), 4 * k)
    source[k] = edges.source[from]
    jetAt(edges, from, 0.5, jet)
    at[2 * k] = jet.x
    at[2 * k + 1] = jet.y
  }
  const loops = { edges, loopStart, count, area, bounds }
  const depth = nest(loops, loopTester(loops, boxes), at)
  return { ...loops, at, source, depth, group: new Uint32Array(count), clusters: [] }
}
