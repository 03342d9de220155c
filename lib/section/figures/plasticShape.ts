import type { Figure } from './figure'
import { elastic12, elasticXY } from './elastic'
import { plasticModulus } from './plastic'
import type { BendingAxis } from './spread'

/** Plastic shape factor: plastic modulus over the lesser elastic modulus of the same axis; 1.5 for a rectangle. */
export function plasticShape(axis: BendingAxis): Figure {
  const name = { x: 'x', y: 'y', axis1: 'axis 1', axis2: 'axis 2' }[axis]
  const sub = name.replace('axis ', '')
  const plastic = plasticModulus(axis)
  const elastic = [...elasticXY, ...elastic12].filter(({ key }) => key.startsWith(`elastic.${axis}`))
  return {
    key: `plasticShape.${axis}`,
    group: 'plastic',
    symbol: { en: { base: 'α', sub: `pl,${sub}` }, us: { base: 'k', sub } },
    word: `plastic shape factor about ${name}`,
    dimension: 'ratio',
    origin: 'iterated',
    shows: plastic.shows,
    value: (section) => section.plasticShape[axis],
    spread: (section, change, response) => {
      const relative = ({ value, spread }: Figure) => (spread?.(section, change, response) ?? 0) / (value(section) || 1)
      return (section.plasticShape[axis] ?? 0) * (relative(plastic) + Math.max(...elastic.map(relative)))
    },
  }
}
