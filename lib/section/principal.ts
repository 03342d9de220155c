import type { Moments } from './moments'

/**
 * Angle of axis 1 (the greater second moment) from +u, counter-clockwise, degrees in [−90, 90]:
 * ½·atan2(−2Iuv, Iu − Iv), where Iu = ∫v² dA is the moment about u. Source: any text on strength of materials.
 */
export function principalAngle({ uu, vv, uv }: Pick<Moments, 'uu' | 'vv' | 'uv'>): number {
  return (90 / Math.PI) * Math.atan2(0 - 2 * uv, vv - uu)
}

/**
 * The angle in (−90, 90] by the convention of the engine: what lies within its own uncertainty of −90° is shown as +90°,
 * so that an upright and a hair's breadth less do not flip the axes.
 */
export function inHalfTurn(theta: number, uncertainty: number): number {
  return theta <= -90 + uncertainty ? Math.min(90, theta + 180) : Math.min(90, theta)
}
