import type { BendingAxis } from './figures/spread'
import { type Frame, frameAt } from './frame'

/**
 * Frame of bending about an axis through (x, y): v runs the way in which offsets from that axis are counted: for x along +y, for y
 * along +x, for axis 1 along axis 2, for axis 2 along axis 1. `theta` in degrees; 0 where every axis is principal.
 */
export function bendingFrame({ x, y }: { x: number; y: number }, theta: number | null, axis: BendingAxis): Frame {
  return frameAt(x, y, { x: 0, y: -90, axis1: theta ?? 0, axis2: (theta ?? 0) - 90 }[axis])
}
