import type { Figure } from './figure'

/** A = ∫dA: Green's theorem along the exact edges. A boundary that moves out by δ adds δ × its length. */
export const area: Figure = {
  key: 'area',
  group: 'size',
  symbol: { en: { base: 'A' }, us: { base: 'A' } },
  word: 'area',
  dimension: 'area',
  origin: 'exact',
  shows: 'region',
  value: (section) => section.area,
  spread: (section, change) => change.area + change.relative * section.area,
}
