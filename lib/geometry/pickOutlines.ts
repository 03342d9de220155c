import Flatbush from 'flatbush'
import { boundsOfEdges, unionOfBoxes } from './bounds'
import type { Finding } from './finding'
import { type GeometryCode, geometryFinding } from './findings'
import { nearestOn } from './nearest'
import type { OutlineSet, Tolerances } from './outlineSet'
import { completed } from './outlines'
import type { XY } from './recipe'
import { relate } from './relations'
import { selectLoops } from './selectLoops'

/**
 * For each point the outline nearest to it (distance to its boundary; of equally near ones the smaller in area), −1
 * where there are no outlines. This is how recipes name outlines.
 */
export function nearestOutlines(set: Pick<OutlineSet, 'edges' | 'loopStart' | 'count' | 'area'>, points: XY[]): Int32Array {
  const picked = new Int32Array(points.length).fill(-1)
  const { edges, loopStart, count, area } = set
  if (count === 0 || points.length === 0) return picked
  const boxes = boundsOfEdges(edges)
  const index = new Flatbush(edges.count)
  for (let i = 0; i < edges.count; i++) index.add(boxes[4 * i], boxes[4 * i + 1], boxes[4 * i + 2], boxes[4 * i + 3])
  index.finish()
  const loopOf = new Uint32Array(edges.count)
  for (let k = 0; k < count; k++) loopOf.fill(k, loopStart[k], loopStart[k + 1])
  for (const [p, [x, y]] of points.entries()) {
    const reach = nearestOn(edges, index.neighbors(x, y, 1)[0], x, y).distance * (1 + 1e-12) + 1e-300
    const near = index
      .search(x - reach, y - reach, x + reach, y + reach)
      .map((i) => ({ loop: loopOf[i], distance: nearestOn(edges, i, x, y).distance }))
    const least = near.reduce((d, { distance }) => Math.min(d, distance), Number.POSITIVE_INFINITY)
    const tie = least + 1e-12 * Math.max(Math.abs(x), Math.abs(y), least)
    for (const { loop, distance } of near) {
      const before = picked[p]
      const smaller = before < 0 || area[loop] < area[before] || (area[loop] === area[before] && loop < before)
      if (distance <= tie && smaller) picked[p] = loop
    }
  }
  return picked
}

/** Findings that are made anew for the part. */
const OF_THE_WHOLE: ReadonlySet<string> = new Set<GeometryCode>([
  'outline-thin',
  'outlines-cross',
  'outlines-touch',
  'outline-crosses-itself',
  'outline-touches-itself',
  'crossings-too-many',
  'groups-apart',
  'frame-found',
  'title-block-found',
  'chords-on-circle',
])

/** A point further from every outline than this share of the nearest one's size names none. */
const FARTHEST = 0.05

/**
 * Only the outlines that the recipe's part names (a point on each), nested and grouped among themselves. Findings placed
 * elsewhere, open chains and repairs elsewhere are left out; a point that lies on no outline gives one.
 */
export function pickOutlines(set: OutlineSet, part: XY[], tolerances: Tolerances, mmPerUnit: number): OutlineSet {
  const picked = nearestOutlines(set, part)
  const taken = new Uint8Array(set.count)
  const findings: Finding[] = []
  for (const [p, k] of picked.entries()) {
    const [x, y] = part[p]
    if (k >= 0 && distanceTo(set, k, x, y) <= FARTHEST * sizeOf(set, k)) taken[k] = 1
    else findings.push(geometryFinding('part-not-found', { x, y }, [x, y]))
  }
  const kept = selectLoops(set.edges, set.loopStart, (k) => taken[k] === 1)
  const related = relate(
    kept.edges,
    kept.loopStart,
    tolerances.snap,
    set.undecided.filter((_, k) => taken[k]),
  )
  const box = unionOfBoxes(related.bounds, 0, related.count)
  const near = (x: number, y: number) =>
    x >= box[0] - tolerances.chaining &&
    x <= box[2] + tolerances.chaining &&
    y >= box[1] - tolerances.chaining &&
    y <= box[3] + tolerances.chaining
  for (const finding of set.findings)
    if (!OF_THE_WHOLE.has(finding.code) && (!finding.at || near(...finding.at))) findings.push(finding)
  return {
    ...completed(related, tolerances, mmPerUnit, findings),
    ...selectOpen(set, near),
    repairs: set.repairs.filter(({ x, y }) => near(x, y)),
  }
}

function distanceTo({ edges, loopStart }: OutlineSet, k: number, x: number, y: number): number {
  let least = Number.POSITIVE_INFINITY
  for (let i = loopStart[k]; i < loopStart[k + 1]; i++) least = Math.min(least, nearestOn(edges, i, x, y).distance)
  return least
}

const sizeOf = ({ bounds }: OutlineSet, k: number) =>
  Math.max(bounds[4 * k + 2] - bounds[4 * k], bounds[4 * k + 3] - bounds[4 * k + 1])

/** Open chains with an end near the part. */
function selectOpen({ openEdges, openStart }: OutlineSet, near: (x: number, y: number) => boolean) {
  const e = openEdges.ends
  const { edges, loopStart } = selectLoops(openEdges, openStart, (k) => {
    for (let j = 4 * openStart[k]; j < 4 * openStart[k + 1]; j += 2) if (near(e[j], e[j + 1])) return true
    return false
  })
  return { openEdges: edges, openStart: loopStart }
}
