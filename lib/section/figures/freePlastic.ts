import type { Change } from '../change'
import type { Section } from '../types'
import type { Figure, FigureSymbol, Shows } from './figure'

type Key = keyof Section['freePlastic']

const along = (angle: number): number => Math.abs(Math.tan((angle * Math.PI) / 180))

function firstMoments({ x, y, area, xx, yy }: Change): { x: number; y: number } {
  return { x: Math.max(x, Math.sqrt(area * xx)), y: Math.max(y, Math.sqrt(area * yy)) }
}

function spreadOf(key: Key, section: Section, change: Change): number {
  const { freePlastic } = section
  const first = firstMoments(change)
  const floor = change.relative * (section.plastic.x + section.plastic.y)
  switch (key) {
    case 'x':
      return first.y + Math.min(1e3, along(freePlastic.angleX)) * first.x + floor
    case 'y':
      return first.x + Math.min(1e3, along(90 - freePlastic.angleY)) * first.y + floor
    case 'restrainedMyForX':
      return first.x + change.area * section.circle.radius + floor
    case 'restrainedMxForY':
      return first.y + change.area * section.circle.radius + floor
    default:
      return (180 / Math.PI) * ((first.x + first.y + floor) / Math.min(section.plastic.x, section.plastic.y))
  }
}

function figure(
  key: Key,
  dimension: 'modulus' | 'angle',
  en: FigureSymbol,
  us: FigureSymbol,
  word: string,
  shows: Shows,
): Figure {
  return {
    key: `freePlastic.${key}`,
    group: 'plastic',
    symbol: { en, us },
    word,
    dimension,
    origin: 'iterated',
    shows,
    value: (section) => section.freePlastic[key],
    spread: (section, change) => spreadOf(key, section, change),
  }
}

/**
 * Plastic bending by one moment alone: the neutral axis turns until the other moment is nil. The modulus that comes with the
 * axis held parallel to x (y) is ∫sign·x dA (∫sign·y dA), metal above (to the right of) the neutral axis positive.
 */
export const freePlastic: Figure[] = [
  figure(
    'x',
    'modulus',
    { base: 'W', sub: 'pl,x,free' },
    { base: 'Z', sub: 'x,free' },
    'free plastic modulus, moment about x alone',
    'freePlasticX',
  ),
  figure(
    'y',
    'modulus',
    { base: 'W', sub: 'pl,y,free' },
    { base: 'Z', sub: 'y,free' },
    'free plastic modulus, moment about y alone',
    'freePlasticY',
  ),
  figure(
    'angleX',
    'angle',
    { base: 'β', sub: 'x' },
    { base: 'β', sub: 'x' },
    'neutral axis of free plastic bending about x',
    'freePlasticX',
  ),
  figure(
    'angleY',
    'angle',
    { base: 'β', sub: 'y' },
    { base: 'β', sub: 'y' },
    'neutral axis of free plastic bending about y',
    'freePlasticY',
  ),
  figure(
    'restrainedMyForX',
    'modulus',
    { base: 'W', sub: 'pl,x→y' },
    { base: 'Z', sub: 'x→y' },
    'modulus about y that comes with the plastic modulus about x',
    'plasticX',
  ),
  figure(
    'restrainedMxForY',
    'modulus',
    { base: 'W', sub: 'pl,y→x' },
    { base: 'Z', sub: 'y→x' },
    'modulus about x that comes with the plastic modulus about y',
    'plasticY',
  ),
]
