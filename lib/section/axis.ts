import type { Bundles } from './bundles'
import { extremesOf } from './extremes'
import { frameAt } from './frame'
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
 * Second moments, product, radii and moduli about any axis. From the centroidal moments by turning and Steiner's term (parallel
 * axes), which is exact where the axis lies in or near the metal.
 */
export function aboutAxis(bundles: Bundles, { x, y, angle }: UserAxis): AxisFigures {
  const frame = frameAt(x, y, angle)
  const { cos, sin } = frame
  const { area, uu, vv, uv } = bundles.moments
  const dx = bundles.x - x
  const dy = bundles.y - y
  const u = dx * cos + dy * sin
  const v = dy * cos - dx * sin
  const iuCentroid = vv * cos * cos + uu * sin * sin - 2 * uv * sin * cos
  const ivCentroid = uu * cos * cos + vv * sin * sin + 2 * uv * sin * cos
  const iu = iuCentroid + area * v * v
  const iv = ivCentroid + area * u * u
  const extremes = extremesOf(bundles, frame)
  const { modulus, offset } = plasticBending(bundles, frame, extremes)
  return {
    iu,
    iv,
    iuv: uv * (cos * cos - sin * sin) + (vv - uu) * sin * cos + area * u * v,
    iuCentroid,
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
