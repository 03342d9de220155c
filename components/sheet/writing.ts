import type { Writing } from '@/components/board/annotate'
import { format } from '@/lib/units/format'
import type { UnitPart } from '@/lib/units/quantity'
import type { TeamSettings } from '@/lib/api/schemas/people'
import { axisNames } from '@/lib/section/naming'

const SUPERSCRIPTS: Record<number, string> = { 2: '²', 3: '³' }

/** A unit as plain text, for places that cannot raise a power: lengths, angles and areas. */
export const unitWords = (parts: readonly UnitPart[]) =>
  parts.map(({ base, power }) => base + (power === 1 ? '' : (SUPERSCRIPTS[power] ?? power))).join('')

/** A drawing writes 50, not 50.000. */
const withoutZeros = (text: string) => (text.includes('.') ? text.replace(/\.?0+$/, '') : text)

/** How the board writes for these settings: axis names, lengths with their unit, angles. */
export function writingOf(display: TeamSettings): Writing {
  return {
    names: axisNames(display.axes),
    length: (mm) => {
      const { text, unit } = format(mm, 'length', display)
      return `${withoutZeros(text)} ${unitWords(unit)}`
    },
    angle: (degrees, plusMinus) => `${withoutZeros(format(degrees, 'angle', display, plusMinus).text)}°`,
  }
}
