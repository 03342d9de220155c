import { pushLine } from '../../geometry/edges'
import { LINE_KIND } from '../kinds'
import type { Reading } from '../reading'
import { slots } from '../record'

const LINE = slots([10, 20, 11, 21], [30, 31])

/** LINE: two points in world coordinates, taken in plan. */
export function readLine(reading: Reading) {
  if (!reading.take(LINE_KIND, LINE)) return
  const { record } = reading
  const [x0, y0, x1, y1] = record.values
  const row = reading.begin(LINE_KIND)
  const z0 = record.slot(4, 0)
  const z1 = record.slot(5, 0)
  reading.height(z0)
  if (z0 !== z1) {
    reading.height(z1)
    const [low, high] = z0 < z1 ? [z0, z1] : [z1, z0]
    reading.remark(row, 'heights-in-entity', { ...reading.where(LINE_KIND), low, high }, [x0, y0])
  }
  if (x0 === x1 && y0 === y1) reading.remark(row, 'no-length', reading.where(LINE_KIND), [x0, y0])
  else pushLine(reading.sheet.edges, x0, y0, x1, y1, row)
}
