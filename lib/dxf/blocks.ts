import type { Reading } from './reading'
import { emptySheet, type Sheet } from './sheet'
import { slots } from './record'

const BLOCK = slots([], [10, 20, 70])
const EXTERNAL = 4 | 8

/** A BLOCK of the file. */
export interface BlockDefinition {
  /** number of its name in `Reading.blocks` */
  name: number
  sheet: Sheet
  base: [number, number]
  /** stands for another file, which is not in this one */
  external: boolean
  /** bytes of the file that it takes */
  from: number
  to: number
}

/** BLOCK: name, base point, and whether it stands for another file. */
export function openBlock(reading: Reading): BlockDefinition {
  const { record } = reading
  const g = record.find(2)
  const name = g < 0 ? reading.blocks.add('') : reading.blocks.idOf(record.from[g], record.to[g])
  const read = record.scan(BLOCK)
  return {
    name,
    sheet: emptySheet(reading.blocks.raw[name]),
    base: read ? [record.slot(0, 0), record.slot(1, 0)] : [Number.NaN, Number.NaN],
    external: read && (record.slot(2, 0) & EXTERNAL) !== 0,
    from: record.count > 0 ? record.from[0] : 0,
    to: 0,
  }
}
