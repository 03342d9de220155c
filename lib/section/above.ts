import { add, newSums, type Sums, sumOf } from '../geometry/sum'
import type { Bundles } from './bundles'
import { addEdgeAbove, addLine, addMoments, part, segment, WIDTH } from './edgeAbove'
import type { Frame } from './frame'
import { AREA, addShifted, U, UU, UV, V, VV } from './momentArray'

/** Integrals over the metal above v = c: ∫dA, ∫u dA, ∫v dA, ∫v² dA; and the width of metal along the line. */
export interface Above {
  area: number
  u: number
  v: number
  vv: number
  width: number
}

/** Turns and moves moments about the bundles' origin (axes along x and y) into the frame, and adds them. */
function addTurned({ x, y }: Bundles, m: Float64Array, at: number, frame: Frame): void {
  const { cos, sin } = frame
  const dx = x - frame.x
  const dy = y - frame.y
  const p = m[at + U] * cos + m[at + V] * sin
  const q = m[at + V] * cos - m[at + U] * sin
  const qq = m[at + VV] * cos * cos + m[at + UU] * sin * sin - 2 * m[at + UV] * sin * cos
  segment.fill(0)
  addShifted(segment, dx * cos + dy * sin, dy * cos - dx * sin, m[at + AREA], p, q, 0, qq, 0)
  addMoments()
}

/** Chord of a run: what an open run adds beside the moments between it and its chord. */
function addChord({ edges, start }: Bundles, k: number, frame: Frame): void {
  const { ends } = edges
  const { cos, sin } = frame
  const first = 4 * start[k]
  const last = 4 * (start[k + 1] - 1) + 2
  const x0 = ends[first] - frame.x
  const y0 = ends[first + 1] - frame.y
  const x1 = ends[last] - frame.x
  const y1 = ends[last + 1] - frame.y
  addLine(x0 * cos + y0 * sin, y0 * cos - x0 * sin, x1 * cos + y1 * sin, y1 * cos - x1 * sin)
}

let bottoms = new Float64Array(0)
let tops = new Float64Array(0)

/** Lowest and highest v that the box of each run reaches in the frame, into `bottoms` and `tops`. */
function spanRuns({ boxes, count }: Bundles, { x, y, cos, sin }: Frame): void {
  if (bottoms.length < count) {
    bottoms = new Float64Array(count)
    tops = new Float64Array(count)
  }
  for (let k = 0; k < count; k++) {
    const minX = boxes[4 * k]
    const minY = boxes[4 * k + 1]
    const maxX = boxes[4 * k + 2]
    const maxY = boxes[4 * k + 3]
    const middle = (0.5 * (minY + maxY) - y) * cos - (0.5 * (minX + maxX) - x) * sin
    const half = 0.5 * ((maxY - minY) * Math.abs(cos) + (maxX - minX) * Math.abs(sin))
    bottoms[k] = middle - half
    tops[k] = middle + half
  }
}

const whole = new Float64Array(6)

/** Area, first moments and second moment of the metal above v = c, about the frame's origin; exact for every kind of edge. */
export function above(bundles: Bundles, frame: Frame, c: number): Above {
  const { edges, count, start, closed, segments } = bundles
  const sums = newSums(5)
  const turnedLater = newSums(6)
  spanRuns(bundles, frame)
  for (let k = 0; k < count; k++) {
    if (tops[k] < c) continue
    if (bottoms[k] > c && closed[k]) {
      for (let j = 0; j < 6; j++) add(turnedLater, j, segments[6 * k + j])
      continue
    }
    part.fill(0)
    if (bottoms[k] > c) {
      addChord(bundles, k, frame)
      addTurned(bundles, segments, 6 * k, frame)
    } else for (let i = start[k]; i < start[k + 1]; i++) addEdgeAbove(edges, i, frame, c)
    for (let j = 0; j < 5; j++) add(sums, j, part[j])
  }
  part.fill(0)
  for (let j = 0; j < 6; j++) whole[j] = sumOf(turnedLater, j)
  addTurned(bundles, whole, 0, frame)
  for (let j = 0; j < 5; j++) add(sums, j, part[j])
  const [area, u, v, vv, width] = [0, 1, 2, 3, 4].map((j) => sumOf(sums, j))
  return { area, u, v, vv, width }
}

/**
 * The height c of the line v = c that halves the area: Newton's steps (the area above falls by width × dc), kept in a bracket.
 * Runs that the bracket has left behind are settled and not looked at again.
 */
export function halfAreaHeight(bundles: Bundles, frame: Frame, minV: number, maxV: number): number {
  const { edges, count, start, closed, segments, moments } = bundles
  let active = new Uint32Array(count)
  for (let k = 0; k < count; k++) active[k] = k
  const settled = newSums(1)
  let low = minV
  let high = maxV
  let c = low < 0 && high > 0 ? 0 : 0.5 * (low + high)
  const addWhole = (sum: Sums, k: number) => {
    add(sum, 0, segments[6 * k + AREA])
    if (closed[k]) return
    part.fill(0)
    addChord(bundles, k, frame)
    add(sum, 0, part[0])
  }
  let step = maxV - minV
  spanRuns(bundles, frame)
  for (let tries = 0; tries < 200; tries++) {
    const area = settled.slice()
    let width = 0
    for (let n = 0; n < active.length; n++) {
      const k = active[n]
      if (tops[k] < c) continue
      if (bottoms[k] > c) {
        addWhole(area, k)
        continue
      }
      part.fill(0)
      for (let i = start[k]; i < start[k + 1]; i++) addEdgeAbove(edges, i, frame, c)
      add(area, 0, part[0])
      width += part[WIDTH]
    }
    const excess = sumOf(area, 0) - 0.5 * moments.area
    if (excess > 0) low = c
    else high = c
    if (Math.abs(excess) <= 2e-14 * moments.area || high - low <= 1e-15 * (maxV - minV)) break
    let kept = 0
    for (let n = 0; n < active.length; n++) {
      const k = active[n]
      if (bottoms[k] > high) addWhole(settled, k)
      else if (tops[k] >= low) active[kept++] = k
    }
    active = active.subarray(0, kept)
    const newton = c + excess / width
    const next = newton > low && newton < high ? newton : 0.5 * (low + high)
    // snapped ends leave the area above a jitter of their own size: steps that no longer shrink have reached it
    const now = Math.abs(next - c)
    if (now === 0 || (now < 1e-9 * (maxV - minV) && now > 0.5 * step)) break
    step = now
    c = next
  }
  return c
}
