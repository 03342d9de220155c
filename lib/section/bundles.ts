import { edgeBounds } from '../geometry/bounds'
import { type EdgeTable, LINE } from '../geometry/edges'
import type { Region } from '../geometry/region'
import { add, newSums, sumOf } from '../geometry/sum'
import { frameAt } from './frame'
import { AREA, addShifted, lineMoments, U, UU, UV, V, VV } from './momentArray'
import { type Moments, runMoments } from './moments'

/**
 * Runs of up to 64 neighbouring edges of one loop, each with its box and the moments between the run and its chord. Questions of
 * the kind "how much lies above a line", "how far does it reach" look at boxes first and at single edges only where a box is cut:
 * a million edges cost as much as some thousand. Run k is edges start[k] … start[k + 1] − 1.
 */
export interface Bundles {
  edges: EdgeTable
  count: number
  start: Uint32Array
  /** first run of each loop, and the count after the last */
  loopRun: Uint32Array
  /** 1 where the run is its whole loop */
  closed: Uint8Array
  /** minX minY maxX maxY of each run, exact over its curves */
  boxes: Float64Array
  /** origin of `segments`: the centroid */
  x: number
  y: number
  /** six moments (axes along x and y) of what lies between each run and its chord */
  segments: Float64Array
  /** sum over the region about (x, y) */
  moments: Moments
}

const RUN = 64
const fan = new Float64Array(6)
const chord = new Float64Array(6)

function runsOf({ loopStart }: Region): { start: Uint32Array; loopRun: Uint32Array } {
  const loopRun = new Uint32Array(loopStart.length)
  for (let loop = 0; loop + 1 < loopStart.length; loop++) {
    loopRun[loop + 1] = loopRun[loop] + Math.ceil((loopStart[loop + 1] - loopStart[loop]) / RUN)
  }
  const count = loopRun[loopRun.length - 1]
  const start = new Uint32Array(count + 1)
  let k = 0
  for (let loop = 0; loop + 1 < loopStart.length; loop++) {
    for (let i = loopStart[loop]; i < loopStart[loop + 1]; i += RUN) start[k++] = i
  }
  start[count] = loopStart[loopStart.length - 1]
  return { start, loopRun }
}

function closedRuns(loopRun: Uint32Array): Uint8Array {
  const closed = new Uint8Array(loopRun[loopRun.length - 1])
  for (let loop = 0; loop + 1 < loopRun.length; loop++) {
    if (loopRun[loop + 1] === loopRun[loop] + 1) closed[loopRun[loop]] = 1
  }
  return closed
}

function boxesOf(edges: EdgeTable, start: Uint32Array): Float64Array {
  const { ends, kind } = edges
  const boxes = new Float64Array(4 * (start.length - 1))
  const box = new Float64Array(4)
  for (let k = 0; k + 1 < start.length; k++) {
    let minX = Number.POSITIVE_INFINITY
    let minY = Number.POSITIVE_INFINITY
    let maxX = Number.NEGATIVE_INFINITY
    let maxY = Number.NEGATIVE_INFINITY
    for (let i = start[k]; i < start[k + 1]; i++) {
      const x = ends[4 * i]
      const y = ends[4 * i + 1]
      if (x < minX) minX = x
      if (x > maxX) maxX = x
      if (y < minY) minY = y
      if (y > maxY) maxY = y
      if (kind[i] === LINE && i + 1 < start[k + 1]) continue
      edgeBounds(edges, i, box, 0)
      minX = Math.min(minX, box[0])
      minY = Math.min(minY, box[1])
      maxX = Math.max(maxX, box[2])
      maxY = Math.max(maxY, box[3])
    }
    boxes[4 * k] = minX
    boxes[4 * k + 1] = minY
    boxes[4 * k + 2] = maxX
    boxes[4 * k + 3] = maxY
  }
  return boxes
}

/** Box round all runs. */
export function boxOf({ boxes, count }: Pick<Bundles, 'boxes' | 'count'>): {
  minX: number
  minY: number
  maxX: number
  maxY: number
} {
  let [minX, minY, maxX, maxY] = boxes
  for (let k = 1; k < count; k++) {
    minX = Math.min(minX, boxes[4 * k])
    minY = Math.min(minY, boxes[4 * k + 1])
    maxX = Math.max(maxX, boxes[4 * k + 2])
    maxY = Math.max(maxY, boxes[4 * k + 3])
  }
  return { minX, minY, maxX, maxY }
}

function fillSegments(bundles: Bundles): void {
  const { edges, count, start, x, y, segments } = bundles
  const { ends } = edges
  const frame = frameAt(x, y)
  const sums = newSums(6)
  for (let k = 0; k < count; k++) {
    runMoments(edges, start[k], start[k + 1], frame, fan)
    const first = 4 * start[k]
    const last = 4 * (start[k + 1] - 1) + 2
    const x0 = ends[first]
    const y0 = ends[first + 1]
    lineMoments(x0 - x, y0 - y, ends[last] - x0, ends[last + 1] - y0, chord)
    for (let j = 0; j < 6; j++) {
      add(sums, j, fan[j])
      segments[6 * k + j] = fan[j] - chord[j]
    }
  }
  const [area, u, v, uu, vv, uv] = [AREA, U, V, UU, VV, UV].map((j) => sumOf(sums, j))
  bundles.moments = { area, u, v, uu, vv, uv }
}

const shifted = new Float64Array(6)

/** The six moments from `at` on, as seen from an origin moved by (dx, dy): parallel axes. */
function shift(moments: Float64Array, at: number, dx: number, dy: number): Float64Array {
  const m = (j: number) => moments[at + j]
  shifted.fill(0)
  addShifted(shifted, -dx, -dy, m(AREA), m(U), m(V), m(UU), m(VV), m(UV))
  return shifted
}

/** The same bundles about (x, y). */
function movedTo(bundles: Bundles, x: number, y: number): Bundles {
  const { count, segments } = bundles
  const dx = x - bundles.x
  const dy = y - bundles.y
  for (let k = 0; k < count; k++) segments.set(shift(segments, 6 * k, dx, dy), 6 * k)
  const { area, u, v, uu, vv, uv } = bundles.moments
  const whole = shift(Float64Array.of(area, u, v, uu, vv, uv), 0, dx, dy)
  const moments = { area, u: whole[U], v: whole[V], uu: whole[UU], vv: whole[VV], uv: whole[UV] }
  return { ...bundles, x, y, moments }
}

/**
 * Bundles of a region about its own centroid: summed about the middle of its box, so that no far origin costs digits, and moved
 * from there. With no metal (area ≤ 0) the origin stays in the middle of the box.
 */
export function bundlesOf(region: Region): Bundles {
  const { start, loopRun } = runsOf(region)
  const count = start.length - 1
  const boxes = boxesOf(region.edges, start)
  const { minX, minY, maxX, maxY } = boxOf({ boxes, count })
  const bundles: Bundles = {
    edges: region.edges,
    count,
    start,
    loopRun,
    closed: closedRuns(loopRun),
    boxes,
    x: minX + 0.5 * (maxX - minX),
    y: minY + 0.5 * (maxY - minY),
    segments: new Float64Array(6 * count),
    moments: { area: 0, u: 0, v: 0, uu: 0, vv: 0, uv: 0 },
  }
  fillSegments(bundles)
  const { area, u, v } = bundles.moments
  return area > 0 ? movedTo(bundles, bundles.x + u / area, bundles.y + v / area) : bundles
}
