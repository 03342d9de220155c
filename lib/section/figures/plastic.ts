import type { Figure, Shows } from './figure'
import { type BendingAxis, centroidSpread, firstSpread, thetaSpread } from './spread'

const NAMES: Record<BendingAxis, string> = { x: 'x', y: 'y', axis1: 'axis 1', axis2: 'axis 2' }
const SHOWS: Record<BendingAxis, Shows> = { x: 'plasticX', y: 'plasticY', axis1: 'plastic1', axis2: 'plastic2' }
const ACROSS: Record<BendingAxis, BendingAxis> = { x: 'y', y: 'x', axis1: 'axis2', axis2: 'axis1' }

/**
 * Plastic modulus ∫|d| dA about the line parallel to the axis that halves the area. Bending about that line only: on an
 * unsymmetric section a moment about the other axis comes with it (see freePlastic).
 */
export function plasticModulus(axis: BendingAxis): Figure {
  const sub = NAMES[axis].replace('axis ', '')
  return {
    key: `plastic.${axis}`,
    group: 'plastic',
    symbol: { en: { base: 'W', sub: `pl,${sub}` }, us: { base: 'Z', sub } },
    word: `plastic modulus about ${NAMES[axis]}`,
    dimension: 'modulus',
    origin: 'iterated',
    shows: SHOWS[axis],
    value: (section) => section.plastic[axis],
    spread: (section, change) => {
      const { plastic } = section
      const turned = axis === 'x' || axis === 'y' ? 0 : (thetaSpread(section, change) * Math.PI) / 180
      const value = plastic[axis] ?? 0
      return (
        firstSpread(section, change, axis, plastic.at[axis] ?? 0) +
        turned * (plastic[ACROSS[axis]] ?? 0) +
        change.relative * value
      )
    },
  }
}

/** Offset of the plastic neutral axis from the centroid: for x along +y, y along +x, axis 1 along axis 2, axis 2 along axis 1. */
export function plasticOffset(axis: BendingAxis): Figure {
  const sub = NAMES[axis].replace('axis ', '')
  return {
    key: `plastic.at.${axis}`,
    group: 'plastic',
    symbol: { en: { base: 'e', sub: `pl,${sub}` }, us: { base: 'e', sub: `p,${sub}` } },
    word: `plastic neutral axis parallel to ${NAMES[axis]}, from the centroid`,
    dimension: 'length',
    origin: 'iterated',
    shows: SHOWS[axis],
    value: (section) => section.plastic.at[axis],
    spread: (section, change, { widths }) => {
      const halving = widths[axis] > 0 ? change.area / (2 * widths[axis]) : change.point
      const turned = axis === 'x' || axis === 'y' ? 0 : (thetaSpread(section, change) * Math.PI) / 180
      return halving + centroidSpread(section, change, axis) + (turned + change.relative) * section.circle.radius
    },
  }
}
