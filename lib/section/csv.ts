import type { UnitSettings } from '../units/quantity'
import { toUnit, unitOf } from '../units/units'
import type { Figure } from './figures/figure'
import { FIGURES } from './figures/index'
import type { OriginKind, PlusMinus, Section } from './types'

export interface CsvOptions {
  separator?: ',' | ';'
  /** a byte order mark, for spreadsheets that need it to read UTF-8 */
  bom?: boolean
  units?: Pick<UnitSettings, 'lengthUnit'>
  /** lines for the head, such as profile and revision: name and text */
  about?: readonly (readonly [name: string, text: string])[]
}

export const AXES_DEFINITION =
  'x to the right and y up as drawn; Ix = ∫y² dA, Iy = ∫x² dA, Ixy = +∫xy dA about the centroid; ' +
  'theta in degrees counter-clockwise from +x to axis 1 (major); axis 2 = axis 1 turned +90°'

/** Text that a spreadsheet would take for a formula gets an apostrophe before it; numbers never come through here. */
const harmless = (text: string): string => (/^[=+\-@\t\r]/.test(text) ? `'${text}` : text)

/** One cell of text by RFC 4180. */
export function csvText(text: string, separator: ',' | ';' = ','): string {
  const safe = harmless(text)
  return /["\r\n]/.test(safe) || safe.includes(separator) ? `"${safe.replaceAll('"', '""')}"` : safe
}

/** One figure of a section, as CSV and JSON carry it: plain numbers, in the unit named. */
export interface FigureRecord {
  key: string
  symbol: string
  word: string
  value: number
  unit: string
  origin: OriginKind
  plusMinus: PlusMinus
}

function recordOf(figure: Figure, section: Section, units: Pick<UnitSettings, 'lengthUnit'>): FigureRecord[] {
  const value = figure.value(section)
  if (value === null || value === undefined) return []
  const { base, sub } = figure.symbol.en
  const { kind, plusMinus = {} } = section.origin[figure.key] ?? { kind: figure.origin }
  const shown = (stored: number) => toUnit(stored, figure.dimension, units.lengthUnit) + 0
  const bounds = Object.entries(plusMinus).map(([cause, bound]) => [cause, shown(bound)])
  return [
    {
      key: figure.key,
      symbol: sub === undefined ? base : `${base}_${sub}`,
      word: figure.word,
      value: shown(value),
      unit: unitOf(figure.dimension, units.lengthUnit).ascii,
      origin: kind,
      plusMinus: Object.fromEntries(bounds),
    },
  ]
}

/** Every figure that has a value, in the order of the table of figures; always x–y, with the definition of the axes. */
export function figuresJson(
  section: Section,
  units: Pick<UnitSettings, 'lengthUnit'> = { lengthUnit: 'mm' },
): { axes: string; figures: FigureRecord[] } {
  return { axes: AXES_DEFINITION, figures: FIGURES.flatMap((figure) => recordOf(figure, section, units)) }
}

/**
 * The figures as CSV (RFC 4180, CRLF): lines about the section and its axes, a heading, one line a figure. Numbers are plain ASCII
 * with a point, shortest round trip.
 */
export function figuresCsv(section: Section, options: CsvOptions = {}): string {
  const { separator = ',', bom = false, units = { lengthUnit: 'mm' }, about = [] } = options
  const { axes, figures } = figuresJson(section, units)
  const row = (cells: readonly (string | number)[]): string =>
    cells.map((cell) => (typeof cell === 'number' ? String(cell) : csvText(cell, separator))).join(separator)
  const lines = [
    ...about.map(row),
    row(['axes', axes]),
    row(['figure', 'symbol', 'value', 'unit', 'origin', '± digits', '± repairs', '± numerics', 'word']),
    ...figures.map(({ key, symbol, value, unit, origin, plusMinus, word }) =>
      row([key, symbol, value, unit, origin, plusMinus.digits ?? '', plusMinus.repairs ?? '', plusMinus.numerics ?? '', word]),
    ),
  ]
  return `${bom ? '\ufeff' : ''}${lines.join('\r\n')}\r\n`
}
