import type { Figure } from './figure'

/** Mass per metre: Σ area × density of each material; 1 mm² of 1000 kg/m³ weighs 0.001 kg/m. */
export const mass: Figure = {
  key: 'mass',
  group: 'size',
  symbol: { en: { base: 'm' }, us: { base: 'w' } },
  word: 'mass per length',
  dimension: 'massPerLength',
  origin: 'exact',
  shows: 'region',
  value: (section) => section.mass,
  spread: (section, change) => (section.mass ?? 0) * (change.area / section.area + change.relative),
}
