import { insertPoint, newGrid, visitNear } from './endGrid'
import type { Ends } from './snapEnds'

/** What is to be done with ends that meet no other end exactly. */
export interface Joins {
  /** pairs of ends to close, two numbers each */
  pairs: number[]
  /** ends that become one vertex together (branches drawn with gaps) */
  merges: number[][]
  /** clusters of ends wider than the tolerance: nothing is joined */
  ambiguous: { ends: number[]; width: number }[]
}

interface Near {
  end: number
  distance: number
}

/**
 * Finds partners for ends of degree 1 among one another, and at vertices of higher degree, within `tolerance`.
 * The two ends of one edge become partners only where the edge is long (an arc that nearly closes), so that a short
 * edge keeps its length. Where more than two ends
 * lie close together, ends that are each other's nearest by far pair up; what is left is one vertex if no wider
 * than the tolerance, else ambiguous.
 */
export function joinGaps(ends: Ends, tolerance: number, isLong: (edge: number) => boolean): Joins {
  const joins: Joins = { pairs: [], merges: [], ambiguous: [] }
  const dangling: number[] = []
  for (let end = 0; end < ends.count; end++) if (ends.degree[ends.vertex[end]] === 1) dangling.push(end)
  if (dangling.length === 0 || !(tolerance > 0)) return joins
  const x = (end: number) => ends.x[ends.vertex[end]]
  const y = (end: number) => ends.y[ends.vertex[end]]
  const near = neighbours(dangling, x, y, tolerance, isLong)
  const seen = new Uint8Array(dangling.length)
  const joined = new Set<number>()
  for (let d = 0; d < dangling.length; d++) {
    if (seen[d]) continue
    const component = reachable(d, near, seen)
    if (component.length === 1) continue
    const members = component.map((m) => dangling[m])
    if (component.length === 2) joins.pairs.push(members[0], members[1])
    else settle(component, dangling, near, joins, tolerance, x, y)
    for (const member of members) joined.add(member)
  }
  attach(
    ends,
    dangling.filter((end) => !joined.has(end)),
    tolerance,
    joins,
  )
  return joins
}

function neighbours(
  dangling: number[],
  x: (end: number) => number,
  y: (end: number) => number,
  tolerance: number,
  isLong: (edge: number) => boolean,
): Near[][] {
  const grid = newGrid(dangling.length, 4 * tolerance, x(dangling[0]), y(dangling[0]))
  for (const [d, end] of dangling.entries()) insertPoint(grid, d, x(end), y(end))
  return dangling.map((end, d) => {
    const found = new Map<number, number>()
    visitNear(grid, x(end), y(end), tolerance, (other) => {
      const distance = Math.hypot(x(dangling[other]) - x(end), y(dangling[other]) - y(end))
      if (other !== d && (dangling[other] >> 1 !== end >> 1 || isLong(end >> 1)) && distance <= tolerance)
        found.set(other, distance)
    })
    return [...found].map(([other, distance]) => ({ end: other, distance })).sort((a, b) => a.distance - b.distance)
  })
}

function reachable(from: number, near: Near[][], seen: Uint8Array): number[] {
  const component = [from]
  seen[from] = 1
  for (let c = 0; c < component.length; c++)
    for (const { end } of near[component[c]]) {
      if (seen[end]) continue
      seen[end] = 1
      component.push(end)
    }
  return component.sort((a, b) => a - b)
}

/** A cluster of three ends or more: clear pairs, one vertex, or ambiguous. */
function settle(
  component: number[],
  dangling: number[],
  near: Near[][],
  joins: Joins,
  tolerance: number,
  x: (end: number) => number,
  y: (end: number) => number,
): void {
  const clear = (d: number) => near[d].length === 1 || near[d][1].distance >= 3 * near[d][0].distance
  const mutual = (d: number) => near[near[d][0].end][0].end === d
  if (component.every((d) => clear(d) && mutual(d))) {
    for (const d of component) if (d < near[d][0].end) joins.pairs.push(dangling[d], dangling[near[d][0].end])
    return
  }
  const members = component.map((d) => dangling[d])
  const oneEdgeTwice = new Set(members.map((end) => end >> 1)).size < members.length
  const width = widthOf(members, x, y)
  if (width <= tolerance && !oneEdgeTwice) joins.merges.push(members)
  else joins.ambiguous.push({ ends: members, width })
}

/** Greatest distance among ends; of very many the diagonal of their box. */
function widthOf(members: number[], x: (end: number) => number, y: (end: number) => number): number {
  if (members.length > 64) {
    const span = (of: (end: number) => number) =>
      members.reduce((most, end) => Math.max(most, of(end)), Number.NEGATIVE_INFINITY) -
      members.reduce((least, end) => Math.min(least, of(end)), Number.POSITIVE_INFINITY)
    return Math.hypot(span(x), span(y))
  }
  let width = 0
  for (const a of members) for (const b of members) width = Math.max(width, Math.hypot(x(a) - x(b), y(a) - y(b)))
  return width
}

/** A dangling end beside a vertex where edges already meet joins it: a branch drawn with a gap. */
function attach(ends: Ends, dangling: number[], tolerance: number, joins: Joins): void {
  if (dangling.length === 0) return
  const grid = newGrid(dangling.length, 4 * tolerance, ends.x[0], ends.y[0])
  for (const [d, end] of dangling.entries()) insertPoint(grid, d, ends.x[ends.vertex[end]], ends.y[ends.vertex[end]])
  const best = new Map<number, { other: number; distance: number }>()
  for (let end = 0; end < ends.count; end++) {
    const v = ends.vertex[end]
    if (ends.degree[v] < 2) continue
    visitNear(grid, ends.x[v], ends.y[v], tolerance, (d) => {
      const w = ends.vertex[dangling[d]]
      const distance = Math.hypot(ends.x[v] - ends.x[w], ends.y[v] - ends.y[w])
      if (distance > tolerance || v === ends.vertex[dangling[d] ^ 1]) return
      const before = best.get(dangling[d])
      if (!before || distance < before.distance) best.set(dangling[d], { other: end, distance })
    })
  }
  for (const [end, { other }] of best) joins.merges.push([end, other])
}
