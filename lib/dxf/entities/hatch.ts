import { pushLine } from '../../geometry/edges'
import { pushBulge } from '../bulge'
import { cosDegrees, sinDegrees } from '../affine'
import { HATCH_BOUNDARY } from '../drawing'
import { HATCH_KIND } from '../kinds'
import type { Reading } from '../reading'
import { bezierPieces } from '../spline/bezierPieces'
import { pushPieces } from '../spline/pushPieces'
import { pushArcDegrees, sweepFrom } from './arc'
import { pushEllipticalArc } from './ellipse'

const POLYLINE = 2
const MOST = 1e6

/** Walks over the boundary groups of the hatch at hand in their fixed order. */
class Boundary {
  /** what keeps the boundary from being read, in words */
  fault: string | null = null
  private g: number

  constructor(private readonly reading: Reading) {
    const { record } = reading
    // before the paths stand the elevation (10 20 30) and, in front, groups that every entity has
    const paths = record.find(91)
    this.g = paths < 0 ? record.count : paths
  }

  /** The next group's number, which must have that code. */
  take(code: number): number {
    const value = this.maybe(code)
    if (value === null) this.fail(`group ${code} of its boundary is missing`)
    return value ?? 0
  }

  maybe(code: number): number | null {
    const { record } = this.reading
    if (this.fault !== null || this.g >= record.count || record.code[this.g] !== code) return null
    const value = record.finite(this.g)
    if (Number.isNaN(value))
      this.fail(`group ${code} of its boundary reads "${this.reading.text(this.g)}", which is no number it can use`)
    this.g++
    return value
  }

  count(code: number): number {
    const value = this.take(code)
    if (Number.isInteger(value) && value >= 0 && value <= MOST) return value
    this.fail(`it says ${value} parts of its boundary (group ${code})`)
    return 0
  }

  /** Keeps the first fault; nothing is read after it. */
  fail(what: string): void {
    this.fault ??= what
  }

  skip(code: number): void {
    const { record } = this.reading
    while (this.g < record.count && record.code[this.g] === code) this.g++
  }
}

/** HATCH: its boundary paths as edges that are taken only on request, in the entity's own plane. */
export function readHatch(reading: Reading) {
  if (reading.facing === 0) return reading.refuseTilted(HATCH_KIND)
  reading.flags |= HATCH_BOUNDARY
  const row = reading.begin(HATCH_KIND)
  reading.sheet.entities.closed[row] = 1
  const boundary = new Boundary(reading)
  const paths = boundary.count(91)
  for (let i = 0; i < paths && boundary.fault === null; i++) readPath(reading, boundary, row)
  if (boundary.fault !== null) reading.remark(row, 'hatch-bad', { ...reading.where(HATCH_KIND), what: boundary.fault })
}

function readPath(reading: Reading, boundary: Boundary, row: number): void {
  const flags = boundary.take(92)
  if ((flags & POLYLINE) !== 0) readPolylinePath(reading, boundary, row)
  else {
    const edges = boundary.count(93)
    for (let i = 0; i < edges && boundary.fault === null; i++) readEdge(reading, boundary, row)
  }
  if (boundary.maybe(97) !== null) boundary.skip(330)
}

function readPolylinePath(reading: Reading, boundary: Boundary, row: number): void {
  const { facing, sheet } = reading
  boundary.take(72)
  boundary.maybe(73)
  const count = boundary.count(93)
  const points: [number, number, number][] = []
  for (let i = 0; i < count && boundary.fault === null; i++) {
    const x = boundary.take(10)
    const y = boundary.take(20)
    points.push([facing * x + 0, y, facing * (boundary.maybe(42) ?? 0)])
  }
  if (boundary.fault !== null) return
  points.forEach(([x, y, bulge], i) => {
    const [nextX, nextY] = points[(i + 1) % points.length]
    pushBulge(sheet.edges, x, y, nextX, nextY, bulge, row)
  })
}

function readEdge(reading: Reading, boundary: Boundary, row: number): void {
  const kind = boundary.take(72)
  const { facing, sheet } = reading
  if (kind === 1) {
    const [x0, y0, x1, y1] = [10, 20, 11, 21].map((code) => boundary.take(code))
    if (boundary.fault === null && (x0 !== x1 || y0 !== y1)) pushLine(sheet.edges, facing * x0 + 0, y0, facing * x1 + 0, y1, row)
  } else if (kind === 2) readArcEdge(reading, boundary, row)
  else if (kind === 3) readEllipseEdge(reading, boundary, row)
  else if (kind === 4) readSplineEdge(reading, boundary, row)
  else boundary.fail(`its boundary has an edge of kind ${kind}`)
}

/** Clockwise arcs store mirrored angles (360 − angle). */
function readArcEdge(reading: Reading, boundary: Boundary, row: number): void {
  const [x, y, radius, from, to] = [10, 20, 40, 50, 51].map((code) => boundary.take(code))
  const sense = boundary.take(73) === 0 ? -1 : 1
  if (!(radius > 0)) boundary.fail(`its boundary has an arc of radius ${radius}`)
  const sweep = sense * sweepFrom(from, to, 360)
  if (sweep === 0) boundary.fail('its boundary has an arc that starts and ends at the same angle')
  if (boundary.fault !== null) return
  const { facing } = reading
  const start = sense * from
  pushArcDegrees(reading, facing * x + 0, y, radius, facing === 1 ? start : 180 - start, facing * sweep, row)
}

/** Angles of elliptical arcs are those of the points as seen from the centre, in degrees (from memory). */
function readEllipseEdge(reading: Reading, boundary: Boundary, row: number): void {
  const [x, y, ux, uy, ratio, from, to] = [10, 20, 11, 21, 40, 50, 51].map((code) => boundary.take(code))
  const sense = boundary.take(73) === 0 ? -1 : 1
  if (!(ratio > 0) || (ux === 0 && uy === 0)) boundary.fail('its boundary has an ellipse without axes')
  const sweep = sweepFrom(from, to, 360)
  if (sweep === 0) boundary.fail('its boundary has an elliptical arc that starts and ends at the same angle')
  if (boundary.fault !== null) return
  const { facing } = reading
  const start = parameterOf(sense * from, ratio)
  let radians = sweep === 360 ? 2 * Math.PI : sense * (parameterOf(sense * to, ratio) - start)
  if (radians <= 0) radians += 2 * Math.PI
  pushEllipticalArc(reading, facing * x, y, facing * ux, uy, 0 - facing * ratio * uy, ratio * ux, start, sense * radians, row)
}

const parameterOf = (degrees: number, ratio: number): number => Math.atan2(sinDegrees(degrees) / ratio, cosDegrees(degrees))

function readSplineEdge(reading: Reading, boundary: Boundary, row: number): void {
  const degree = boundary.count(94)
  const rational = boundary.take(73) === 1
  boundary.take(74)
  const knotCount = boundary.count(95)
  const controlCount = boundary.count(96)
  if (degree < 1 || degree > 25 || controlCount <= degree || knotCount !== controlCount + degree + 1) {
    boundary.fail('its boundary has a spline with a wrong number of knots')
  }
  const knots: number[] = []
  while (knots.length < knotCount && boundary.fault === null) knots.push(boundary.take(40))
  if (knots.some((knot, i) => i > 0 && knot < knots[i - 1])) boundary.fail('its boundary has a spline with decreasing knots')
  const control: number[] = []
  while (control.length < 3 * controlCount && boundary.fault === null) {
    const x = reading.facing * boundary.take(10)
    const y = boundary.take(20)
    const weight = boundary.maybe(42)
    if (rational && !(weight !== null && weight > 0))
      boundary.fail('its boundary has a spline with a weight that is not greater than 0')
    const w = rational ? (weight ?? 1) : 1
    control.push(x * w, y * w, w)
  }
  const fit = boundary.maybe(97) ?? 0
  for (let i = 0; i < fit && boundary.fault === null; i++) [11, 21].map((code) => boundary.take(code))
  for (const tangent of [12, 13]) if (boundary.maybe(tangent) !== null) boundary.take(tangent + 10)
  if (boundary.fault !== null) return
  pushPieces(reading.sheet, row, bezierPieces(degree, knots, Float64Array.from(control)))
}
