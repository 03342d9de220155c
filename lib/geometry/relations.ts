import { facesOf } from './arrangement/faces'
import { boundsOfEdges, boundsOfLoops } from './bounds'
import { type Crossings, crossingsOf } from './crossings'
import { loopArea } from './edgeArea'
import type { EdgeTable } from './edges'
import type { Finding } from './finding'
import { geometryFinding } from './findings'
import { windingOf } from './inside'
import { interiorPoint } from './interiorPoint'
import { namesOf } from './names'
import { type Loops, loopTester, nest } from './nest'
import type { OutlineSet } from './outlineSet'

export type Related = Pick<
  OutlineSet,
  | 'edges'
  | 'loopStart'
  | 'count'
  | 'area'
  | 'bounds'
  | 'at'
  | 'source'
  | 'depth'
  | 'parent'
  | 'undecided'
  | 'clusters'
  | 'findings'
>

/**
 * Whether a counter-clockwise loop that meets itself crosses itself: it winds round some face more than once or
 * backwards. One that only touches itself (a pinch point, a cut to a hole and back) winds round every point once or not.
 */
export function crossesItself(edges: EdgeTable, from: number, to: number, snap: number): boolean {
  const rows = Uint32Array.from({ length: to - from }, (_, n) => from + n)
  const faces = facesOf(edges, rows, { snap })
  if (faces.tooMany) return true
  for (let f = 0; f < faces.area.length; f++) {
    const point = interiorPoint(faces.edges, faces.loopStart[f], faces.loopStart[f + 1])
    const winding = point ? windingOf(edges, from, to, point[0], point[1]) : 0
    if (winding !== 0 && winding !== 1) return true
  }
  return false
}

/** Areas and bounds of loops. */
export function measured(edges: EdgeTable, loopStart: Uint32Array, boxes: Float64Array): Loops {
  const count = loopStart.length - 1
  const area = new Float64Array(count)
  for (let k = 0; k < count; k++) area[k] = loopArea(edges, loopStart[k], loopStart[k + 1])
  return { edges, loopStart, count, area, bounds: boundsOfLoops(boxes, loopStart) }
}

/** Connected sets of loops that meet, each ascending. */
function clustersOf(count: number, { contacts, selfMeeting }: Crossings): number[][] {
  const parent = new Map<number, number>()
  const find = (k: number): number => {
    let root = k
    for (let up = parent.get(root) ?? root; up !== root; up = parent.get(root) ?? root) root = up
    parent.set(k, root)
    return root
  }
  for (const { a, b } of contacts) {
    const [p, q] = [find(a), find(b)]
    parent.set(Math.max(p, q), Math.min(p, q))
  }
  for (const { loop } of selfMeeting) find(loop)
  const clusters = new Map<number, number[]>()
  for (let k = 0; k < count; k++) {
    if (!parent.has(k)) continue
    const cluster = clusters.get(find(k))
    if (cluster) cluster.push(k)
    else clusters.set(find(k), [k])
  }
  return [...clusters.values()]
}

function contactFindings({ contacts, selfMeeting, tooMany }: Crossings, crossing: Uint8Array): Finding[] {
  const findings: Finding[] = selfMeeting.map(({ loop, at }) =>
    geometryFinding(crossing[loop] ? 'outline-crosses-itself' : 'outline-touches-itself', { x: at[0], y: at[1] }, at),
  )
  for (const crosses of [true, false]) {
    const those = contacts.filter((contact) => contact.crosses === crosses)
    if (those.length === 0) continue
    const { at } = those[0]
    const count = new Set(those.map(({ b }) => b)).size
    findings.push(geometryFinding(crosses ? 'outlines-cross' : 'outlines-touch', { count, x: at[0], y: at[1] }, at))
  }
  if (tooMany) findings.push(geometryFinding('crossings-too-many', {}))
  return findings
}

/**
 * Names, nesting and meetings of loops. Loops that cross others or themselves, and those in `undecided`, have depth −1:
 * nesting says nothing of them; they still hold what lies inside.
 */
export function relate(
  edges: EdgeTable,
  loopStart: Uint32Array,
  snap: number,
  undecided: Uint8Array,
  boxes = boundsOfEdges(edges),
  loops = measured(edges, loopStart, boxes),
): Related {
  const inside = loopTester(loops, boxes)
  const crossings = crossingsOf(loops, boxes, snap, inside)
  const clusters = clustersOf(loops.count, crossings)
  const probes = new Float64Array(2 * loops.count)
  const source = new Uint32Array(loops.count)
  for (let k = 0; k < loops.count; k++) {
    probes[2 * k] = edges.ends[4 * loopStart[k]]
    probes[2 * k + 1] = edges.ends[4 * loopStart[k] + 1]
    source[k] = edges.source[loopStart[k]]
  }
  for (const k of clusters.flat()) {
    const point = interiorPoint(edges, loopStart[k], loopStart[k + 1])
    if (point) probes.set(point, 2 * k)
  }
  const crossing = new Uint8Array(loops.count)
  for (const { loop } of crossings.selfMeeting)
    if (crossesItself(edges, loopStart[loop], loopStart[loop + 1], snap)) crossing[loop] = 1
  const ofThemselves = crossing.slice()
  for (const { a, b, crosses } of crossings.contacts) if (crosses) for (const k of [a, b]) crossing[k] = 1
  const { depth, parent } = nest(loops, inside, probes, crossing)
  for (let k = 0; k < loops.count; k++) if (crossing[k] || undecided[k] || crossings.tooMany) depth[k] = -1
  const at = namesOf(loops, crossings.touched)
  return { ...loops, at, source, depth, parent, undecided, clusters, findings: contactFindings(crossings, ofThemselves) }
}
