import type { Section } from '../types'
import type { Figure, FigureGroup, Shows } from './figure'
import { type BendingAxis, centroidSpread, momentAbout, momentSpread, turnSpread } from './spread'

type Fibre = keyof Section['elastic']

function modulus(fibre: Fibre, axis: BendingAxis, name: string, side: string, group: FigureGroup, shows: Shows): Figure {
  const sub = name.replace('axis ', '')
  return {
    key: `elastic.${fibre}`,
    group,
    symbol: { en: { base: 'W', sub: `el,${sub}` }, us: { base: 'S', sub } },
    word: `elastic modulus about ${name}, ${side}`,
    dimension: 'modulus',
    origin: 'exact',
    iteratedOn: ['bezier'],
    shows,
    value: (section) => section.elastic[fibre],
    spread: (section, change) => {
      const value = section.elastic[fibre] ?? 0
      const moment = momentAbout(section, axis)
      const reach = moment / value
      const moved = change.point + centroidSpread(section, change, axis) + turnSpread(section, change, axis)
      return value * (momentSpread(section, change, axis) / moment + moved / reach)
    },
  }
}

/** Elastic moduli W = I / distance of the extreme fibre from the axis, to both sides; left and right looking along the axis. */
export const elasticXY: Figure[] = [
  modulus('xTop', 'x', 'x', 'top fibre', 'bending', 'fibreTop'),
  modulus('xBottom', 'x', 'x', 'bottom fibre', 'bending', 'fibreBottom'),
  modulus('yRight', 'y', 'y', 'right fibre', 'bending', 'fibreRight'),
  modulus('yLeft', 'y', 'y', 'left fibre', 'bending', 'fibreLeft'),
]

export const elastic12: Figure[] = [
  modulus('axis1Left', 'axis1', 'axis 1', 'left fibre', 'principal', 'fibre1Left'),
  modulus('axis1Right', 'axis1', 'axis 1', 'right fibre', 'principal', 'fibre1Right'),
  modulus('axis2Right', 'axis2', 'axis 2', 'right fibre', 'principal', 'fibre2Right'),
  modulus('axis2Left', 'axis2', 'axis 2', 'left fibre', 'principal', 'fibre2Left'),
]
