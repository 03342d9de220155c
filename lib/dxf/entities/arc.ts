import { pushArc } from '../../geometry/edges'
import { cosDegrees, sinDegrees } from '../affine'
import { ARC_KIND, CIRCLE_KIND } from '../kinds'
import type { Reading } from '../reading'
import { slots } from '../record'

const CIRCLE = slots([10, 20, 40], [30])
const ARC = slots([10, 20, 40, 50, 51], [30])
const RADIANS = Math.PI / 180

/** CIRCLE: centre and radius in the entity's own plane. */
export function readCircle(reading: Reading) {
  if (!reading.takeInPlane(CIRCLE_KIND, CIRCLE)) return
  const { record, facing } = reading
  const [x, y, radius] = record.values
  if (!(radius > 0)) return reading.refuse(CIRCLE_KIND, 'radius-bad', { radius })
  const cx = facing * x + 0
  const row = reading.begin(CIRCLE_KIND)
  reading.height(facing * record.slot(3, 0))
  reading.sheet.entities.closed[row] = 1
  pushArc(reading.sheet.edges, cx + radius, y, cx + radius, y, cx, y, radius, 0, 2 * Math.PI, row)
}

/** Angles and parameters closer than this (degrees or rad) are one: they are written with so many digits. */
const SAME_ANGLE = 1e-9
/** Share of a turn by which rounding may take a full one beyond itself: 2π is written 6.2832. No arc is written so. */
const BEYOND_FULL = 1e-4

/** Sweep from start to end counter-clockwise, in (0, turn]; 0 where they are the same angle. `turn` is 360 or 2π. */
export function sweepFrom(start: number, end: number, turn: number): number {
  const turns = Math.round((end - start) / turn)
  const beyond = end - start - turns * turn
  if (Math.abs(beyond) <= SAME_ANGLE) return turns === 0 ? 0 : turn
  if (turns > 0 && beyond > 0 && beyond <= BEYOND_FULL * turn) return turn
  const sweep = (end - start) % turn
  return sweep < 0 ? sweep + turn : sweep
}

/** ARC: centre, radius and angles in degrees, counter-clockwise in the entity's own plane. */
export function readArc(reading: Reading) {
  if (!reading.takeInPlane(ARC_KIND, ARC)) return
  const { record, facing } = reading
  const [x, y, radius, start, end] = record.values
  if (!(radius > 0)) return reading.refuse(ARC_KIND, 'radius-bad', { radius })
  const sweep = sweepFrom(start, end, 360)
  if (sweep === 0) return reading.refuse(ARC_KIND, 'arc-without-sweep')
  const row = reading.begin(ARC_KIND)
  reading.height(facing * record.slot(5, 0))
  if (sweep === 360) reading.sheet.entities.closed[row] = 1
  pushArcDegrees(reading, facing * x + 0, y, radius, facing === 1 ? start : 180 - start, facing * sweep, row)
}

/** Appends a circular arc given in degrees; sweep < 0 is clockwise. */
export function pushArcDegrees(
  reading: Reading,
  x: number,
  y: number,
  radius: number,
  start: number,
  sweep: number,
  row: number,
): void {
  const whole = Math.abs(sweep) === 360
  const end = whole ? start : start + sweep
  pushArc(
    reading.sheet.edges,
    x + radius * cosDegrees(start),
    y + radius * sinDegrees(start),
    x + radius * cosDegrees(end),
    y + radius * sinDegrees(end),
    x,
    y,
    radius,
    (start % 360) * RADIANS,
    sweep * RADIANS,
    row,
  )
}
