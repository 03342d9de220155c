import type { UnitSettings } from '../units/quantity'
import { toUnit, unitOf } from '../units/units'
import type { Figure } from './figures/figure'
import { FIGURES } from './figures/index'
import type { OriginKind, PlusMinus, Section } from './types'

export const AXES_DEFINITION =
  'x to the right and y up as drawn; Ix = ∫y² dA, Iy = ∫x² dA, Ixy = +∫xy dA about the centroid; ' +
  'theta in degrees counter-clockwise from +x to axis 1 (major); axis 2 = axis 1 turned +90°'

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
