import { above } from './above'
import { bendingFrame } from './bendingFrame'
import type { Bundles } from './bundles'
import { extremesOf } from './extremes'
import type { BendingAxis } from './figures/spread'

/** A band of metal parallel to an axis: signed distances from it (mm), its part of the second moment (0 … 1) and its area (mm²). */
export interface ShareBand {
  from: number
  to: number
  share: number
  area: number
}

/**
 * Which metal makes the second moment about x, y, 1 or 2: `bands` equal bands from the extreme fibre on the negative side to that
 * on the positive side. Exact: ∫v² dA above each limit, by clipping the edges; shares sum to 1, areas to A.
 */
export function shareOf(bundles: Bundles, theta: number | null, axis: BendingAxis, bands: number): ShareBand[] {
  const frame = bendingFrame(bundles, theta, axis)
  const { minV, maxV } = extremesOf(bundles, frame)
  const whole = above(bundles, frame, Number.NEGATIVE_INFINITY)
  const limits = Array.from({ length: bands + 1 }, (_, k) => minV + ((maxV - minV) * k) / bands)
  const sums = limits.map((c, k) => (k === 0 ? whole : k === bands ? null : above(bundles, frame, c)))
  return Array.from({ length: bands }, (_, k) => {
    const lower = sums[k]
    const upper = sums[k + 1]
    return {
      from: limits[k],
      to: limits[k + 1],
      share: ((lower?.vv ?? 0) - (upper?.vv ?? 0)) / whole.vv,
      area: (lower?.area ?? 0) - (upper?.area ?? 0),
    }
  })
}
