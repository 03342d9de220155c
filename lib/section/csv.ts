import type { UnitSettings } from '../units/quantity'
import { figuresJson } from './figuresJson'
import type { Section } from './types'

export interface CsvOptions {
  separator?: ',' | ';'
  /** a byte order mark, for spreadsheets that need it to read UTF-8 */
  bom?: boolean
  units?: Pick<UnitSettings, 'lengthUnit'>
  /** lines for the head, such as profile and revision: name and text */
  about?: readonly (readonly [name: string, text: string])[]
}

/** Text that a spreadsheet would take for a formula gets an apostrophe before it; numbers never come through here. */
const harmless = (text: string): string => (/^[=+\-@\t\r]/.test(text) ? `'${text}` : text)

/** One cell of text by RFC 4180. */
export function csvText(text: string, separator: ',' | ';' = ','): string {
  const safe = harmless(text)
  return /["\r\n]/.test(safe) || safe.includes(separator) ? `"${safe.replaceAll('"', '""')}"` : safe
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
