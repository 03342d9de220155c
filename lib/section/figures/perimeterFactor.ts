import type { Figure } from './figure'

/** Perimeter factor: outer perimeter over mass per metre, mm per kg/m; how hard a shape is to press (common practice, no source). */
export const perimeterFactor: Figure = {
  key: 'perimeterFactor',
  group: 'size',
  symbol: { en: { base: 'U', sub: 'm' }, us: { base: 'P', sub: 'w' } },
  word: 'perimeter factor (outer)',
  dimension: 'perimeterFactor',
  origin: 'exact',
  iteratedOn: ['ellipse', 'bezier'],
  shows: 'outer',
  value: ({ mass, perimeter }) => (mass ? perimeter.outer / mass : undefined),
  spread: ({ area, mass, perimeter }, change) =>
    mass ? (perimeter.outer / mass) * (change.length / perimeter.outer + change.area / area + 2 * change.relative) : 0,
}
