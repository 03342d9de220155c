import type { Figure } from './figure'

/**
 * Lengths of the outer loops and of the holes. Lines and circular arcs in closed form; elliptical arcs and splines have none and
 * are iterated (10-point Gauss, halved until nothing changes).
 */
export const perimeterOuter: Figure = {
  key: 'perimeter.outer',
  group: 'size',
  symbol: { en: { base: 'U' }, us: { base: 'P' } },
  word: 'perimeter, outer',
  dimension: 'length',
  origin: 'exact',
  iteratedOn: ['ellipse', 'bezier'],
  shows: 'outer',
  value: (section) => section.perimeter.outer,
  spread: (section, change) => change.length + change.relative * section.perimeter.outer,
}

export const perimeterInner: Figure = {
  ...perimeterOuter,
  key: 'perimeter.inner',
  symbol: { en: { base: 'U', sub: 'i' }, us: { base: 'P', sub: 'i' } },
  word: 'perimeter, inner',
  shows: 'inner',
  value: (section) => section.perimeter.inner,
  spread: (section, change) => (section.perimeter.inner > 0 ? change.length + change.relative * section.perimeter.inner : 0),
}
