import { expect, test } from 'vitest'
import { annotate, type Shown, type Writing } from '@/components/board/annotate'
import { annotateHot } from '@/components/board/annotateHot'
import { axesOf, fibresOf, plasticAxesOf, shifted } from '@/components/board/axesOf'
import { placeLabels, boxAt, crossesBox } from '@/components/board/labels'
import { boxOfRegion } from '@/components/board/regionModel'
import { fitView, toScreen } from '@/components/board/view'
import type { Section } from '@/lib/section/types'
import { answerWith } from './answer'
import { plateWithHole, zShape } from './shapes'

const viewport = { width: 900, height: 620 }
const writing: Writing = {
  names: { x: 'x', y: 'y', axis1: '1', axis2: '2' },
  length: (mm) => `${mm.toFixed(1)} mm`,
  angle: (degrees) => `${degrees.toFixed(1)}°`,
}
const everything: Shown = { axes: true, dimensions: true, plastic: false, circle: true }

function sectionOfShape(region: ReturnType<typeof zShape>): Section {
  const { section } = answerWith(region)
  if (!section) throw new Error('the shape gives a section')
  return section
}
const frameOf = (region: ReturnType<typeof zShape>) => {
  const extents = boxOfRegion(region)
  return { view: fitView(extents, viewport, { top: 84, right: 84, bottom: 76, left: 92 }), viewport, extents }
}
const section = sectionOfShape(zShape())
const frame = frameOf(zShape())

test('axis 1 of a Z makes its angle θ with +x on the board, counter-clockwise', () => {
  const axis = axesOf(section).axis1
  expect(((axis?.angle ?? 0) * 180) / Math.PI).toBeWithin(section.theta ?? 0, { absolute: 1e-12 })
  const { lines, labels } = annotate(section, frame, everything, writing)
  const line = lines[labels.findIndex(({ id }) => id === 'axis1')]
  const angle = (Math.atan2(line.a.y - line.b.y, line.b.x - line.a.x) * 180) / Math.PI
  expect(angle).toBeWithin(section.theta ?? 0, { absolute: 1e-9 })
})

test('every label of a fitted Z stands clear of every axis and dimension line', () => {
  const { labels, lines } = annotate(section, frame, everything, writing)
  const chosen = placeLabels(labels, lines, viewport)
  const crossed = labels.filter((label) => lines.some((line) => crossesBox(line, boxAt(label, label.places[chosen[label.id]]))))
  expect(crossed.map(({ id }) => id)).toEqual([])
})

test('where every axis is principal no axis 1 and no angle are drawn', () => {
  const square = { ...section, theta: null }
  const ids = annotate(square, frame, everything, writing).labels.map(({ id }) => id)
  expect(ids).toEqual(['x', 'y', 'width', 'height', 'circle'])
})

test('the dimensions of the plate read 60 and 40 mm', () => {
  const plate = sectionOfShape(plateWithHole())
  const texts = annotate(plate, frameOf(plateWithHole()), everything, writing).labels.map(({ text }) => text)
  expect(texts).toContain('60.0 mm')
  expect(texts).toContain('40.0 mm')
})

test('the fibre of each modulus about x and y is an edge of the extents', () => {
  const fibres = fibresOf(section)
  expect(section.centroid.y + (fibres.fibreTop?.offset ?? 0)).toBeWithin(60, { absolute: 1e-9 })
  expect(section.centroid.y + (fibres.fibreBottom?.offset ?? 0)).toBeWithin(0, { absolute: 1e-9 })
  expect(section.centroid.x - (fibres.fibreRight?.offset ?? 0)).toBeWithin(40, { absolute: 1e-9 })
  expect(section.centroid.x - (fibres.fibreLeft?.offset ?? 0)).toBeWithin(-36, { absolute: 1e-9 })
})

test('an offset moves an axis to its left: y at 90° goes to −x', () => {
  const { through } = shifted({ through: { x: 5, y: 7 }, angle: Math.PI / 2 }, 2)
  expect(through.x).toBeWithin(3, { absolute: 1e-12 })
  expect(through.y).toBeWithin(7, { absolute: 1e-12 })
})

test('plastic axes lie off the centroid as the section says: x along +y, y along +x', () => {
  const moved = { ...section, plastic: { ...section.plastic, at: { x: 3, y: 4, axis1: null, axis2: null } } }
  const axes = plasticAxesOf(moved)
  expect((axes.x?.through.y ?? 0) - section.centroid.y).toBeWithin(3, { absolute: 1e-12 })
  expect((axes.y?.through.x ?? 0) - section.centroid.x).toBeWithin(4, { absolute: 1e-12 })
  expect(axes.axis1).toBe(undefined)
})

test('pointing at Ix draws the horizontal axis and no other', () => {
  const { strokes, lines } = annotateHot(section, frame, 'axisX', everything, writing, 0)
  expect(strokes.map(({ id }) => id)).toEqual(['hot-x'])
  expect(lines[0].a.y).toBeWithin(toScreen(frame.view, section.centroid).y, { absolute: 1e-9 })
  expect(lines[0].b.y).toBe(lines[0].a.y)
})

test('pointing at the modulus to the top fibre draws the fibre and its distance from x', () => {
  const { labels } = annotateHot(section, frame, 'fibreTop', everything, writing, 0)
  expect(labels.map(({ text }) => text)).toEqual(['fibre', `${(60 - section.centroid.y).toFixed(1)} mm`])
})
