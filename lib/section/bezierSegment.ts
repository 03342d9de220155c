import type { EdgeTable } from '../geometry/edges'
import type { Frame } from './frame'
import { gaussRule } from './gauss'
import { AREA, addShifted, U, UU, UV, V, VV } from './momentArray'

/** Control points of a Bézier piece in homogeneous coordinates u·w, v·w, w. */
export interface Controls {
  u: Float64Array
  v: Float64Array
  w: Float64Array
  rational: boolean
}

/** Control points of Bézier edge i in the frame's axes, measured from the middle of the carrier's chord. */
export function controlsFromChord(edges: EdgeTable, i: number, { cos, sin }: Frame): Controls {
  const s = edges.shapes
  const k = edges.shape[i]
  const degree = s[k]
  const last = k + 2 + 3 * degree
  const x = 0.5 * (s[k + 2] + s[last])
  const y = 0.5 * (s[k + 3] + s[last + 1])
  const u = new Float64Array(degree + 1)
  const v = new Float64Array(degree + 1)
  const w = new Float64Array(degree + 1)
  for (let j = 0; j <= degree; j++) {
    const dx = s[k + 2 + 3 * j] - x
    const dy = s[k + 3 + 3 * j] - y
    w[j] = s[k + 4 + 3 * j]
    u[j] = (dx * cos + dy * sin) * w[j]
    v[j] = (dy * cos - dx * sin) * w[j]
  }
  return { u, v, w, rational: s[k + 1] === 1 }
}

/** Splits by de Casteljau's scheme at t; the pieces run over [0, t] and [t, 1]. */
export function splitControls({ u, v, w, rational }: Controls, t: number): [Controls, Controls] {
  const halves = [u, v, w].map((c) => {
    const n = c.length - 1
    const right = c.slice()
    const left = new Float64Array(n + 1)
    left[0] = right[0]
    for (let m = 1; m <= n; m++) {
      for (let j = 0; j <= n - m; j++) right[j] += t * (right[j + 1] - right[j])
      left[m] = right[0]
    }
    return [left, right]
  })
  const piece = (side: number): Controls => ({ u: halves[0][side], v: halves[1][side], w: halves[2][side], rational })
  return [piece(0), piece(1)]
}

/** The part of the piece between parameters t0 < t1. */
export function partOfControls(controls: Controls, t0: number, t1: number): Controls {
  const tail = t0 > 0 ? splitControls(controls, t0)[1] : controls
  return t1 < 1 ? splitControls(tail, (t1 - t0) / (1 - t0))[0] : tail
}

/** The same piece measured from the middle of its own chord. */
export function chordCentred({ u, v, w, rational }: Controls): Controls {
  const n = u.length - 1
  const a = 0.5 * (u[0] / w[0] + u[n] / w[n])
  const b = 0.5 * (v[0] / w[0] + v[n] / w[n])
  return { u: u.map((value, j) => value - a * w[j]), v: v.map((value, j) => value - b * w[j]), w, rational }
}

const work = new Float64Array(3 * 64)

/** Point and derivative by t of the piece: the last two rows of de Casteljau's scheme. */
export function controlsPoint({ u, v, w }: Controls, t: number, point: { u: number; v: number; du: number; dv: number }): void {
  const n = u.length - 1
  const c = n < 64 ? work : new Float64Array(3 * (n + 1))
  for (let j = 0; j <= n; j++) {
    c[3 * j] = u[j]
    c[3 * j + 1] = v[j]
    c[3 * j + 2] = w[j]
  }
  for (let m = n; m > 1; m--) for (let j = 0; j < 3 * m; j++) c[j] += t * (c[j + 3] - c[j])
  const weight = c[2] + t * (c[5] - c[2])
  const dw = c[5] - c[2]
  point.u = (c[0] + t * (c[3] - c[0])) / weight
  point.v = (c[1] + t * (c[4] - c[1])) / weight
  point.du = (n * (c[3] - c[0] - point.u * dw)) / weight
  point.dv = (n * (c[4] - c[1] - point.v * dw)) / weight
}

const at = { u: 0, v: 0, du: 0, dv: 0 }

/**
 * Adds the fan between (0, 0) and the curve by n Gauss points: ∫f dA = 1/(k + 2)·∫f·(u v′ − v u′) dt. Returns the same for u² + v²
 * with every contribution positive: the scale against which rounding is measured.
 */
function addFan(controls: Controls, points: number, out: Float64Array): number {
  const { nodes, weights } = gaussRule(points)
  let scale = 0
  for (let g = 0; g < points; g++) {
    controlsPoint(controls, nodes[g], at)
    const fan = weights[g] * (at.u * at.dv - at.v * at.du)
    out[AREA] += fan / 2
    out[U] += (fan * at.u) / 3
    out[V] += (fan * at.v) / 3
    out[UU] += (fan * at.u * at.u) / 4
    out[VV] += (fan * at.v * at.v) / 4
    out[UV] += (fan * at.u * at.v) / 4
    scale += Math.abs(fan) * (at.u * at.u + at.v * at.v)
  }
  return scale
}

const ratioOf = (w: Float64Array): number => {
  let least = w[0]
  let most = w[0]
  for (const value of w) {
    least = Math.min(least, value)
    most = Math.max(most, value)
  }
  return most / least
}

const MOST_HALVINGS = 12

/**
 * Rational: halved until the weights are within a factor 2, then n against 2n points until their difference is rounding against
 * `scale`, that of the whole piece (a half's own moments may all but cancel).
 */
function addRationalFan(controls: Controls, out: Float64Array, scale: number, depth: number): void {
  if (ratioOf(controls.w) <= 2 || depth === MOST_HALVINGS) {
    const points = 2 * controls.u.length + 4
    const coarse = new Float64Array(6)
    const fine = new Float64Array(6)
    addFan(controls, points, coarse)
    addFan(controls, 2 * points, fine)
    const off = Math.abs(fine[UU] - coarse[UU]) + Math.abs(fine[VV] - coarse[VV]) + Math.abs(fine[UV] - coarse[UV])
    if (off <= 1e-14 * scale || depth === MOST_HALVINGS) {
      for (let j = 0; j < 6; j++) out[j] += fine[j]
      return
    }
  }
  for (const half of splitControls(controls, 0.5)) addRationalFan(half, out, scale, depth + 1)
}

const scratch = new Float64Array(6)
const segment = new Float64Array(6)

/**
 * Adds the moments of the segment between a Bézier piece (controls from its chord's middle) and its chord, placed with that middle
 * at (k, l). Polynomial of degree p: the integrand of a second moment has degree 4p − 1, so 2p Gauss points are exact; rational
 * pieces are iterated to rounding.
 */
export function addControlsSegment(controls: Controls, k: number, l: number, out: Float64Array): void {
  segment.fill(0)
  if (controls.rational) addRationalFan(controls, segment, addFan(controls, 2 * controls.u.length, scratch.fill(0)), 0)
  else addFan(controls, Math.max(2, 2 * (controls.u.length - 1)), segment)
  addShifted(out, k, l, segment[AREA], segment[U], segment[V], segment[UU], segment[VV], segment[UV])
}
