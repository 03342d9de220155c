import { totalPlusMinus } from '@/components/sheet/plusMinus'
import type { Section } from '@/lib/section/types'
import { angleArc, circleWithDiameter } from './angleArc'
import { type Annotations, emptyAnnotations, merge } from './annotation'
import { type AxisId, axesOf, plasticAxesOf } from './axesOf'
import { drawAxis, type Frame } from './axisLines'
import { extentDimensions } from './dimensionLines'
import type { AxisNames } from '@/lib/section/naming'
import type { Viewport } from './view'

/** Which annotations a person has switched on. */
export interface Shown {
  axes: boolean
  dimensions: boolean
  plastic: boolean
  circle: boolean
}

/** How axes, lengths and angles are written on this board. */
export interface Writing {
  names: AxisNames
  length: (mm: number) => string
  /** with no digit that ± leaves meaningless */
  angle: (degrees: number, plusMinus?: number) => string
}

const AXES: AxisId[] = ['x', 'y', 'axis1', 'axis2']
export const isPrincipal = (id: AxisId) => id === 'axis1' || id === 'axis2'
/** Principal axes run on beyond the centroid axes, so that both names have room. */
export const beyondOf = (id: AxisId) => (isPrincipal(id) ? 58 : 36)
/** Radius of the angle's arc: less on a small board, px. */
const angleRadius = ({ width, height }: Viewport) => Math.min(84, 0.2 * Math.min(width, height))

function centroidAndPrincipal(section: Section, frame: Frame, names: AxisNames): Annotations[] {
  const axes = axesOf(section)
  return AXES.flatMap((id) => {
    const axis = axes[id]
    if (!axis) return []
    const principal = isPrincipal(id)
    const look = principal ? 'principal' : 'centroid'
    const textLook = principal ? 'principal' : 'axis'
    return [drawAxis({ ...axis, id, look, text: names[id], textLook, beyond: beyondOf(id), arrow: principal }, frame)]
  })
}

function plasticXY(section: Section, frame: Frame, names: AxisNames): Annotations[] {
  const axes = plasticAxesOf(section)
  return (['x', 'y'] as const).flatMap((id) => {
    const axis = axes[id]
    if (!axis) return []
    const text = `plastic ${names[id]}`
    return [
      drawAxis({ ...axis, id: `plastic-${id}`, look: 'plastic', text, textLook: 'plastic', beyond: 20, arrow: false }, frame),
    ]
  })
}

/** Everything drawn and written over the metal, px of this view. Pure: board and exported picture share it. */
export function annotate(section: Section | null, frame: Frame, shown: Shown, { names, length, angle }: Writing): Annotations {
  const dimensions = shown.dimensions ? extentDimensions(frame, length) : []
  if (!section) return merge(dimensions)
  const { theta, centroid, circle } = section
  return merge([
    ...(shown.axes ? centroidAndPrincipal(section, frame, names) : []),
    ...dimensions,
    ...(shown.plastic ? plasticXY(section, frame, names) : []),
    shown.axes && theta !== null
      ? angleArc(
          frame.view,
          centroid,
          theta,
          angleRadius(frame.viewport),
          angle(theta, totalPlusMinus(section.origin.theta?.plusMinus)),
        )
      : emptyAnnotations(),
    shown.circle
      ? circleWithDiameter(frame.view, circle, circle.radius, `Ø ${length(2 * circle.radius)}`, 'circle')
      : emptyAnnotations(),
  ])
}
