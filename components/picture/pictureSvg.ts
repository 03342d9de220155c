import type { Annotations, TextLabel } from '@/components/board/annotation'
import { annotate, type Writing } from '@/components/board/annotate'
import { placeLabels, type Segment } from '@/components/board/labels'
import { centroidMark, hatchLines, hatchShift, shearCentreMark } from '@/components/board/marks'
import { outlineSegments } from '@/components/board/outlineSegments'
import { polylineOf } from '@/components/board/polyline'
import { boxOfRegion } from '@/components/board/regionModel'
import { type Box, fitView, toScreen, transformOf, type View } from '@/components/board/view'
import { sheetAround, zoneMarks } from '@/components/board/zones'
import type { Region } from '@/lib/geometry/region'
import { regionPath } from '@/lib/geometry/svgPath'
import type { SectionAnswer } from '@/lib/section/types'
import { ACCENT, HAIR, INK, LINES, METAL, SHEET, SOFT, TEXTS } from './looks'
import { fitting, words } from './pictureText'
import { scaleBarLength } from './scaleBar'
import type { Typeface } from './typeface'
import { element, xmlText } from './xml'

export interface PictureOptions {
  number: string
  title: string
  letter: string
  state: string
  writing: Writing
  faces: { text: Typeface; mono: Typeface }
}

const WIDTH = 1200
const HEIGHT = 900
/** The title block at the foot, px. */
const BLOCK = 92
const VIEWPORT = { width: WIDTH, height: HEIGHT - BLOCK }
const INSET = { top: 100, right: 110, bottom: 104, left: 110 }
const SPACING = 8
const SHOWN = { axes: true, dimensions: true, plastic: false, circle: false }

function metal(region: Region, box: Box, view: View): string {
  const origin = { x: (box.minX + box.maxX) / 2, y: (box.minY + box.maxY) / 2 }
  const path = regionPath(region, origin)
  const transform = transformOf(view, origin)
  const shift = hatchShift(toScreen(view, origin), SPACING)
  const hatch = element('path', {
    d: hatchLines(VIEWPORT.width, VIEWPORT.height, SPACING),
    transform: `translate(${shift} 0)`,
    fill: 'none',
    stroke: INK,
    'stroke-width': 0.7,
    'stroke-opacity': 0.5,
  })
  return [
    element('clipPath', { id: 'metal' }, element('path', { d: path, transform })),
    element('path', { d: path, transform, fill: METAL }),
    element('g', { 'clip-path': 'url(#metal)' }, hatch),
    element('path', {
      d: path,
      transform,
      fill: 'none',
      stroke: INK,
      'stroke-width': 2,
      'stroke-linejoin': 'round',
      'vector-effect': 'non-scaling-stroke',
    }),
  ].join('')
}

function zones(box: Box, view: View, mono: Typeface): string {
  const { columns, rows } = zoneMarks(sheetAround(box), view, VIEWPORT)
  const name = (text: string, x: number, y: number) => words({ face: mono, text, x, y, size: 11, fill: SOFT, anchor: 'middle' })
  const borders = [
    ...columns.map(({ end }) => (end === null ? '' : `M${end} 0v9`)),
    ...rows.map(({ end }) => (end === null ? '' : `M0 ${end}h9`)),
  ].join('')
  return [
    element('path', { d: `${borders}M0 0`, fill: 'none', stroke: SOFT }),
    ...columns.map(({ text, at }) => (at === null ? '' : name(text, at, 18))),
    ...rows.map(({ text, at }) => (at === null ? '' : name(text, 14, at + 4))),
  ].join('')
}

function annotations({ strokes, labels, lines }: Annotations, metalEdges: Segment[], faces: PictureOptions['faces']): string {
  const chosen = placeLabels(labels, [...lines, ...metalEdges], VIEWPORT)
  const label = ({ id, text, places, size, mono, look, turned }: TextLabel) => {
    const { x, y } = places[chosen[id]]
    const transform = turned ? `rotate(-90 ${x} ${y})` : undefined
    const face = mono ? faces.mono : faces.text
    return words({ face, text, x, y: y + 0.35 * size, size, fill: TEXTS[look], anchor: 'middle', transform })
  }
  return [
    ...strokes.map(({ d, look, mark }) => {
      const line = LINES[look]
      if (mark === 'filled') return element('path', { d, fill: line.stroke })
      return element('path', { ...line, d, fill: 'none', 'stroke-dasharray': mark ? undefined : line['stroke-dasharray'] })
    }),
    ...labels.map(label),
  ].join('')
}

function edgesOf({ edges, loopStart, hole }: Region, view: View): Segment[] {
  const loops = Array.from(hole, (_, k) => ({ polyline: polylineOf(edges, loopStart[k], loopStart[k + 1]) }))
  return outlineSegments(loops, view, VIEWPORT)
}

function centroid(at: { x: number; y: number }, view: View): string {
  const { x, y } = toScreen(view, at)
  const mark = centroidMark(8)
  const drawn =
    element('path', { d: mark.circle, fill: SHEET, stroke: INK, 'stroke-width': 1.4 }) +
    element('path', { d: mark.quarters, fill: INK })
  return element('g', { transform: `translate(${x} ${y})` }, drawn)
}

function shearCentre(at: { x: number; y: number }, view: View): string {
  const { x, y } = toScreen(view, at)
  const drawn = element('path', { d: shearCentreMark(4.5), fill: 'none', stroke: INK, 'stroke-width': 1.2 })
  return element('g', { transform: `translate(${x} ${y})` }, drawn)
}

function scaleBar(view: View, { writing, faces }: PictureOptions): string {
  const length = scaleBarLength(view.scale, 220)
  const x = WIDTH - 36 - length * view.scale
  const y = VIEWPORT.height - 26
  const bar = `M${x} ${y - 5}v5H${WIDTH - 36}v-5`
  const text = writing.length(length)
  return (
    element('path', { d: bar, fill: 'none', stroke: INK, 'stroke-width': 1.2 }) +
    words({ face: faces.mono, text, x: WIDTH - 36, y: y - 10, size: 13, fill: INK, anchor: 'end' })
  )
}

function titleBlock(answer: SectionAnswer, { number, title, letter, state, faces }: PictureOptions): string {
  const y = VIEWPORT.height
  const { text, mono } = faces
  const heading = fitting(text, title, 24, WIDTH - 470)
  const facts: [string, string][] = [
    ['File', fitting(mono, answer.source.name, 12, 330)],
    ['SHA-256', `${answer.source.sha256.slice(0, 16)}…`],
    ['Engine', answer.engineVersion],
  ]
  const rows = facts.map(([name, value], k) => {
    const line = y + 27 + 23 * k
    return (
      words({ face: text, text: name, x: WIDTH - 410, y: line, size: 12, fill: SOFT }) +
      words({ face: mono, text: value, x: WIDTH - 340, y: line, size: 12, fill: INK })
    )
  })
  return [
    element('path', { d: `M0 ${y}H${WIDTH}M${WIDTH - 426} ${y}V${HEIGHT}`, fill: 'none', stroke: HAIR }),
    words({ face: text, text: heading, x: 24, y: y + 38, size: 24, fill: INK }),
    words({ face: mono, text: fitting(mono, number, 15, 400), x: 24, y: y + 68, size: 15, fill: SOFT }),
    words({
      face: text,
      text: `${letter} · ${state}`,
      x: 24 + mono.width(fitting(mono, number, 15, 400), 15) + 20,
      y: y + 68,
      size: 15,
      fill: ACCENT,
    }),
    ...rows,
  ].join('')
}

/**
 * The picture of a section as one SVG file that stands alone: light, text as outlines, no style, script or link in it.
 * Region and figures in mm. The same input gives the same bytes.
 */
export function pictureSvg(answer: SectionAnswer, region: Region, options: PictureOptions): string {
  const box = boxOfRegion(region)
  const view = fitView(box, VIEWPORT, INSET)
  const frame = { view, viewport: VIEWPORT, extents: box }
  const name = xmlText(`${options.number} ${options.letter}, ${options.title}`)
  return element(
    'svg',
    { xmlns: 'http://www.w3.org/2000/svg', width: WIDTH, height: HEIGHT, viewBox: `0 0 ${WIDTH} ${HEIGHT}`, role: 'img' },
    [
      `<title>${name}</title>`,
      element('rect', { width: WIDTH, height: HEIGHT, fill: SHEET }),
      zones(box, view, options.faces.mono),
      metal(region, box, view),
      annotations(annotate(answer.section, frame, SHOWN, options.writing), edgesOf(region, view), options.faces),
      answer.section ? centroid(answer.section.centroid, view) : '',
      answer.section?.shearCentre ? shearCentre(answer.section.shearCentre, view) : '',
      scaleBar(view, options),
      titleBlock(answer, options),
      element('rect', { x: 0.5, y: 0.5, width: WIDTH - 1, height: HEIGHT - 1, fill: 'none', stroke: HAIR }),
    ].join(''),
  )
}
