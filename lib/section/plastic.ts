import { above, halfAreaHeight } from './above'
import type { Bundles } from './bundles'
import type { Extremes } from './extremes'
import type { Frame } from './frame'

/** Bending to the full plastic moment with the neutral axis v = c of a frame. */
export interface PlasticBending {
  /** ∫|v − c| dA, mm³ */
  modulus: number
  /** offset c of the neutral axis along v from the frame's origin */
  offset: number
  /** ∫sign(v − c)·u dA, mm³: the moment about the other axis that comes with it */
  across: number
  /** width of metal along the neutral axis, mm; 0 in a gap */
  width: number
}

/**
 * Plastic modulus about an axis parallel to u: the neutral axis halves the area (equal forces of one yield stress), the modulus is
 * the sum of both halves' first moments about it. Source: Timoshenko, Strength of Materials II (from memory).
 */
export function plasticBending(bundles: Bundles, frame: Frame, { minV, maxV }: Extremes): PlasticBending {
  const c = halfAreaHeight(bundles, frame, minV, maxV)
  const { area, u, v } = wholeIn(bundles, frame)
  const top = above(bundles, frame, c)
  return {
    modulus: 2 * (top.v - c * top.area) + c * area - v,
    offset: c,
    across: 2 * top.u - u,
    width: top.width,
  }
}

/** Area and first moments of all metal in the frame. */
function wholeIn({ x, y, moments }: Bundles, frame: Frame): { area: number; u: number; v: number } {
  const { area } = moments
  const dx = moments.u + (x - frame.x) * area
  const dy = moments.v + (y - frame.y) * area
  return { area, u: dx * frame.cos + dy * frame.sin, v: dy * frame.cos - dx * frame.sin }
}
