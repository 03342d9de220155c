import type { Piece } from './beam'
import { derivative, rootsIn, valueAt } from './polynomial'

export type Quantity = 'deflection' | 'slope' | 'moment' | 'shear'
export interface Extreme {
  at: number
  value: number
}
export interface Extremes {
  least: Extreme
  greatest: Extreme
}

/** Least and greatest value over the member and where, exact: ends of pieces and roots of the derivative. */
export function extremes(pieces: readonly Piece[], quantity: Quantity, plane: 'x' | 'y'): Extremes {
  let least: Extreme = { at: pieces[0].from, value: Number.POSITIVE_INFINITY }
  let greatest: Extreme = { at: pieces[0].from, value: Number.NEGATIVE_INFINITY }
  for (const piece of pieces) {
    const polynomial = piece[quantity][plane]
    const length = piece.to - piece.from
    for (const s of [0, ...rootsIn(derivative(polynomial), 0, length), length]) {
      const value = valueAt(polynomial, s)
      if (value < least.value) least = { at: piece.from + s, value }
      if (value > greatest.value) greatest = { at: piece.from + s, value }
    }
  }
  return { least, greatest }
}

/** Value at z mm from the left end; at a jump the side is chosen. */
export function quantityAt(
  pieces: readonly Piece[],
  quantity: Quantity,
  plane: 'x' | 'y',
  z: number,
  side: 'left' | 'right' = 'right',
): number {
  const inside = pieces.filter(({ from, to }) => z >= from && z <= to)
  const piece = side === 'left' ? inside[0] : inside[inside.length - 1]
  return piece ? valueAt(piece[quantity][plane], z - piece.from) : Number.NaN
}
