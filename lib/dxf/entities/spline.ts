import { SPLINE_KIND } from '../kinds'
import type { Reading } from '../reading'
import { bezierPieces, type Homogeneous } from '../spline/bezierPieces'
import { type Ends, greatestDistance, interpolate, parametersBy } from '../spline/interpolate'
import { pushPieces } from '../spline/pushPieces'

const HIGHEST_DEGREE = 25
const LARGEST_WEIGHT_RATIO = 1e6
/** A fit tolerance above this leaves the curve open. */
const LARGEST_FIT_TOLERANCE = 1e-6
const LEAST_WEIGHT = 1e-100
/** Fit points closer than this share of the curve, or of their distance from the origin, are one. */
const SAME_POINT = 1e-12
const LEAST_EXTENT = 1e-14
const CLOSED = 1
const RATIONAL = 4

type Vector = [number, number]

/** The groups of a SPLINE, lists as they stand. */
interface SplineGroups {
  flags: number
  degree: number
  says: { knots: number; control: number; fit: number }
  fitTolerance: number
  knots: number[]
  weights: number[]
  control: Vector[]
  fit: Vector[]
  start: Vector | null
  end: Vector | null
  low: number
  high: number
}

/**
 * SPLINE, in world coordinates: a B-spline of its knots, weights and control points on its domain
 * [u_p, u_(n+1)], as Bézier pieces; or, with fit points only, an interpolating cubic, which is said.
 */
export function readSpline(reading: Reading) {
  const groups = readGroups(reading)
  if (groups === null) return reading.refuseRecord(SPLINE_KIND)
  if (typeof groups === 'string') return reading.refuse(SPLINE_KIND, 'spline-bad', { what: groups })
  const fault = groups.control.length > 0 || groups.fit.length === 0 ? faultOf(groups) : faultOfFit(groups)
  if (fault) return reading.refuse(SPLINE_KIND, 'spline-bad', { what: fault })
  const row = reading.begin(SPLINE_KIND)
  const { low, high } = groups
  const where = reading.where(SPLINE_KIND)
  reading.height(low)
  const pieces = groups.control.length > 0 ? piecesOf(groups) : piecesThrough(reading, row, groups)
  const count = pushPieces(reading.sheet, row, pieces)
  if (low !== high) {
    reading.height(high)
    reading.remark(row, 'heights-in-entity', { ...where, low, high })
  }
  if (count === 0) reading.remark(row, 'no-length', where)
}

function piecesOf({ degree, knots, weights, control }: SplineGroups): Iterable<Homogeneous> {
  const even = weights.every((w) => w === weights[0])
  const homogeneous = new Float64Array(3 * control.length)
  control.forEach(([x, y], i) => {
    const w = even ? 1 : weights[i]
    homogeneous.set([x * w, y * w, w], 3 * i)
  })
  return bezierPieces(degree, knots, homogeneous)
}

function piecesThrough(reading: Reading, row: number, { fit, flags, start, end }: SplineGroups): Homogeneous[] {
  const points = distinct(fit)
  const closed = (flags & CLOSED) === 1
  const [first, last] = [points[0], points[points.length - 1]]
  if (closed && (first[0] !== last[0] || first[1] !== last[1])) points.push(first)
  const ends: Ends = { start, end, periodic: closed && points.length > 3 }
  const pieces = interpolate(points, parametersBy(1, points), ends)
  const other = interpolate(points, parametersBy(0.5, points), ends)
  const words = ends.periodic ? 'closed smoothly' : start || end ? 'with the end tangents given' : 'without curvature at its ends'
  const difference = greatestDistance(pieces, other)
  reading.remark(row, 'spline-fit-points', { ...reading.where(SPLINE_KIND), ends: words, difference }, first)
  return pieces
}

const extentOf = (points: readonly Vector[]): number =>
  points.reduce((most, [x, y]) => Math.max(most, Math.abs(x - points[0][0]), Math.abs(y - points[0][1])), 0)

/** Points without those that only repeat the one before. */
function distinct(points: readonly Vector[]): Vector[] {
  const least = SAME_POINT * extentOf(points)
  const kept = [points[0]]
  for (const [x, y] of points) {
    const [lastX, lastY] = kept[kept.length - 1]
    if (Math.hypot(x - lastX, y - lastY) > least) kept.push([x, y])
  }
  return kept
}

/** Why control points, knots and weights make no curve; null where they do. */
function faultOf({ flags, degree, says, knots, weights, control }: SplineGroups): string | null {
  if (!Number.isInteger(degree) || degree < 1 || degree > HIGHEST_DEGREE) {
    return `its degree is ${degree}; degrees from 1 to ${HIGHEST_DEGREE} can be read`
  }
  if (control.length === 0) return 'it has no control points and no fit points'
  if (says.control >= 0 && says.control !== control.length)
    return `it says ${says.control} control points and has ${control.length}`
  if (says.knots >= 0 && says.knots !== knots.length) return `it says ${says.knots} knots and has ${knots.length}`
  if (control.length < degree + 1) return `it has ${control.length} control points; degree ${degree} needs ${degree + 1}`
  const needed = control.length + degree + 1
  if (knots.length !== needed)
    return `it has ${knots.length} knots; ${control.length} control points of degree ${degree} need ${needed}`
  for (let i = 1; i < knots.length; i++) {
    if (knots[i] < knots[i - 1]) return `its knots decrease, from ${knots[i - 1]} to ${knots[i]}`
  }
  if (!(knots[degree] < knots[control.length])) return 'its knots span nothing'
  return faultOfWeights(flags, weights, control.length)
}

function faultOfWeights(flags: number, weights: readonly number[], count: number): string | null {
  if (weights.length === 0) return (flags & RATIONAL) !== 0 ? 'it says that it is rational and has no weights' : null
  if (weights.length !== count) return `it has ${weights.length} weights for ${count} control points`
  let low = Number.POSITIVE_INFINITY
  let high = 0
  for (const w of weights) {
    if (!(w > 0)) return `it has a weight of ${w}; weights must be greater than 0`
    low = Math.min(low, w)
    high = Math.max(high, w)
  }
  if (high < LEAST_WEIGHT) return `its weights are too small to compute with, at most ${high}`
  return high > LARGEST_WEIGHT_RATIO * low
    ? `its weights lie ${(high / low).toPrecision(3)} times apart; up to 1e6 can be computed`
    : null
}

function faultOfFit({ says, fit, fitTolerance }: SplineGroups): string | null {
  if (says.fit >= 0 && says.fit !== fit.length) return `it says ${says.fit} fit points and has ${fit.length}`
  if (fitTolerance > LARGEST_FIT_TOLERANCE) return `it has fit points only, and passes them by up to ${fitTolerance}`
  const [first] = fit
  return extentOf(fit) > LEAST_EXTENT * Math.hypot(...first) ? null : 'its fit points are all one point'
}

/** The groups of the spline at hand; a sentence, or null (with the record's fault), where they cannot be read. */
function readGroups({ record }: Reading): SplineGroups | string | null {
  const groups: SplineGroups = {
    flags: 0,
    degree: Number.NaN,
    says: { knots: -1, control: -1, fit: -1 },
    fitTolerance: 0,
    knots: [],
    weights: [],
    control: [],
    fit: [],
    start: null,
    end: null,
    low: Number.POSITIVE_INFINITY,
    high: Number.NEGATIVE_INFINITY,
  }
  const lists = new Map<number, number[]>([10, 20, 11, 21, 12, 22, 13, 23].map((code) => [code, []]))
  for (let g = 0; g < record.count; g++) {
    const code = record.code[g]
    if (!USED.has(code)) continue
    const value = record.finite(g)
    if (Number.isNaN(value)) return null
    const list = lists.get(code)
    if (list) list.push(value)
    else take(groups, code, value)
  }
  const pairs = (x: number, y: number): Vector[] | null => {
    const [xs, ys] = [lists.get(x) ?? [], lists.get(y) ?? []]
    return xs.length === ys.length ? xs.map((value, i): Vector => [value, ys[i]]) : null
  }
  const [control, fit, start, end] = [pairs(10, 20), pairs(11, 21), pairs(12, 22), pairs(13, 23)]
  if (!control || !fit || !start || !end) return 'it has a point without x or y'
  const direction = ([v]: Vector[]) => (v && Math.hypot(...v) > 0 ? v : null)
  if (groups.low > groups.high) groups.low = groups.high = 0
  return { ...groups, control, fit, start: direction(start), end: direction(end) }
}

const USED = new Set([70, 71, 72, 73, 74, 40, 41, 44, 10, 20, 30, 11, 21, 31, 12, 22, 13, 23])

function take(groups: SplineGroups, code: number, value: number): void {
  switch (code) {
    case 70:
      groups.flags = value
      break
    case 71:
      groups.degree = value
      break
    case 72:
      groups.says.knots = value
      break
    case 73:
      groups.says.control = value
      break
    case 74:
      groups.says.fit = value
      break
    case 40:
      groups.knots.push(value)
      break
    case 41:
      groups.weights.push(value)
      break
    case 44:
      groups.fitTolerance = value
      break
    default:
      groups.low = Math.min(groups.low, value)
      groups.high = Math.max(groups.high, value)
  }
}
