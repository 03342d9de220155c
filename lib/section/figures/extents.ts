import type { Section } from '../types'
import type { Figure, FigureSymbol } from './figure'

function extent(key: keyof Section['extents'], base: string, sub: string, word: string): Figure {
  const symbol: FigureSymbol = { base, sub }
  return {
    key: `extents.${key}`,
    group: 'size',
    symbol: { en: symbol, us: symbol },
    word,
    dimension: 'length',
    origin: 'exact',
    iteratedOn: ['bezier'],
    shows: 'extents',
    value: (section) => section.extents[key],
    spread: (section, change) => change.point + change.relative * section.circle.radius,
  }
}

/** Extents as placed: ends of edges and turning points of every curve; on splines these are roots found by iteration. */
export const extents: Figure[] = [
  extent('minX', 'x', 'min', 'least x, as placed'),
  extent('maxX', 'x', 'max', 'greatest x, as placed'),
  extent('minY', 'y', 'min', 'least y, as placed'),
  extent('maxY', 'y', 'max', 'greatest y, as placed'),
]
