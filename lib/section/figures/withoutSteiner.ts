import type { Section } from '../types'
import type { Figure, Shows } from './figure'
import { ix, ixy, iy } from './secondMoments'

function ownMoment(key: 'ix' | 'iy' | 'ixy', joined: Figure, sub: string, shows: Shows): Figure {
  return {
    ...joined,
    key: `withoutSteiner.${key}`,
    symbol: { en: { base: 'I', sub: `${sub},0` }, us: { base: 'I', sub: `${sub},0` } },
    word: `${joined.word}, pieces not joined`,
    shows,
    value: (section: Section) => section.withoutSteiner?.[key],
  }
}

/** Sums of the pieces' own second moments about their own centroids, without Steiner terms: pieces that do not act as one. */
export const withoutSteiner: Figure[] = [
  ownMoment('ix', ix, 'x', 'axisX'),
  ownMoment('iy', iy, 'y', 'axisY'),
  ownMoment('ixy', ixy, 'xy', 'axesXY'),
]
