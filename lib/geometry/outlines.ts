import { acceptArcs } from './acceptedArcs'
import { boundsOfEdges } from './bounds'
import { chordLength } from './chordLength'
import { chordRuns } from './chords'
import { closedLoops } from './closedLoops'
import { coincidentLoops } from './coincident'
import type { EdgeTable } from './edges'
import type { Finding } from './finding'
import { geometryFinding } from './findings'
import { sheetParts } from './frames'
import { groupOutlines } from './groups'
import type { Loops } from './nest'
import { netOutlines } from './netOutlines'
import type { OutlineSet, Tolerances } from './outlineSet'
import type { ArcRun, Bond } from './recipe'
import { measured, type Related, relate } from './relations'
import { selectLoops } from './selectLoops'
import { withoutArea } from './withoutArea'

export interface OutlineOptions {
  arcs: ArcRun[]
  mmPerUnit: number
  /** answers to "metal or void?" */
  bonds?: Bond[]
}

/**
 * The closed outlines of the taken edges (rows of `edges`, ascending): chained within the tolerances, counter-clockwise,
 * nested and grouped; what does not close is kept beside them. All numbers in drawing units; sentences speak mm.
 * Bad drawings give findings, never a throw.
 */
export function outlinesOf(edges: EdgeTable, take: Uint32Array, tolerances: Tolerances, options: OutlineOptions): OutlineSet {
  const { mmPerUnit } = options
  const closed = closedLoops(edges, take, tolerances, mmPerUnit)
  const nets = netOutlines(closed, tolerances, mmPerUnit, options.bonds ?? [])
  const findings = [...closed.findings, ...nets.findings]
  const sound = withoutEmpty(closed.edges, Uint32Array.from(closed.loopStart), nets.undecided, tolerances, findings)
  const arcs = takeArcs(sound, options.arcs, tolerances, mmPerUnit, findings)
  const related = relate(arcs.edges, arcs.loopStart, tolerances.snap, sound.undecided, arcs.boxes, arcs.loops)
  return {
    ...completed(related, tolerances, mmPerUnit, findings),
    openEdges: closed.openEdges,
    openStart: closed.openStart,
    repairs: closed.repairs,
  }
}

interface Kept {
  edges: EdgeTable
  loopStart: Uint32Array
  undecided: Uint8Array
  /** bounds of edges and measures of loops, where they are as measured */
  boxes?: Float64Array
  loops?: Loops
}

/** Leaves out loops without area and loops that lie on an earlier one. */
function withoutEmpty(
  edges: EdgeTable,
  loopStart: Uint32Array,
  undecided: Uint8Array,
  tolerances: Tolerances,
  findings: Finding[],
): Kept {
  const boxes = boundsOfEdges(edges)
  const loops = measured(edges, loopStart, boxes)
  const place = (k: number): [number, number] => [edges.ends[4 * loopStart[k]], edges.ends[4 * loopStart[k] + 1]]
  const doubled = coincidentLoops(loops, tolerances.duplicate)
  const empty = loops.area.map((area, k) => {
    const b = 4 * k
    const size = loops.bounds[b + 2] - loops.bounds[b] + loops.bounds[b + 3] - loops.bounds[b + 1]
    return area <= tolerances.snap * size ? 1 : 0
  })
  const first = doubled.indexOf(1)
  const count = doubled.reduce((sum, one) => sum + one, 0)
  if (count > 0) {
    const at = place(first)
    findings.push(geometryFinding('outlines-coincident', { count, x: at[0], y: at[1] }, at))
  }
  for (let k = 0; k < loops.count; k++) {
    if (!empty[k] || doubled[k]) continue
    findings.push(withoutArea(edges, loopStart[k], loopStart[k + 1], tolerances.snap))
  }
  const keep = (k: number) => !doubled[k] && !empty[k]
  if (count === 0 && !empty.includes(1)) return { edges, loopStart, undecided, boxes, loops }
  return { ...selectLoops(edges, loopStart, keep), undecided: undecided.filter((_, k) => keep(k)) }
}

function takeArcs(
  kept: Kept,
  runs: ArcRun[],
  tolerances: Tolerances,
  mmPerUnit: number,
  findings: Finding[],
): Pick<Kept, 'edges' | 'loopStart' | 'boxes' | 'loops'> {
  if (runs.length === 0) return kept
  const taken = acceptArcs(kept.edges, kept.loopStart, runs, tolerances.chaining)
  if (taken.taken > 0)
    findings.push(geometryFinding('arcs-from-chords', { count: taken.taken, area: taken.area * mmPerUnit ** 2 }))
  for (const { through } of taken.missing)
    findings.push(geometryFinding('arc-run-not-found', { x: through[0], y: through[1] }, through))
  return { edges: taken.edges, loopStart: taken.loopStart }
}

type Completed = Omit<OutlineSet, 'openEdges' | 'openStart' | 'repairs'>

/** Adds what a person is to be asked or told of the outlines: groups, sheet parts, runs of chords. */
function completed(related: Related, tolerances: Tolerances, mmPerUnit: number, before: Finding[]): Completed {
  const findings = [...before, ...related.findings]
  const { count, bounds, at } = related
  const { frames, titleBlocks } = sheetParts(related, related, mmPerUnit)
  const alone = new Uint8Array(count)
  for (const k of frames) alone[k] = 1
  const { group, groups } = groupOutlines(related, alone)
  const place = (k: number): [number, number] => [at[2 * k], at[2 * k + 1]]
  for (let k = 0; k < count; k++) {
    const perimeter = chordLength(related.edges, related.loopStart[k], related.loopStart[k + 1])
    const width = (2 * related.area[k]) / perimeter
    if (!(width < tolerances.duplicate)) continue
    const [x, y] = place(k)
    findings.push(geometryFinding('outline-thin', { width: width * mmPerUnit, x, y }, [x, y], 0.5 * perimeter))
  }
  for (const k of frames) {
    const [minX, minY, maxX, maxY] = bounds.subarray(4 * k, 4 * k + 4)
    const [width, height] = [(maxX - minX) * mmPerUnit, (maxY - minY) * mmPerUnit]
    const [x, y] = place(k)
    findings.push(geometryFinding('frame-found', { width, height, x, y }, [x, y], Math.max(maxX - minX, maxY - minY)))
  }
  for (const cells of titleBlocks) {
    const [x, y] = place(cells[0])
    findings.push(geometryFinding('title-block-found', { count: cells.length, x, y }, [x, y]))
  }
  const details = groups.length - frames.length
  if (details > 1) findings.push(geometryFinding('groups-apart', { groups: details }))
  const arcOffers = chordRuns(related, tolerances.lastDigit)
  for (const { run, radius, chords, dArea, dIx, dIy } of arcOffers) {
    const [x, y] = run.through
    const change = { area: dArea * mmPerUnit ** 2, dIx: dIx * mmPerUnit ** 4, dIy: dIy * mmPerUnit ** 4 }
    const params = { chords, radius: radius * mmPerUnit, ...change, x, y }
    findings.push(geometryFinding('chords-on-circle', params, [x, y], radius))
  }
  return { ...related, group, groups, frames, titleBlocks, arcOffers, findings }
}
