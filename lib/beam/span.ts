import type { BeamLoad, Pair, Piece, Stiffness } from './beam'
import { shifted, valueAt } from './polynomial'

/**
 * One uniform stretch between two nodes, solved exactly. State at the left end: deflection s₀, turning
 * ψ₀, curvature c₁ and its derivative c₂ (pairs). With D = E·[[Ix, Ixy], [Ixy, Iy]] on (y, x) and the
 * shear compliance S (1/(G·A_s)):
 *   ψ = ψ₀ + c₁s + c₂s²/2 + loads,  M = D·(ψ' − thermal curvature),  V = D·ψ'',  deflection' = ψ − S·V
 * (Euler–Bernoulli for S = 0, Timoshenko otherwise; Timoshenko, Strength of Materials I, from memory).
 * Loads enter as Macaulay terms, so nothing is sampled.
 */
export interface Span {
  from: number
  to: number
  stiffness: Stiffness
}

type Two = [number, number]
type Matrix2 = [Two, Two]

const times = (m: Matrix2, [a, b]: Two): Two => [m[0][0] * a + m[0][1] * b, m[1][0] * a + m[1][1] * b]
const product = (m: Matrix2, n: Matrix2): Matrix2 => {
  const left = times(m, [n[0][0], n[1][0]])
  const right = times(m, [n[0][1], n[1][1]])
  return [
    [left[0], right[0]],
    [left[1], right[1]],
  ]
}
const two = ({ x, y }: Pair): Two => [y, x]

/** D on (y, x): E·[[Ix, Ixy], [Ixy, Iy]], N·mm². */
export function bendingStiffness({ elasticModulus: e, ix, iy, ixy }: Stiffness): Matrix2 {
  return [
    [e * ix, e * ixy],
    [e * ixy, e * iy],
  ]
}

function inverse([[a, b], [c, d]]: Matrix2): Matrix2 {
  const det = a * d - b * c
  return [
    [d / det, -b / det],
    [-c / det, a / det],
  ]
}

function shearFlexibility({ shearModulus, shearCompliance }: Stiffness): Matrix2 {
  if (!shearModulus || !shearCompliance)
    return [
      [0, 0],
      [0, 0],
    ]
  const { xx, yy, xy } = shearCompliance
  return [
    [yy / shearModulus, xy / shearModulus],
    [xy / shearModulus, xx / shearModulus],
  ]
}

/** Movements of both ends, or forces on them: v, u, ψy, ψx at the left end, then at the right. */
export type Ends = number[]

/** The state at the left end that meets the movements of both ends under the loads. */
export function stateFor(span: Span, loads: readonly BeamLoad[], ends: Ends): SpanState {
  const length = span.to - span.from
  const [v0, u0, a0, b0, v1, u1, a1, b1] = ends
  const free = endOf(span, loads, [
    [v0, u0],
    [a0, b0],
    [0, 0],
    [0, 0],
  ])
  const missing: Two = [v1 - free.deflection[0], u1 - free.deflection[1]]
  const missingTurn: Two = [a1 - free.turn[0], b1 - free.turn[1]]
  // c₁L²/2 + (L³/6 − S·D·L)c₂ = missing and c₁L + c₂L²/2 = missingTurn
  const sd = product(shearFlexibility(span.stiffness), bendingStiffness(span.stiffness))
  const cube = -(length ** 3) / 12
  const m: Matrix2 = [
    [cube - sd[0][0] * length, -sd[0][1] * length],
    [-sd[1][0] * length, cube - sd[1][1] * length],
  ]
  const c2 = times(inverse(m), [missing[0] - (length * missingTurn[0]) / 2, missing[1] - (length * missingTurn[1]) / 2])
  const c1: Two = [missingTurn[0] / length - (c2[0] * length) / 2, missingTurn[1] / length - (c2[1] * length) / 2]
  return [[v0, u0], [a0, b0], c1, c2]
}

/** Deflection and turning at the right end for a state at the left end. */
function endOf(span: Span, loads: readonly BeamLoad[], state: SpanState): { deflection: Two; turn: Two } {
  const pieces = spanPieces(span, loads, state)
  const { deflection, slope, from, to } = pieces[pieces.length - 1]
  const at = (polynomial: number[]) => valueAt(polynomial, to - from)
  return { deflection: [at(deflection.y), at(deflection.x)], turn: [at(slope.y), at(slope.x)] }
}

/** Forces and moments that the nodes put on the span's ends in a state. */
export function endForces(span: Span, loads: readonly BeamLoad[], state: SpanState): Ends {
  const pieces = spanPieces(span, loads, state)
  const first = pieces[0]
  const last = pieces[pieces.length - 1]
  const end = (polynomial: number[]) => valueAt(polynomial, last.to - last.from)
  return [
    first.shear.y[0],
    first.shear.x[0],
    -first.moment.y[0],
    -first.moment.x[0],
    -end(last.shear.y),
    -end(last.shear.x),
    end(last.moment.y),
    end(last.moment.x),
  ]
}

/** The 8 × 8 stiffness on `Ends`, row by row. */
export function spanStiffness(span: Span): Float64Array {
  const out = new Float64Array(64)
  for (let column = 0; column < 8; column++) {
    const unit = new Array<number>(8).fill(0)
    unit[column] = 1
    endForces(span, [], stateFor(span, [], unit)).forEach((force, row) => {
      out[8 * row + column] = force
    })
  }
  return out
}

/** A Macaulay term: ψ'' gains `jerk`·⟨s − a⟩^power / power!, or ψ' gains `kink`·⟨s − a⟩⁰. */
interface Term {
  a: number
  /** 0: force, 1: uniform load, 2: growing load; −1: kink of the slope's derivative (moment) */
  order: number
  value: Two
}

function termsOf(span: Span, loads: readonly BeamLoad[]): Term[] {
  const flexibility = inverse(bendingStiffness(span.stiffness))
  const bend = (value: Two) => times(flexibility, value)
  const { from, to } = span
  const terms: Term[] = []
  for (const load of loads) {
    if (load.kind === 'point' && load.at > from && load.at < to)
      terms.push({ a: load.at - from, order: 0, value: bend(two(load.force)) })
    if (load.kind === 'moment' && load.at > from && load.at < to) {
      const [y, x] = bend(two(load.moment))
      terms.push({ a: load.at - from, order: -1, value: [-y, -x] })
    }
    if (load.kind === 'distributed') {
      const a = Math.max(load.from, from)
      const b = Math.min(load.to, to)
      if (!(b > a)) continue
      const at = (z: number): Two => {
        const t = (z - load.from) / (load.to - load.from)
        return [load.start.y + t * (load.end.y - load.start.y), load.start.x + t * (load.end.x - load.start.x)]
      }
      const slope: Two = [
        (load.end.y - load.start.y) / (load.to - load.from),
        (load.end.x - load.start.x) / (load.to - load.from),
      ]
      terms.push({ a: a - from, order: 1, value: bend(at(a)) }, { a: a - from, order: 2, value: bend(slope) })
      if (b < to) {
        const [y, x] = bend(at(b))
        const [sy, sx] = bend(slope)
        terms.push({ a: b - from, order: 1, value: [-y, -x] }, { a: b - from, order: 2, value: [-sy, -sx] })
      }
    }
    if (load.kind === 'temperature') {
      const a = Math.max(load.from, from)
      const b = Math.min(load.to, to)
      if (!(b > a)) continue
      // a free member curves towards its warm side: ψ' = −α·gradient with no moment
      const k = span.stiffness.expansion ?? 0
      terms.push({ a: a - from, order: -1, value: [-k * load.gradient.y, -k * load.gradient.x] })
      if (b < to) terms.push({ a: b - from, order: -1, value: [k * load.gradient.y, k * load.gradient.x] })
    }
  }
  return terms
}

/** Curvature that needs no moment, as polynomials cannot tell it from the loads' kinks: listed apart. */
function thermalCurvature(span: Span, loads: readonly BeamLoad[], s: number): Two {
  const k = span.stiffness.expansion ?? 0
  let [y, x] = [0, 0]
  for (const load of loads)
    if (load.kind === 'temperature' && load.from <= span.from + s && load.to > span.from + s) {
      y -= k * load.gradient.y
      x -= k * load.gradient.x
    }
  return [y, x]
}

const FACTORIAL = [1, 1, 2, 6, 24, 120]

/** Adds value·⟨s − a⟩ⁿ/n! as a polynomial in s, for s ≥ a. */
function addPower(into: number[], value: number, a: number, n: number): void {
  const power = new Array<number>(n + 1).fill(0)
  power[n] = value / FACTORIAL[n]
  shifted(power, -a).forEach((coefficient, k) => {
    into[k] = (into[k] ?? 0) + coefficient
  })
}

/** Where the span's polynomials change, from 0 to its length. */
function breaks(span: Span, loads: readonly BeamLoad[]): number[] {
  const marks = new Set([0, span.to - span.from])
  const add = (z: number) => z > span.from && z < span.to && marks.add(z - span.from)
  for (const load of loads) {
    if ('at' in load) add(load.at)
    else {
      add(load.from)
      add(load.to)
    }
  }
  return [...marks].sort((a, b) => a - b)
}

/** Deflection and turning at s, with the fixed left end's state given: s₀, ψ₀, c₁, c₂ as pairs (y, x). */
export type SpanState = [Two, Two, Two, Two]

/** The span's pieces for a state at its left end. `axial` is filled in by the caller. */
export function spanPieces(span: Span, loads: readonly BeamLoad[], [s0, t0, c1, c2]: SpanState): Piece[] {
  const d = bendingStiffness(span.stiffness)
  const sd = product(shearFlexibility(span.stiffness), d)
  const terms = termsOf(span, loads)
  const marks = breaks(span, loads)
  return marks.slice(0, -1).map((a, i) => {
    const b = marks[i + 1]
    const active = terms.filter((term) => term.a <= a)
    const plane = (p: 0 | 1) => {
      const jerk = [c2[p]]
      const bend = [c1[p], c2[p]]
      const turn = [t0[p], c1[p], c2[p] / 2]
      const move = [s0[p], t0[p], c1[p] / 2, c2[p] / 6]
      for (const { a: start, order, value } of active) {
        if (order >= 0) addPower(jerk, value[p], start, order)
        addPower(bend, value[p], start, order + 1)
        addPower(turn, value[p], start, order + 2)
        addPower(move, value[p], start, order + 3)
      }
      return { jerk, bend, turn, move }
    }
    const [y, x] = [plane(0), plane(1)]
    // the shear part of the deflection: −∫S·D·ψ''
    const integral = (jerk: number[]) => [0, ...jerk.map((coefficient, k) => coefficient / (k + 1))]
    const [jy, jx] = [integral(y.jerk), integral(x.jerk)]
    const lessShear = (move: number[], row: Two) => sum(move, scaled(jy, -row[0]), scaled(jx, -row[1]))
    const warm = thermalCurvature(span, loads, a)
    const elastic = (bend: number[], w: number) => sum(bend, [-w])
    const [by, bx] = [elastic(y.bend, warm[0]), elastic(x.bend, warm[1])]
    const here = (polynomial: number[]) => shifted(polynomial, a)
    const force = (py: number[], px: number[], row: Two) => here(sum(scaled(py, row[0]), scaled(px, row[1])))
    return {
      from: span.from + a,
      to: span.from + b,
      deflection: { y: here(lessShear(y.move, sd[0])), x: here(lessShear(x.move, sd[1])) },
      slope: { y: here(y.turn), x: here(x.turn) },
      moment: { y: force(by, bx, d[0]), x: force(by, bx, d[1]) },
      shear: { y: force(y.jerk, x.jerk, d[0]), x: force(y.jerk, x.jerk, d[1]) },
      axial: [],
    }
  })
}

const scaled = (polynomial: number[], factor: number) => polynomial.map((coefficient) => coefficient * factor)
const sum = (...polynomials: number[][]) =>
  Array.from({ length: Math.max(...polynomials.map((p) => p.length)) }, (_, k) =>
    polynomials.reduce((total, p) => total + (p[k] ?? 0), 0),
  )
