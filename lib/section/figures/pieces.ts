import type { Figure } from './figure'

/** Number of pieces that are not joined: components of the open metal (pieces that touch in a point are separate). */
export const pieces: Figure = {
  key: 'pieces',
  group: 'size',
  symbol: { en: { base: 'n' }, us: { base: 'n' } },
  word: 'pieces',
  dimension: 'count',
  origin: 'exact',
  shows: 'region',
  value: (section) => section.pieces,
}
