import { expect, test } from 'vitest'
import {
  fitView,
  panBy,
  toDrawing,
  toScreen,
  transformOf,
  viewOnPlace,
  visibleBox,
  zoomAt,
  zoomLimits,
} from '@/components/board/view'
import { isAnother } from '@/components/board/useView'
import { random } from '../support/random'

const box = { minX: -25, minY: 0, maxX: 60, maxY: 118 }
const viewport = { width: 900, height: 620 }
const inset = { top: 80, right: 60, bottom: 40, left: 100 }
const limits = zoomLimits(box, viewport)

test('a point of the drawing comes back from the board within 1e-9 mm, for 200 random views', () => {
  const seed = 11
  const next = random(seed)
  for (let k = 0; k < 200; k++) {
    const view = { scale: 10 ** (4 * next() - 2), x: 1000 * next(), y: 1000 * next() }
    const point = { x: 200 * next() - 100, y: 200 * next() - 100 }
    const back = toDrawing(view, toScreen(view, point))
    expect(back.x, `seed ${seed}`).toBeWithin(point.x, { absolute: 1e-9 })
    expect(back.y, `seed ${seed}`).toBeWithin(point.y, { absolute: 1e-9 })
  }
})

test('up in the drawing is up on the board', () => {
  const view = fitView(box, viewport, inset)
  expect(toScreen(view, { x: 0, y: 118 }).y).toBeLessThan(toScreen(view, { x: 0, y: 0 }).y)
  expect(toScreen(view, { x: 60, y: 0 }).x).toBeGreaterThan(toScreen(view, { x: -25, y: 0 }).x)
})

test('fitting touches the free room on one pair of sides and keeps inside the other', () => {
  const view = fitView(box, viewport, inset)
  const topLeft = toScreen(view, { x: box.minX, y: box.maxY })
  const bottomRight = toScreen(view, { x: box.maxX, y: box.minY })
  expect(topLeft.y).toBeWithin(80, { absolute: 1e-9 })
  expect(bottomRight.y).toBeWithin(580, { absolute: 1e-9 })
  expect(topLeft.x).toBeGreaterThan(100)
  expect(bottomRight.x).toBeLessThan(840)
  expect(topLeft.x - 100).toBeWithin(840 - bottomRight.x, { absolute: 1e-9 })
})

test('zooming keeps the point under the cursor where it is and stops at the limits', () => {
  const at = { x: 300, y: 200 }
  const view = fitView(box, viewport, inset)
  const before = toDrawing(view, at)
  const near = toDrawing(zoomAt(view, at, 3, limits), at)
  expect(near.x).toBeWithin(before.x, { absolute: 1e-9 })
  expect(near.y).toBeWithin(before.y, { absolute: 1e-9 })
  expect(zoomAt(view, at, 1e12, limits).scale).toBe(limits.max)
  expect(zoomAt(view, at, 1e-12, limits).scale).toBe(limits.min)
})

test('moving by 10 px right and 5 px down moves what is seen by as much to the left and up', () => {
  const view = { scale: 2, x: 0, y: 0 }
  const seen = visibleBox(panBy(view, 10, 5), viewport)
  expect(seen.minX).toBe(visibleBox(view, viewport).minX - 5)
  expect(seen.maxY).toBe(visibleBox(view, viewport).maxY + 2.5)
})

test('a place is brought to the middle, its size a third of the board', () => {
  const view = viewOnPlace({ x: 38, y: 90 }, 4, viewport, limits)
  expect(toScreen(view, { x: 38, y: 90 })).toEqual({ x: 450, y: 310 })
  expect(4 * view.scale).toBeWithin(620 / 3, { relative: 1e-12 })
})

test('the SVG transform puts the origin of the paths where toScreen puts it', () => {
  const view = { scale: 4, x: 100, y: 300 }
  expect(transformOf(view, { x: 10, y: 20 })).toBe('translate(140 220) scale(4)')
})

test('the view stays while the drawing changes a little, and fits anew when the unit makes it 25.4 times larger', () => {
  expect(isAnother(box, { ...box, maxX: 66 })).toBe(false)
  expect(isAnother(box, { minX: -25 * 25.4, minY: 0, maxX: 60 * 25.4, maxY: 118 * 25.4 })).toBe(true)
  expect(isAnother(box, { minX: 400, minY: 0, maxX: 485, maxY: 118 })).toBe(true)
})
