import { after, cosDegrees, sinDegrees } from '../affine'
import { INSERT_KIND } from '../kinds'
import type { Reading } from '../reading'
import { slots } from '../record'

const INSERT = slots([10, 20], [30, 41, 42, 50, 70, 71, 44, 45])

/**
 * INSERT: world = OCS · [T(place) · Rz(50) · (T(column · 44, row · 45) + S(41, 42) · (p − base))]; the base
 * point comes in when blocks are opened. The array turns with the rotation and is not scaled.
 */
export function readInsert(reading: Reading) {
  if (!reading.takeInPlane(INSERT_KIND, INSERT)) return
  const { record, facing } = reading
  const g = record.find(2)
  if (g < 0) return reading.refuse(INSERT_KIND, 'group-missing', { code: 2, what: 'the name of the block' })
  const [x, y] = record.values
  const scaleX = record.slot(3, 1)
  const scaleY = record.slot(4, 1)
  const angle = record.slot(5, 0)
  const columns = record.slot(6, 1) || 1
  const rows = record.slot(7, 1) || 1
  if (scaleX === 0 || scaleY === 0) return reading.refuse(INSERT_KIND, 'insert-scale-zero', { name: reading.text(g) })
  if (!Number.isInteger(columns) || !Number.isInteger(rows) || columns < 0 || rows < 0) {
    return reading.refuse(INSERT_KIND, 'insert-array', { columns, rows })
  }
  const cos = cosDegrees(angle)
  const sin = sinDegrees(angle)
  const turned = { a: cos, b: sin, c: -sin, d: cos, e: x, f: y }
  const seen = facing === 1 ? turned : after({ a: -1, b: 0, c: 0, d: 1, e: 0, f: 0 }, turned)
  const columnWidth = record.slot(8, 0)
  const rowHeight = record.slot(9, 0)
  const row = reading.begin(INSERT_KIND)
  reading.height(facing * record.slot(2, 0))
  const handle = record.find(5)
  const { a, b, c, d, e, f } = after(seen, { a: scaleX, b: 0, c: 0, d: scaleY, e: 0, f: 0 })
  const block = reading.blocks.idOf(record.from[g], record.to[g])
  const column = [seen.a * columnWidth, seen.b * columnWidth]
  const step = [seen.c * rowHeight, seen.d * rowHeight]
  const place = handle < 0 ? [record.line, 0, 0] : [record.line, record.from[handle], record.to[handle]]
  reading.sheet.placements.push([block, row, a, b, c, d, e, f, columns, rows, ...column, ...step, ...place])
}
