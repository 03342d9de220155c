import type { Point } from '@/lib/geometry/edges'
import type { Section } from '@/lib/section/types'

/** An axis of a section: through a point, angle in rad counter-clockwise from +x. */
export interface Axis {
  through: Point
  angle: number
}

export type AxisId = 'x' | 'y' | 'axis1' | 'axis2'

const QUARTER = Math.PI / 2

/** The centroid axes x and y and, where they are determined, the principal axes. */
export function axesOf(section: Section): Partial<Record<AxisId, Axis>> {
  const through = section.centroid
  const axes: Partial<Record<AxisId, Axis>> = { x: { through, angle: 0 }, y: { through, angle: QUARTER } }
  if (section.theta !== null) {
    const theta = (section.theta * Math.PI) / 180
    axes.axis1 = { through, angle: theta }
    axes.axis2 = { through, angle: theta + QUARTER }
  }
  return axes
}

/** The axis moved sideways by `offset` mm to its left, looking along it. */
export function shifted({ through, angle }: Axis, offset: number): Axis {
  return { through: { x: through.x - offset * Math.sin(angle), y: through.y + offset * Math.cos(angle) }, angle }
}

/**
 * The plastic neutral axes. Offsets as the section gives them: x along +y, y along +x, axis 1 along
 * axis 2 (its left), axis 2 along axis 1 (its right).
 */
export function plasticAxesOf(section: Section): Partial<Record<AxisId, Axis>> {
  const { x, y, axis1, axis2 } = axesOf(section)
  const at = section.plastic.at
  const axes: Partial<Record<AxisId, Axis>> = {}
  if (x) axes.x = shifted(x, at.x)
  if (y) axes.y = shifted(y, -at.y)
  if (axis1 && at.axis1 !== null) axes.axis1 = shifted(axis1, at.axis1)
  if (axis2 && at.axis2 !== null) axes.axis2 = shifted(axis2, -at.axis2)
  return axes
}

export interface Fibre {
  axis: AxisId
  /** mm from the axis to its left (negative: to its right) */
  offset: number
}

/** The extreme fibres: the distance is the second moment over the elastic modulus. */
export function fibresOf(section: Section): Record<string, Fibre | null> {
  const { elastic: e, ix, iy, i1, i2 } = section
  const fibre = (axis: AxisId, moment: number, modulus: number | null, side: 1 | -1): Fibre | null =>
    modulus ? { axis, offset: (side * moment) / modulus } : null
  return {
    fibreTop: fibre('x', ix, e.xTop, 1),
    fibreBottom: fibre('x', ix, e.xBottom, -1),
    fibreRight: fibre('y', iy, e.yRight, -1),
    fibreLeft: fibre('y', iy, e.yLeft, 1),
    fibre1Left: fibre('axis1', i1, e.axis1Left, 1),
    fibre1Right: fibre('axis1', i1, e.axis1Right, -1),
    fibre2Right: fibre('axis2', i2, e.axis2Right, -1),
    fibre2Left: fibre('axis2', i2, e.axis2Left, 1),
  }
}
