import { expect, test } from 'vitest'
import { boxAt, crossesBox, placeLabels } from '@/components/board/labels'

const viewport = { width: 400, height: 300 }
const label = (places: [number, number][]) => ({ id: 'a', width: 30, height: 12, places: places.map(([x, y]) => ({ x, y })) })

test('a label takes its first place where nothing is in the way', () => {
  expect(
    placeLabels(
      [
        label([
          [100, 100],
          [200, 100],
        ]),
      ],
      [],
      viewport,
    ),
  ).toEqual({ a: 0 })
})

test('a label steps aside for a line', () => {
  const line = { a: { x: 0, y: 100 }, b: { x: 150, y: 100 } }
  expect(
    placeLabels(
      [
        label([
          [100, 100],
          [200, 100],
        ]),
      ],
      [line],
      viewport,
    ),
  ).toEqual({ a: 1 })
})

test('a label steps aside for an earlier label and for a box that is held', () => {
  const first = { ...label([[100, 100]]), id: 'first' }
  expect(
    placeLabels(
      [
        first,
        label([
          [110, 104],
          [200, 200],
        ]),
      ],
      [],
      viewport,
    ).a,
  ).toBe(1)
  expect(
    placeLabels(
      [
        label([
          [110, 104],
          [200, 200],
        ]),
      ],
      [],
      viewport,
      [boxAt(first, { x: 100, y: 100 })],
    ).a,
  ).toBe(1)
})

test('a label never leaves the board while one of its places is inside', () => {
  expect(
    placeLabels(
      [
        label([
          [395, 100],
          [200, 100],
        ]),
      ],
      [],
      viewport,
    ),
  ).toEqual({ a: 1 })
})

test('where every place is crossed the one with the fewest lines is taken', () => {
  const lines = [0, 1, 2].map((k) => ({ a: { x: 0, y: 98 + k }, b: { x: 150, y: 98 + k } }))
  const one = { a: { x: 180, y: 100 }, b: { x: 260, y: 100 } }
  expect(
    placeLabels(
      [
        label([
          [100, 100],
          [220, 100],
        ]),
      ],
      [...lines, one],
      viewport,
    ),
  ).toEqual({ a: 1 })
})

test('a segment that passes a box without touching it does not cross it', () => {
  const box = { minX: 0, minY: 0, maxX: 10, maxY: 10 }
  expect(crossesBox({ a: { x: -5, y: 6 }, b: { x: 6, y: 17 } }, box)).toBe(false)
  expect(crossesBox({ a: { x: -5, y: 6 }, b: { x: 6, y: 12 } }, box)).toBe(true)
  expect(crossesBox({ a: { x: 3, y: 3 }, b: { x: 4, y: 4 } }, box)).toBe(true)
})
