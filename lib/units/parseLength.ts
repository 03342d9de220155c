import { type ParsedNumber, parseNumber } from './parseNumber'

export type LengthUnit = 'mm' | 'cm' | 'm' | 'in' | 'ft'

/** mm in one of each; exact by definition. */
export const MM_IN: Record<LengthUnit, number> = { mm: 1, cm: 10, m: 1000, in: 25.4, ft: 304.8 }

const UNIT = /^(.*?)\s*(mm|cm|m|inches|inch|in|feet|foot|ft|"|″|''|'|′)\.?$/i
const FEET_AND_INCHES = /^(.+?)\s*(?:feet|foot|ft|'|′)\.?\s*(\d.*?)\s*(?:inches|inch|in|"|″|'')?\.?$/i
const FRACTION = /^([+-]?)(?:(\d+)[\s-]+)?(\d+)\s*\/\s*(\d+)$/

function unitNamed(name: string): LengthUnit {
  const lower = name.toLowerCase()
  if (lower === 'mm' || lower === 'cm' || lower === 'm') return lower
  return lower === '"' || lower === '″' || lower === "''" || lower.startsWith('in') ? 'in' : 'ft'
}

/** A number, or a fraction as inch rules have it: "4 1/2", "4-1/2", "3/8". */
function parseAmount(text: string): ParsedNumber {
  const match = FRACTION.exec(text.trim().replace('\u2212', '-'))
  if (!match) return parseNumber(text)
  const [, sign, whole = '0', over, under] = match
  if (Number(under) === 0) return { ok: false, message: `“${text.trim()}” divides by nothing.` }
  const value = Number(whole) + Number(over) / Number(under)
  return { ok: true, value: sign === '-' ? -value : value }
}

function times(amount: ParsedNumber, size: number): ParsedNumber {
  return amount.ok ? { ...amount, value: amount.value * size } : amount
}

/**
 * A length in mm from what a person typed: a number with or without a unit ("12,5", "12.5 mm", "4 1/2 in", "3/8\"", "2 ft 3 in",
 * "5' 6\""); without one `assumed` counts. Echoes and refusals as `parseNumber`.
 */
export function parseLength(text: string, assumed: LengthUnit): ParsedNumber {
  const typed = text.trim()
  const both = FEET_AND_INCHES.exec(typed)
  if (both) {
    const feet = parseAmount(both[1])
    const inches = parseAmount(both[2])
    if (!feet.ok) return feet
    if (!inches.ok) return inches
    const sign = feet.value < 0 ? -1 : 1
    return { ok: true, value: feet.value * MM_IN.ft + sign * inches.value * MM_IN.in }
  }
  const named = UNIT.exec(typed)
  return named ? times(parseAmount(named[1]), MM_IN[unitNamed(named[2])]) : times(parseAmount(typed), MM_IN[assumed])
}
