import type { Shows } from '@/lib/section/figures/figure'
import type { Section } from '@/lib/section/types'
import { circleWithDiameter } from './angleArc'
import { beyondOf, isPrincipal, type Shown, type Writing } from './annotate'
import { type Annotations, along, emptyAnnotations, left, merge } from './annotation'
import { type AxisId, axesOf, fibresOf, plasticAxesOf, shifted } from './axesOf'
import { type AxisLine, drawAxis, type Frame, seenPart } from './axisLines'
import { drawDimension, extentDimensions } from './dimensionLines'

/** The axes that stand out while a figure is pointed at. */
const HOT_AXES: Partial<Record<Shows, AxisId[]>> = {
  axisX: ['x'],
  axisY: ['y'],
  axesXY: ['x', 'y'],
  axis1: ['axis1'],
  axis2: ['axis2'],
  axes12: ['axis1', 'axis2'],
}
const HOT_PLASTIC: Partial<Record<Shows, AxisId>> = { plasticX: 'x', plasticY: 'y', plastic1: 'axis1', plastic2: 'axis2' }

export function hotAxes(section: Section, hot: Shows): AxisId[] {
  const fibre = fibresOf(section)[hot]
  return fibre ? [fibre.axis] : (HOT_AXES[hot] ?? [])
}

const withoutLabels = (part: Annotations): Annotations => ({ ...part, labels: [] })

function axes(section: Section, frame: Frame, hot: Shows, shown: Shown, { names }: Writing): Annotations[] {
  const all = axesOf(section)
  return hotAxes(section, hot).flatMap((id) => {
    const axis = all[id]
    if (!axis) return []
    const line = { ...axis, id: `hot-${id}`, look: 'hot', text: names[id], textLook: 'principal' } as const
    const drawn = drawAxis({ ...line, beyond: beyondOf(id), arrow: isPrincipal(id) }, frame)
    return [shown.axes ? withoutLabels(drawn) : drawn]
  })
}

/** A plastic neutral axis with its distance from the centroid. */
function plastic(section: Section, frame: Frame, hot: Shows, { names }: Writing): Annotations {
  const id = HOT_PLASTIC[hot]
  const axis = id && plasticAxesOf(section)[id]
  if (!id || !axis) return emptyAnnotations()
  const text = `plastic ${names[id]}`
  return drawAxis({ ...axis, id: 'hot-plastic', look: 'hot', text, textLook: 'principal', beyond: 44, arrow: false }, frame)
}

/** The extreme fibre of a modulus, parallel to its axis, with its distance. */
function fibre(section: Section, frame: Frame, hot: Shows, { length }: Writing): Annotations {
  const found = fibresOf(section)[hot]
  const axis = found && axesOf(section)[found.axis]
  if (!found || !axis) return emptyAnnotations()
  const line: AxisLine = {
    ...shifted(axis, found.offset),
    id: 'fibre',
    look: 'fibre',
    text: 'fibre',
    textLook: 'principal',
    beyond: 26,
    arrow: false,
  }
  return merge([drawAxis(line, frame), fibreDistance(line, found.offset, frame, length)])
}

/** The distance from the axis to its fibre, measured where both lines end, clear of the metal. */
function fibreDistance(line: AxisLine, offset: number, frame: Frame, length: Writing['length']): Annotations {
  const seen = seenPart(line, frame)
  if (!seen) return emptyAnnotations()
  const b = along(seen.p, seen.d, seen.from + 14)
  const a = along(b, left(seen.d), -offset * frame.view.scale)
  return drawDimension({ id: 'fibre-distance', a, b, off: 0, text: length(Math.abs(offset)), look: 'hot', textLook: 'principal' })
}

/** The neutral axis of free plastic bending: it halves the area, `offset` mm to the left of the centroid. */
function freePlastic(section: Section, frame: Frame, hot: Shows, offset: number): Annotations {
  const angle = freePlasticAngle(section, hot)
  if (angle === null) return emptyAnnotations()
  const line: AxisLine = {
    ...shifted({ through: section.centroid, angle: (angle * Math.PI) / 180 }, offset),
    id: 'free-plastic',
    look: 'hot',
    text: 'neutral axis',
    textLook: 'principal',
    beyond: 30,
    arrow: false,
  }
  return drawAxis(line, frame)
}

/** Direction of that neutral axis, degrees from +x; null for any other figure. */
export function freePlasticAngle({ freePlastic: free }: Section, hot: Shows): number | null {
  if (hot === 'freePlasticX') return free.angleX
  return hot === 'freePlasticY' ? free.angleY : null
}

/**
 * What the board draws while a figure is pointed at, over everything else. `freeOffset` is where the neutral axis of free
 * plastic bending lies, mm to the left of the centroid; read for its figures only.
 */
export function annotateHot(
  section: Section,
  frame: Frame,
  hot: Shows,
  shown: Shown,
  writing: Writing,
  freeOffset: number,
): Annotations {
  const { circle } = section
  const diameter = `Ø ${writing.length(2 * circle.radius)}`
  const drawnCircle = circleWithDiameter(frame.view, circle, circle.radius, diameter, 'hot')
  return merge([
    ...axes(section, frame, hot, shown, writing),
    fibre(section, frame, hot, writing),
    plastic(section, frame, hot, writing),
    freePlastic(section, frame, hot, freeOffset),
    hot === 'circle' ? (shown.circle ? withoutLabels(drawnCircle) : drawnCircle) : emptyAnnotations(),
    ...(hot === 'extents' && !shown.dimensions ? extentDimensions(frame, writing.length) : []),
  ])
}
