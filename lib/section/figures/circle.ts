import type { Section } from '../types'
import type { Figure, FigureSymbol } from './figure'

function circleFigure(key: keyof Section['circle'], symbol: FigureSymbol, word: string): Figure {
  return {
    key: `circle.${key}`,
    group: 'size',
    symbol: { en: symbol, us: symbol },
    word,
    dimension: 'length',
    origin: 'iterated',
    shows: 'circle',
    value: (section) => section.circle[key],
    spread: (section, change, response) =>
      (key === 'radius' ? 1 : response.circle) * (change.point + change.relative * section.circle.radius),
  }
}

/** Circumscribing circle: the smallest circle round the section (E. Welzl, Smallest enclosing disks, 1991, from memory). */
export const circle: Figure[] = [
  circleFigure('radius', { base: 'R', sub: 'c' }, 'circumscribing circle, radius'),
  circleFigure('x', { base: 'x', sub: 'R' }, 'circumscribing circle, centre x'),
  circleFigure('y', { base: 'y', sub: 'R' }, 'circumscribing circle, centre y'),
]
