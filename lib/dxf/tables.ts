import type { Reading } from './reading'
import { rawText } from './text'

export interface LayerRecord {
  off: boolean
  frozen: boolean
  plots: boolean
  lineType: number
}
export interface DimensionStyle {
  tolerances: boolean
  plus: number
  minus: number
  factor: number
}

/** What HEADER, TABLES and OBJECTS say, names as bytes. */
export interface FileFacts {
  version: string
  codePage: string
  unit: string | null
  measurement: string
  /** by number of the layer's name */
  layers: Map<number, LayerRecord>
  dimensionStyles: Map<string, DimensionStyle>
  /** name of the block record by handle */
  blockRecords: Map<string, string>
  /** layout names by the block record's name in upper case */
  layouts: Map<string, string>
}

export const noFacts = (): FileFacts => ({
  version: '',
  codePage: '',
  unit: null,
  measurement: '',
  layers: new Map(),
  dimensionStyles: new Map(),
  blockRecords: new Map(),
  layouts: new Map(),
})

/** HEADER: its variables stand in the groups of the SECTION record itself, name (9) before value. */
export function readHeader({ record }: Reading, facts: FileFacts): void {
  const { bytes } = record.cursor
  const value = (g: number) => (g < record.all ? rawText(bytes, record.from[g], record.to[g]) : '')
  for (let g = 0; g < record.all; g++) {
    if (record.code[g] !== 9) continue
    switch (value(g)) {
      case '$ACADVER':
        facts.version = value(g + 1)
        break
      case '$DWGCODEPAGE':
        facts.codePage = value(g + 1)
        break
      case '$INSUNITS':
        facts.unit = value(g + 1)
        break
      case '$MEASUREMENT':
        facts.measurement = value(g + 1)
        break
    }
  }
}

/** LAYER: state and line type. */
export function readLayer({ record, layers, lineTypes }: Reading, facts: FileFacts): void {
  const g = record.find(2)
  if (g < 0) return
  const integer = (code: number, otherwise: number) => {
    const at = record.find(code)
    const value = at < 0 ? otherwise : record.number(at)
    return Number.isNaN(value) ? otherwise : value
  }
  const lineType = record.find(6)
  facts.layers.set(layers.idOf(record.from[g], record.to[g]), {
    off: integer(62, 7) < 0,
    frozen: (integer(70, 0) & 1) === 1,
    plots: integer(290, 1) !== 0,
    lineType: lineType < 0 ? lineTypes.add('CONTINUOUS') : lineTypes.idOf(record.from[lineType], record.to[lineType]),
  })
}

const textOf = ({ record }: Reading, code: number, start = 0): string => {
  const g = record.find(code, start)
  return g < 0 ? '' : rawText(record.cursor.bytes, record.from[g], record.to[g])
}

/** BLOCK_RECORD: which block a handle stands for. */
export function readBlockRecord(reading: Reading, facts: FileFacts): void {
  facts.blockRecords.set(textOf(reading, 5).toUpperCase(), textOf(reading, 2))
}

/** LAYOUT: the name a person sees on the tab, for the block that holds what is drawn there. */
export function readLayout(reading: Reading, facts: FileFacts): void {
  const { record } = reading
  let start = 0
  for (let g = 0; g < record.count; g++) {
    if (record.code[g] === 100 && rawText(record.cursor.bytes, record.from[g], record.to[g]) === 'AcDbLayout') start = g
  }
  const block = facts.blockRecords.get(textOf(reading, 330, start).toUpperCase())
  const name = textOf(reading, 1, start)
  if (block !== undefined && name !== '') facts.layouts.set(block.toUpperCase(), name)
}

/** DIMSTYLE: tolerances and the factor of linear dimensions. */
export function readDimensionStyle(reading: Reading, facts: FileFacts): void {
  const { record } = reading
  const real = (code: number, otherwise: number) => {
    const g = record.find(code)
    const value = g < 0 ? otherwise : record.number(g)
    return Number.isNaN(value) ? otherwise : value
  }
  facts.dimensionStyles.set(textOf(reading, 2).toUpperCase(), {
    tolerances: real(71, 0) === 1 || real(72, 0) === 1,
    plus: real(47, 0),
    minus: real(48, 0),
    factor: real(144, 1),
  })
}
