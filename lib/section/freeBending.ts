import type { Bundles } from './bundles'
import { type Extremes, extremesOf } from './extremes'
import { type Frame, frameAt } from './frame'
import { plasticBending } from './plastic'

/** Full plastic bending by one moment alone. */
export interface FreeBending {
  /** mm³; the plastic moment is this times the yield stress */
  modulus: number
  /** neutral axis, degrees counter-clockwise from +x, in (−90, 90] */
  angle: number
}

/** ∫sign·x dA and ∫sign·y dA with the neutral axis at `angle` degrees, metal to its left positive. */
type PlasticVector = (angle: number) => { x: number; y: number }

export function plasticVector(bundles: Bundles): PlasticVector {
  return (angle) => {
    const frame: Frame = frameAt(bundles.x, bundles.y, angle)
    const extremes: Extremes = extremesOf(bundles, frame)
    const { modulus, across } = plasticBending(bundles, frame, extremes)
    return { x: across * frame.cos - modulus * frame.sin, y: across * frame.sin + modulus * frame.cos }
  }
}

/**
 * Turns the neutral axis until the moment about the other axis is nil. As the axis turns, the plastic vector runs round a convex
 * curve whose normal is the axis' own, so the unwanted part changes sign once between ±90°; secant steps within the bracket.
 * `turn` is 0 for Mx alone and −90 for My alone; `guess` is the elastic neutral axis, from the same zero.
 */
export function freeBending(vectorAt: PlasticVector, turn: 0 | -90, guess: number): FreeBending {
  let low = -90
  let high = 90
  let angle = guess
  let before: [number, number] | null = null
  for (let step = 0; step < 60; step++) {
    const { x, y } = vectorAt(angle + turn)
    const [wanted, unwanted] = turn === 0 ? [y, -x] : [x, y]
    const off = unwanted / Math.hypot(x, y)
    const t = Math.tan((angle * Math.PI) / 180)
    if (Math.abs(off) < 1e-10 || high - low < 1e-11) {
      return { modulus: wanted + unwanted * t, angle: inHalf(angle + turn) }
    }
    if (off > 0) high = angle
    else low = angle
    const secant: number = before ? angle - (off * (angle - before[0])) / (off - before[1]) : angle - (off * 90) / Math.PI
    before = [angle, off]
    angle = secant > low && secant < high ? secant : 0.5 * (low + high)
  }
  const { x, y } = vectorAt(angle + turn)
  return { modulus: turn === 0 ? y : x, angle: inHalf(angle + turn) }
}

const inHalf = (angle: number): number => (angle <= -90 + 1e-9 ? Math.min(90, angle + 180) : angle)
