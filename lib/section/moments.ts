import { type EdgeTable, LINE } from '../geometry/edges'
import { add, newSums, sumOf } from '../geometry/sum'
import { edgeMoments } from './edgeMoments'
import type { Frame } from './frame'
import { AREA, U, UU, UV, V, VV } from './momentArray'

/** Area moments in a frame's axes: ∫dA, ∫u dA, ∫v dA, ∫u² dA, ∫v² dA, +∫uv dA (mm², mm³, mm⁴). */
export interface Moments {
  area: number
  u: number
  v: number
  uu: number
  vv: number
  uv: number
}

const BLOCK = 64
const one = new Float64Array(6)
const block = new Float64Array(6)
const sums = newSums(6)

/**
 * Moments of the fans between the frame's origin and edges from … to − 1, into `out`. Lines as in `lineMoments`, written out here
 * because a million of them go through this loop. A plain sum: for runs of some dozens of edges.
 */
export function runMoments(edges: EdgeTable, from: number, to: number, frame: Frame, out: Float64Array): void {
  const { x, y, cos, sin } = frame
  const { ends, kind } = edges
  let area = 0
  let u = 0
  let v = 0
  let uu = 0
  let vv = 0
  let uv = 0
  for (let i = from; i < to; i++) {
    if (kind[i] !== LINE) {
      edgeMoments(edges, i, frame, one)
      area += one[AREA]
      u += one[U]
      v += one[V]
      uu += one[UU]
      vv += one[VV]
      uv += one[UV]
      continue
    }
    const x0 = ends[4 * i]
    const y0 = ends[4 * i + 1]
    const px = x0 - x
    const py = y0 - y
    const dx = ends[4 * i + 2] - x0
    const dy = ends[4 * i + 3] - y0
    const u0 = px * cos + py * sin
    const v0 = py * cos - px * sin
    const du = dx * cos + dy * sin
    const dv = dy * cos - dx * sin
    const u1 = u0 + du
    const v1 = v0 + dv
    const c = u0 * dv - v0 * du
    area += c / 2
    u += (c * (u0 + u1)) / 6
    v += (c * (v0 + v1)) / 6
    uu += (c * (u0 * u0 + u0 * u1 + u1 * u1)) / 12
    vv += (c * (v0 * v0 + v0 * v1 + v1 * v1)) / 12
    uv += (c * (u0 * (2 * v0 + v1) + u1 * (v0 + 2 * v1))) / 24
  }
  out[AREA] = area
  out[U] = u
  out[V] = v
  out[UU] = uu
  out[VV] = vv
  out[UV] = uv
}

/**
 * Moments of the metal bounded by edges from … to − 1 (closed loops, metal on the left) in `frame`: runs of some dozens of edges,
 * their sums compensated. Choose the frame's origin within the region, so that nothing is lost to a far origin.
 */
export function momentsOf(edges: EdgeTable, from: number, to: number, frame: Frame): Moments {
  if (to - from <= BLOCK) {
    // most loops are short, and there are many of them
    runMoments(edges, from, to, frame, block)
    return { area: block[AREA], u: block[U], v: block[V], uu: block[UU], vv: block[VV], uv: block[UV] }
  }
  sums.fill(0)
  for (let i = from; i < to; i += BLOCK) {
    runMoments(edges, i, Math.min(to, i + BLOCK), frame, block)
    for (let j = 0; j < 6; j++) add(sums, j, block[j])
  }
  return {
    area: sumOf(sums, AREA),
    u: sumOf(sums, U),
    v: sumOf(sums, V),
    uu: sumOf(sums, UU),
    vv: sumOf(sums, VV),
    uv: sumOf(sums, UV),
  }
}
