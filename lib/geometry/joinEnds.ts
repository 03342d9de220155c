import { moveEnd } from './carrier'
import { closeGap, type EndRef } from './closeGap'
import { ARC, type EdgeTable, ELLIPSE } from './edges'
import { lengthOf } from './evaluate'
import type { Finding } from './finding'
import { geometryFinding } from './findings'
import { joinGaps } from './joinGaps'
import { BRANCH } from './nets'
import type { Tolerances } from './outlineSet'
import type { Repair } from './region'
import type { Ends } from './snapEnds'

/** A gap closed, or a cluster of ends that was not: which edge it belongs to, and what is to be said. */
export interface Join {
  edge: number
  /** the end of that edge, 0 or 1 */
  end: 0 | 1
  repair: Repair | null
  how: string
  /** no wider than the drawing's last digits explain */
  small: boolean
  /** said at once: ends that could not be told apart */
  finding: Finding | null
}

/** How far the drawing's last digit can move an end: an arc's end by its radius' and its angles' digits too. */
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

/** Closes gaps within the chaining tolerance: ends of `own` move, `mate` says what runs into what. */
export function joinEnds(own: EdgeTable, ends: Ends, mate: Int32Array, tolerances: Tolerances, mmPerUnit: number): Join[] {
  const found = joinGaps(ends, tolerances.chaining, (k) => lengthOf(own, k) > 4 * tolerances.chaining)
  const ref = (end: number): EndRef => ({
    row: end >> 1,
    end: (end & 1) as 0 | 1,
    x: ends.x[ends.vertex[end]],
    y: ends.y[ends.vertex[end]],
  })
  const joins: Join[] = []
  for (let j = 0; j < found.pairs.length; j += 2) {
    const [p, q] = [ref(found.pairs[j]), ref(found.pairs[j + 1])]
    const gap = Math.hypot(p.x - q.x, p.y - q.y)
    const explained = 2 * tolerances.lastDigit * Math.max(leverArm(own, p.row), leverArm(own, q.row))
    const small = gap <= Math.max(explained, 2 * tolerances.snap)
    const { how, meet, area } = closeGap(own, p, q, tolerances.chaining, small)
    if (meet) for (const e of [p, q]) moveEnd(own, e.row, e.end, meet[0], meet[1])
    mate[found.pairs[j]] = found.pairs[j + 1]
    mate[found.pairs[j + 1]] = found.pairs[j]
    joins.push({
      edge: p.row,
      end: p.end,
      repair: { x: 0.5 * (p.x + q.x), y: 0.5 * (p.y + q.y), gap, area },
      how,
      small,
      finding: null,
    })
  }
  merge(
    own,
    ends,
    mate,
    found.merges.map((members) => members.map(ref)),
  )
  for (const { ends: members, width } of found.ambiguous) {
    const { row, x, y } = ref(members[0])
    const params = { ends: members.length, width: width * mmPerUnit, x, y }
    joins.push({
      edge: row,
      end: 0,
      repair: null,
      how: '',
      small: false,
      finding: geometryFinding('ends-ambiguous', params, [x, y], width),
    })
  }
  return joins
}

/** Ends that become one vertex with several edges: all go to the lowest in x, then y. */
function merge(own: EdgeTable, ends: Ends, mate: Int32Array, clusters: EndRef[][]): void {
  if (clusters.length === 0) return
  const target = new Map<number, EndRef>()
  for (const cluster of clusters) {
    const lowest = cluster.reduce((a, b) => (b.x < a.x || (b.x === a.x && b.y < a.y) ? b : a))
    for (const { row, end } of cluster) target.set(ends.vertex[2 * row + end], lowest)
  }
  for (let end = 0; end < ends.count; end++) {
    const to = target.get(ends.vertex[end])
    if (!to) continue
    mate[end] = BRANCH
    moveEnd(own, end >> 1, (end & 1) as 0 | 1, to.x, to.y)
  }
}

/**
 * What is to be said of joins: all, or those in loops only; gaps that the digits explain in one note. `inLoop` is the
 * chain's: with it the areas get the sign they have for the counter-clockwise loop.
 */
export function reportJoins(
  joins: Join[],
  inLoop: Uint8Array,
  loopsOnly: boolean,
  mmPerUnit: number,
): { repairs: Repair[]; findings: Finding[] } {
  const repairs: Repair[] = []
  const findings: Finding[] = []
  let widest = 0
  let count = 0
  for (const { edge, end, repair, how, small, finding } of joins) {
    if (loopsOnly && inLoop[edge] === 0) continue
    if (finding) findings.push(finding)
    if (!repair) continue
    const { x, y, gap } = repair
    // the closing is worked out for a walk that leaves the edge by this end
    const area = inLoop[edge] === (end === 1 ? 2 : 1) ? -repair.area : repair.area
    repairs.push({ x, y, gap, area })
    if (small) {
      count++
      widest = Math.max(widest, gap)
    } else
      findings.push(geometryFinding('gap-closed', { gap: gap * mmPerUnit, how, x, y, area: area * mmPerUnit ** 2 }, [x, y], gap))
  }
  if (count > 0) findings.push(geometryFinding('gaps-within-digits', { count, widest: widest * mmPerUnit }))
  return { repairs, findings }
}
