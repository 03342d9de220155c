import type { FindingParams } from '../../geometry/finding'
import { POLYLINE_KIND } from '../kinds'
import type { Reading } from '../reading'
import { slots } from '../record'

const HEADER = slots([], [30, 40, 41, 70])
const VERTEX = slots([10, 20], [30, 40, 41, 42, 70])

// POLYLINE 70
const CLOSED = 1
const SPLINE_FIT = 4
const IN_SPACE = 8
const MESH = 16
const POLYFACE = 64
// VERTEX 70
const SPLINE_POINT = 8
const FRAME_POINT = 16

/** A POLYLINE whose vertices are being read: they are records of their own. */
export interface OpenPolyline {
  row: number
  where: FindingParams
  flags: number
  facing: 1 | -1
  width: number
  low: number
  high: number
  splinePoints: number
  framePoints: number
  broken: boolean
}

/** POLYLINE: what its own record says; null where it cannot be read or is a mesh. */
export function openPolyline(reading: Reading): OpenPolyline | null {
  const { record, facing } = reading
  if (!reading.take(POLYLINE_KIND, HEADER)) return null
  const flags = record.slot(3, 0)
  if ((flags & (MESH | POLYFACE)) !== 0) {
    reading.refuse(POLYLINE_KIND, 'polyline-mesh', { what: (flags & MESH) !== 0 ? 'mesh' : 'polyface mesh' })
    return null
  }
  const inSpace = (flags & IN_SPACE) !== 0
  if (facing === 0 && !inSpace) {
    reading.refuseTilted(POLYLINE_KIND)
    return null
  }
  const z = record.slot(0, 0)
  const where = reading.where(POLYLINE_KIND)
  reading.vertices.count = 0
  return {
    row: reading.begin(POLYLINE_KIND),
    where,
    flags,
    facing: inSpace || facing === 0 ? 1 : facing,
    width: Math.max(Math.abs(record.slot(1, 0)), Math.abs(record.slot(2, 0))),
    low: inSpace ? Number.POSITIVE_INFINITY : z,
    high: inSpace ? Number.NEGATIVE_INFINITY : z,
    splinePoints: 0,
    framePoints: 0,
    broken: false,
  }
}

/** VERTEX: one vertex of the open polyline. A vertex of a control frame is no metal. */
export function readVertex(reading: Reading, open: OpenPolyline): void {
  if (open.broken) return
  const { record, vertices } = reading
  if (!record.scan(VERTEX)) {
    open.broken = true
    const g = record.find(5)
    reading.remarkFault(open.row, {
      ...open.where,
      kind: 'VERTEX',
      handle: g < 0 ? open.where.handle : reading.text(g),
      place: reading.place(record.line),
    })
    return
  }
  const flags = record.slot(6, 0)
  if ((flags & FRAME_POINT) !== 0) {
    open.framePoints++
    return
  }
  if ((flags & SPLINE_POINT) !== 0) open.splinePoints++
  const i = vertices.count++
  vertices.reach(i)
  vertices.xyb[3 * i] = record.values[0]
  vertices.xyb[3 * i + 1] = record.values[1]
  vertices.xyb[3 * i + 2] = record.slot(5, 0)
  open.width = Math.max(open.width, Math.abs(record.slot(3, 0)), Math.abs(record.slot(4, 0)))
  if ((open.flags & IN_SPACE) !== 0) {
    const z = record.slot(2, 0)
    open.low = Math.min(open.low, z)
    open.high = Math.max(open.high, z)
  }
}

/** Ends the open polyline and appends its edges; `ended` says whether by SEQEND. */
export function closePolyline(reading: Reading, open: OpenPolyline, ended: boolean) {
  if (open.broken) return
  const { vertices } = reading
  const { row, where, facing, low, high } = open
  if ((open.flags & SPLINE_FIT) !== 0 && open.splinePoints === 0 && open.framePoints > 0) {
    return reading.remark(row, 'spline-frame-only', where)
  }
  if (vertices.count < 2) return reading.remark(row, 'polyline-without-vertices', { ...where, vertices: vertices.count })
  const at: [number, number] = [facing * vertices.xyb[0], vertices.xyb[1]]
  reading.height(facing * low)
  if (low !== high) {
    reading.height(high)
    reading.remark(row, 'heights-in-entity', { ...where, low, high }, at)
  } else if ((open.flags & IN_SPACE) !== 0) reading.remark(row, 'polyline-3d', where, at)
  if (!ended) reading.remark(row, 'polyline-without-end', { ...where, vertices: vertices.count }, at)
  if (open.width > 0) reading.remark(row, 'polyline-width', { ...where, width: open.width }, at)
  const closed = (open.flags & CLOSED) === 1
  if (closed) reading.sheet.entities.closed[row] = 1
  if (vertices.push(reading, row, closed, facing) === 0) reading.remark(row, 'no-length', where, at)
}
