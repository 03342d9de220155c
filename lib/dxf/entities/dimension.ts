import type { Point } from '../../geometry/edges'
import { kindNumber } from '../kinds'
import type { Reading } from '../reading'
import type { DimensionStyle } from '../tables'
import { rawText } from '../text'

const DIMENSION = kindNumber('DIMENSION')
const MOST_DIMENSIONS = 20_000

/** A DIMENSION as it stands in the file, names as bytes. */
export interface RawDimension {
  /** group 70 without its flags: 0 linear, 1 aligned, 2 and 5 angular, 3 diameter, 4 radius, 6 ordinate */
  type: number
  /** an ordinate dimension measures x */
  ordinateX: boolean
  stored: number | null
  text: string
  style: string
  layer: number
  angle: number
  /** definition points by group code 10, 11, 13, 14, 15, 16 */
  points: Partial<Record<number, Point>>
  /** what the entity itself says instead of its style */
  overrides: Partial<DimensionStyle>
}

const POINTS = [10, 11, 13, 14, 15, 16]

/** DIMENSION: evidence of a size, no metal. Counted as not read, as it gives no edges. */
export function readDimension(reading: Reading): void {
  const { record } = reading
  reading.ignore(DIMENSION)
  if (reading.sheet !== reading.root || reading.space !== 0 || reading.dimensions.length >= MOST_DIMENSIONS) return
  const real = (code: number): number | null => {
    const g = record.find(code)
    const value = g < 0 ? Number.NaN : record.number(g)
    return Number.isNaN(value) ? null : value
  }
  const text = (code: number): string => {
    const g = record.find(code)
    return g < 0 ? '' : rawText(record.cursor.bytes, record.from[g], record.to[g])
  }
  const points: RawDimension['points'] = {}
  for (const code of POINTS) {
    const [x, y] = [real(code), real(code + 10)]
    if (x !== null && y !== null) points[code] = { x, y }
  }
  const type = real(70) ?? 0
  reading.dimensions.push({
    type: type & 7,
    ordinateX: (type & 64) !== 0,
    stored: real(42),
    text: text(1),
    style: text(3),
    layer: reading.layer,
    angle: real(50) ?? 0,
    points,
    overrides: readOverrides(reading),
  })
}

/** Style overrides stand in the extended data: after "DSTYLE", pairs of a variable's code (1070) and its value. */
function readOverrides({ record }: Reading): Partial<DimensionStyle> {
  const { bytes } = record.cursor
  const overrides: Partial<DimensionStyle> = {}
  let inside = false
  for (let g = record.count; g + 1 < record.all; g++) {
    if (record.code[g] === 1000) inside = rawText(bytes, record.from[g], record.to[g]) === 'DSTYLE'
    if (!inside || record.code[g] !== 1070) continue
    const variable = record.number(g)
    const value = record.number(g + 1)
    g++
    if (Number.isNaN(value)) continue
    if (variable === 71 || variable === 72) overrides.tolerances = overrides.tolerances || value === 1
    else if (variable === 47) overrides.plus = value
    else if (variable === 48) overrides.minus = value
    else if (variable === 144) overrides.factor = value
  }
  return overrides
}
