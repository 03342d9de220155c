import type { EdgeTable } from '../geometry/edges'
import { type Frame, frameAt } from './frame'
import { momentsOf } from './moments'
import type { Causes } from './origins'

export interface Principal {
  i1: number
  i2: number
  /** degrees, in (−90, 90]; null where every axis is principal */
  theta: number | null
}

/** ½·atan2(−2Ixy, Ix − Iy) in degrees: from +x to the axis of the greater moment, counter-clockwise, in [−90, 90]. */
export function principalAngle(ix: number, iy: number, ixy: number): number {
  return (90 / Math.PI) * Math.atan2(0 - 2 * ixy, ix - iy)
}

/**
 * The angle in (−90, 90]: what lies within its numerical uncertainty of −90° is given as +90°, so that rounding does not turn an
 * upright section's axes by half a turn. The drawing's digits do not count here: the step to 90° would be larger than the angle's
 * promised accuracy.
 */
export function inHalfTurn(theta: number, uncertainty: number): number {
  return theta <= -90 + uncertainty ? Math.min(90, theta + 180) : Math.min(90, theta)
}

/** Anisotropy (I1 − I2)/(I1 + I2) up to which every axis counts as principal. */
const ROUND = 1e-9

/**
 * Principal second moments and axes. The angle from Ix, Iy, Ixy is a first guess; the moments are integrated again in the axes
 * turned by it and the rest of the angle taken from there: from Ix, Iy, Ixy alone the lesser moment of a thin turned strip would
 * keep few digits. Every axis is principal when (I1 − I2)/(I1 + I2) ≤ max(1e-9, 4 × what the drawing's digits can change).
 */
export function principalOf(
  edges: EdgeTable,
  { x, y }: Frame,
  { ix, iy, ixy }: { ix: number; iy: number; ixy: number },
  { digits, numerics }: Pick<Causes, 'digits' | 'numerics'>,
): Principal {
  const guess = principalAngle(ix, iy, ixy)
  const { area, u, v, uu, vv, uv } = momentsOf(edges, 0, edges.count, frameAt(x, y, guess))
  const major = vv - v ** 2 / area
  const minor = uu - u ** 2 / area
  const rest = uv - (u * v) / area
  const half = 0.5 * (major - minor)
  const lift = rest === 0 ? 0 : rest ** 2 / (Math.hypot(half, rest) + Math.abs(half))
  const i1 = Math.max(major, minor) + lift
  const i2 = Math.min(major, minor) - lift
  const ip = i1 + i2
  const fromDigits = digits ? (digits.xx + digits.yy) / ip : 0
  if ((i1 - i2) / ip <= Math.max(ROUND, 4 * fromDigits)) return { i1, i2, theta: null }
  const changed = numerics.xx + numerics.yy + 2 * numerics.relative * ip
  const theta = guess + principalAngle(major, minor, rest)
  return { i1, i2, theta: inHalfTurn(theta, (90 / Math.PI) * (changed / (i1 - i2))) }
}
