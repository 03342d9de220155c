import { type Bernstein, derivative, difference, product, rootsOf } from './bernstein'
import type { EdgeTable } from './edges'

/** Homogeneous coordinates of Bézier edge i: x·w, y·w, w in Bernstein form. */
export interface BezierXy {
  x: Bernstein
  y: Bernstein
  w: Bernstein
  rational: boolean
}

export function bezierXy(edges: EdgeTable, i: number): BezierXy {
  const s = edges.shapes
  const k = edges.shape[i]
  const x: number[] = []
  const y: number[] = []
  const w: number[] = []
  for (let j = 0; j <= s[k]; j++) {
    const weight = s[k + 4 + 3 * j]
    x.push(s[k + 2 + 3 * j] * weight)
    y.push(s[k + 3 + 3 * j] * weight)
    w.push(weight)
  }
  return { x, y, w, rational: s[k + 1] === 1 }
}

/** Numerator of the derivative of c / w, in Bernstein form: its roots are where the coordinate turns. */
export function turning(c: Bernstein, { w, rational }: BezierXy): Bernstein {
  if (!rational) return derivative(c)
  return difference(product(derivative(c), w), product(c, derivative(w)))
}

/** Parameters in (0, 1) where the coordinate has its extremes. */
export const turnsOf = (c: Bernstein, curve: BezierXy): number[] => rootsOf(turning(c, curve))
