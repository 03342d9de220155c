import { aboutTurned, type Change } from '../change'
import type { Section } from '../types'

export type BendingAxis = 'x' | 'y' | 'axis1' | 'axis2'

export const BENDING_AXES: readonly BendingAxis[] = ['x', 'y', 'axis1', 'axis2']

/** Second moment about a bending axis. */
export function momentAbout({ ix, iy, i1, i2 }: Section, axis: BendingAxis): number {
  return { x: ix, y: iy, axis1: i1, axis2: i2 }[axis]
}

/** Angle of a bending axis from x, degrees. */
export function angleOf({ theta }: Section, axis: BendingAxis): number {
  return { x: 0, y: 90, axis1: theta ?? 0, axis2: (theta ?? 0) + 90 }[axis]
}

/** Change of the second moment about an axis; the axis of a greatest or least moment may turn without changing it. */
export function momentSpread(section: Section, change: Change, axis: BendingAxis): number {
  return aboutTurned(change, angleOf(section, axis)) + change.relative * momentAbout(section, axis)
}

/** Change of θ, degrees: half the change of the tensor over I1 − I2. Source: perturbation of a symmetric 2 × 2 tensor. */
export function thetaSpread({ ip, i1, i2 }: Section, { xx, yy, relative }: Change): number {
  return (90 / Math.PI) * ((xx + yy + 2 * relative * ip) / (i1 - i2))
}

/** Change of the centroid's distance from an axis: first moment over area. */
export function centroidSpread(section: Section, change: Change, axis: BendingAxis): number {
  const first = { x: change.y, y: change.x, axis1: change.x + change.y, axis2: change.x + change.y }[axis]
  return first / section.area + change.relative * section.circle.radius
}

/** How far the principal axes' turn moves a point of the boundary. */
export function turnSpread(section: Section, change: Change, axis: BendingAxis): number {
  if (axis === 'x' || axis === 'y') return 0
  return 2 * section.circle.radius * (thetaSpread(section, change) * (Math.PI / 180))
}

/** Change of the first moment of the halves about an axis at `offset` from the centroid. */
export function firstSpread(section: Section, change: Change, axis: BendingAxis, offset: number): number {
  const tensor = aboutTurned(change, angleOf(section, axis))
  return Math.sqrt(change.area * tensor) + Math.abs(offset) * change.area
}
