import { above } from '@/lib/section/above'
import { bendingFrame } from '@/lib/section/bendingFrame'
import type { Bundles } from '@/lib/section/bundles'
import { extremesOf } from '@/lib/section/extremes'
import type { BendingAxis } from '@/lib/section/figures/spread'

/** What lies farther from an axis than `distance` (mm), on both sides: its part of the second moment and of the area, 0 … 1. */
export interface Beyond {
  distance: number
  share: number
  metal: number
}

export interface ShareSummary {
  /** the farthest metal that makes half of the second moment */
  half: Beyond
  /** the part of the second moment that the nearer half of the metal makes */
  nearHalf: number
}

/** Halvings of the distance: to about 1e-9 of the section's size. */
const STEPS = 30

/** Where half of the second moment about an axis comes from, and what the half of the metal nearest to it gives. */
export function shareSummary(bundles: Bundles, theta: number | null, axis: BendingAxis): ShareSummary {
  const frame = bendingFrame(bundles, theta, axis)
  const { minV, maxV } = extremesOf(bundles, frame)
  const whole = above(bundles, frame, Number.NEGATIVE_INFINITY)
  const beyond = (distance: number): Beyond => {
    const upper = above(bundles, frame, distance)
    const rest = above(bundles, frame, -distance)
    return {
      distance,
      share: (upper.vv + whole.vv - rest.vv) / whole.vv,
      metal: (upper.area + whole.area - rest.area) / whole.area,
    }
  }
  const halving = (part: (found: Beyond) => number): Beyond => {
    let low = 0
    let high = Math.max(maxV, -minV)
    for (let step = 0; step < STEPS; step++) {
      const middle = (low + high) / 2
      if (part(beyond(middle)) > 0.5) low = middle
      else high = middle
    }
    return beyond(low)
  }
  return { half: halving(({ share }) => share), nearHalf: 1 - halving(({ metal }) => metal).share }
}
