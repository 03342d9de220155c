import { survivingDigits } from './digits'
import type { Quantity, UnitPart, UnitSettings } from './quantity'
import { toUnit, unitOf } from './units'

export const THIN_SPACE = '\u2009'
export const MINUS = '\u2212'

export interface Formatted {
  /** for the screen: thin spaces, true minus */
  text: string
  unit: readonly UnitPart[]
}

/** Groups figures by threes from five before the decimal mark on, with a true minus: "−1 987 618.5", "1234.5". */
export function forScreen(decimal: string): string {
  const negative = decimal.startsWith('-')
  const [whole, fraction] = (negative ? decimal.slice(1) : decimal).split('.')
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE) : whole
  return (negative ? MINUS : '') + grouped + (fraction === undefined ? '' : `.${fraction}`)
}

/**
 * A stored value as a team reads it: in its unit, with its number of significant digits, but none that ± `plusMinus` (stored
 * unit) leaves meaningless. Counts are whole. The unit comes in parts, so that the screen can raise its powers.
 */
export function format(value: number, quantity: Quantity, settings: UnitSettings, plusMinus = 0): Formatted {
  const unit = unitOf(quantity, settings.lengthUnit)
  const shown = value / unit.size
  const decimal =
    quantity === 'count' ? String(Math.round(shown)) : survivingDigits(shown, settings.digits, plusMinus / unit.size)
  return { text: forScreen(decimal), unit: unit.parts }
}

/** For copies, CSV and JSON: plain ASCII, the shortest text that reads back to the same number, in the team's unit. */
export function plain(value: number, quantity: Quantity, settings: Pick<UnitSettings, 'lengthUnit'>): string {
  return String(toUnit(value, quantity, settings.lengthUnit) + 0)
}
