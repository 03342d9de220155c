import type { AxisFigures } from '@/lib/section/axis'
import type { Quantity } from '@/lib/units/quantity'

export interface AxisRow {
  symbol: string
  sub: string
  word: string
  value: number
  quantity: Quantity
}

/** Figures about the person's axis a, and b across it through the same point. */
export function axisRows(figures: AxisFigures): AxisRow[] {
  const { iu, iv, iuv, iuCentroid, ru, rv, elastic, plastic } = figures
  const row = (symbol: string, sub: string, word: string, value: number | null, quantity: Quantity): AxisRow[] =>
    value === null ? [] : [{ symbol, sub, word, value, quantity }]
  return [
    ...row('I', 'a', 'about the axis', iu, 'secondMoment'),
    ...row('I', 'a,c', 'about its parallel through the centroid', iuCentroid, 'secondMoment'),
    ...row('I', 'b', 'across it, through its point', iv, 'secondMoment'),
    ...row('I', 'ab', 'product', iuv, 'secondMoment'),
    ...row('r', 'a', 'radius of gyration', ru, 'length'),
    ...row('r', 'b', 'radius of gyration across', rv, 'length'),
    ...row('I/e', 'left', 'to the fibre on its left', elastic.left, 'modulus'),
    ...row('I/e', 'right', 'to the fibre on its right', elastic.right, 'modulus'),
    ...row('Z', 'a', 'plastic modulus of this direction', plastic.modulus, 'modulus'),
  ]
}
