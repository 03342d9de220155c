import type { Bundles } from './bundles'
import { extremesOf } from './extremes'
import { frameAt } from './frame'
import { momentsOf } from './moments'
import { plasticBending } from './plastic'

/** An axis that a person places and turns: a point, and degrees counter-clockwise from +x. */
export interface UserAxis {
  x: number
  y: number
  angle: number
}

/** Figures about a user's axis u; v is u turned +90° about the same point. mm, mm³, mm⁴. */
export interface AxisFigures {
  /** ∫v² dA about the axis itself, with its Steiner term */
  iu: number
  /** ∫u² dA about the line across it through the same point */
  iv: number
  /** +∫uv dA */
  iuv: number
  /** ∫v² dA about the parallel axis through the centroid */
  iuCentroid: number
  ru: number
  rv: number
  /** where the centroid lies: along the axis and to its left */
  centroid: { u: number; v: number }
  /** Iu over the distance of the extreme fibre on each side of the axis; null on a side without metal */
  elastic: { left: number | null; right: number | null }
  /** plastic modulus for bending about this direction, and its neutral axis' offset to the left of the axis */
  plastic: { modulus: number; offset: number }
}

/**
 * Second moments, product, radii and moduli about any axis: integrated in axes through the centroid turned alike (so that a thin
 * turned strip keeps its digits), moved by Steiner's term (parallel axes).
 */
export function aboutAxis(bundles: Bundles, { x, y, angle }: UserAxis): AxisFigures {
  const frame = frameAt(x, y, angle)
  const { cos, sin } = frame
  const { edges } = bundles
  const { area, uu, vv, uv } = momentsOf(edges, 0, edges.count, frameAt(bundles.x, bundles.y, angle))
  const dx = bundles.x - x
  const dy = bundles.y - y
  const u = dx * cos + dy * sin
  const v = dy * cos - dx * sin
  const iu = vv + area * v * v
  const iv = uu + area * u * u
  const extremes = extremesOf(bundles, frame)
  const { modulus, offset } = plasticBending(bundles, frame, extremes)
  return {
    iu,
    iv,
    iuv: uv + area * u * v,
    iuCentroid: vv,
    ru: Math.sqrt(iu / area),
    rv: Math.sqrt(iv / area),
    centroid: { u, v },
    elastic: {
      left: extremes.maxV > 0 ? iu / extremes.maxV : null,
      right: extremes.minV < 0 ? iu / -extremes.minV : null,
    },
    plastic: { modulus, offset },
  }
}
