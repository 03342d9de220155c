import { pushArc, pushEllipse } from '../../geometry/edges'
import { ELLIPSE_KIND } from '../kinds'
import type { Reading } from '../reading'
import { slots } from '../record'
import { sweepFrom } from './arc'

const ELLIPSE = slots([10, 20, 11, 21, 40, 41, 42], [30, 31])
const TURN = 2 * Math.PI
/**
 * ELLIPSE, in world coordinates: P(t) = C + M cos t + r (N × M) sin t, M the major axis from the centre, t from
 * 41 to 42 (rad). N = (0, 0, −1) reverses the sense. r > 1 means the same curve.
 */
export function readEllipse(reading: Reading) {
  if (!reading.takeInPlane(ELLIPSE_KIND, ELLIPSE)) return
  const { record, facing } = reading
  const [x, y, ux, uy, ratio, start, end] = record.values
  if (ux === 0 && uy === 0) return reading.refuse(ELLIPSE_KIND, 'ellipse-bad', { what: 'its major axis has no length' })
  if (!(ratio > 0))
    return reading.refuse(ELLIPSE_KIND, 'ellipse-bad', { what: `its axis ratio is ${ratio}, and must be greater than 0` })
  const axisZ = record.slot(8, 0)
  if (Math.abs(axisZ) > 1e-7 * Math.hypot(ux, uy)) {
    return reading.refuse(ELLIPSE_KIND, 'ellipse-bad', { what: 'its major axis leaves the drawing plane' })
  }
  const sweep = sweepFrom(start, end, TURN)
  if (sweep === 0) return reading.refuse(ELLIPSE_KIND, 'arc-without-sweep')
  const row = reading.begin(ELLIPSE_KIND)
  reading.height(record.slot(7, 0))
  if (ratio > 1) reading.remark(row, 'ellipse-ratio', { ...reading.where(ELLIPSE_KIND), ratio }, [x, y])
  if (sweep === TURN) reading.sheet.entities.closed[row] = 1
  pushEllipticalArc(reading, x, y, ux, uy, 0 - facing * ratio * uy, facing * ratio * ux + 0, start, sweep, row)
}

/** Appends the arc c + u cos t + v sin t; one with u ⊥ v of equal length is a circular arc. */
export function pushEllipticalArc(
  reading: Reading,
  x: number,
  y: number,
  ux: number,
  uy: number,
  vx: number,
  vy: number,
  start: number,
  sweep: number,
  row: number,
): void {
  const { edges } = reading.sheet
  const end = Math.abs(sweep) === TURN ? start : start + sweep
  const x0 = x + ux * Math.cos(start) + vx * Math.sin(start)
  const y0 = y + uy * Math.cos(start) + vy * Math.sin(start)
  const x1 = x + ux * Math.cos(end) + vx * Math.sin(end)
  const y1 = y + uy * Math.cos(end) + vy * Math.sin(end)
  if (vx === -uy && vy === ux) pushArc(edges, x0, y0, x1, y1, x, y, Math.hypot(ux, uy), start + Math.atan2(uy, ux), sweep, row)
  else if (vx === uy && vy === -ux) {
    pushArc(edges, x0, y0, x1, y1, x, y, Math.hypot(ux, uy), Math.atan2(uy, ux) - start, -sweep, row)
  } else pushEllipse(edges, x0, y0, x1, y1, x, y, ux, uy, vx, vy, start, sweep, row)
}
