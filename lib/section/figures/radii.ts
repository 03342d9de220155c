import type { Figure, FigureGroup, Shows } from './figure'
import { type BendingAxis, momentAbout, momentSpread } from './spread'

function radius(
  key: 'rx' | 'ry' | 'r1' | 'r2',
  axis: BendingAxis,
  sub: string,
  name: string,
  group: FigureGroup,
  shows: Shows,
): Figure {
  return {
    key,
    group,
    symbol: { en: { base: 'i', sub }, us: { base: 'r', sub } },
    word: `radius of gyration about ${name}`,
    dimension: 'length',
    origin: 'exact',
    shows,
    value: (section) => section[key],
    spread: (section, change) =>
      0.5 *
      section[key] *
      (momentSpread(section, change, axis) / momentAbout(section, axis) + change.area / section.area + change.relative),
  }
}

/** Radii of gyration r = √(I / A). */
export const rx = radius('rx', 'x', 'x', 'x', 'bending', 'axisX')
export const ry = radius('ry', 'y', 'y', 'y', 'bending', 'axisY')
export const r1 = radius('r1', 'axis1', '1', 'axis 1', 'principal', 'axis1')
export const r2 = radius('r2', 'axis2', '2', 'axis 2', 'principal', 'axis2')
