import type { Figure } from './figure'
import { centroidSpread } from './spread'

/** xc = ∫x dA / A and yc = ∫y dA / A, as placed. */
export const centroidX: Figure = {
  key: 'centroid.x',
  group: 'centroid',
  symbol: { en: { base: 'x', sub: 'c' }, us: { base: 'x', sub: 'c' } },
  word: 'centroid x, as placed',
  dimension: 'length',
  origin: 'exact',
  shows: 'centroid',
  value: (section) => section.centroid.x,
  spread: (section, change) => centroidSpread(section, change, 'y'),
}

export const centroidY: Figure = {
  ...centroidX,
  key: 'centroid.y',
  symbol: { en: { base: 'y', sub: 'c' }, us: { base: 'y', sub: 'c' } },
  word: 'centroid y, as placed',
  value: (section) => section.centroid.y,
  spread: (section, change) => centroidSpread(section, change, 'x'),
}
