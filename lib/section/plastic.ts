import type { EdgeTable } from '../geometry/edges'
import type { Extremes } from './extremes'
import type { Frame } from './frame'
import { above, halfAreaLine, sliceOf } from './slice'

/** Bending to the full plastic moment with the neutral axis v = c of a frame at the centroid. */
export interface PlasticBending {
  /** ∫|v − c| dA, mm³ */
  modulus: number
  /** offset c of the neutral axis along v */
  offset: number
  /** ∫sign(v − c)·u dA, mm³: the moment about the other axis that comes with it */
  across: number
  /** width of metal along the neutral axis, mm; 0 in a gap */
  width: number
}

/**
 * Plastic modulus about the axis through the frame: the neutral axis halves the area (equal forces of one yield stress), the
 * modulus is the sum of both halves' first moments about it. Source: any text on plastic design.
 */
export function plasticBending(edges: EdgeTable, frame: Frame, { minV, maxV }: Extremes): PlasticBending {
  const slice = sliceOf(edges, frame)
  const { c, width } = halfAreaLine(slice, minV, maxV)
  const all = above(slice, Number.NEGATIVE_INFINITY)
  const top = above(slice, c)
  return {
    modulus: 2 * (top.v - c * top.area) + c * all.area - all.v,
    offset: c,
    across: 2 * top.u - all.u,
    width,
  }
}
