import { expect, test } from 'vitest'
import { facesOf } from '@/lib/geometry/arrangement/faces'
import { emptyTable, pushArc, pushLine } from '@/lib/geometry/edges'

const lines = (...ends: [number, number, number, number][]) => {
  const table = emptyTable()
  for (const [k, [x0, y0, x1, y1]] of ends.entries()) pushLine(table, x0, y0, x1, y1, k)
  return table
}
const RECTANGLE: [number, number, number, number][] = [
  [0, 0, 10, 0],
  [10, 6, 10, 0],
  [10, 6, 0, 6],
  [0, 0, 0, 6],
]
const sorted = (area: Float64Array) => Array.from(area).sort((a, b) => a - b)

test('a rectangle with a dividing line has two faces of 24 and 36', () => {
  const { area, dangling, loopStart } = facesOf(lines(...RECTANGLE, [4, 0, 4, 6]), null, { snap: 1e-8 })
  expect(sorted(area)).toEqual([24, 36])
  expect(loopStart.length).toBe(3)
  expect(dangling.length).toBe(0)
})

test('a line that ends inside bounds nothing and is reported as dangling', () => {
  const { area, dangling } = facesOf(lines(...RECTANGLE, [4, 0, 4, 5]), null, { snap: 1e-8 })
  expect(sorted(area)).toEqual([60])
  expect(Array.from(dangling)).toEqual([4])
})

test('a line that links two rectangles is reported, both rectangles stay', () => {
  const other: [number, number, number, number][] = [
    [20, 0, 25, 0],
    [25, 0, 25, 4],
    [25, 4, 20, 4],
    [20, 4, 20, 0],
  ]
  const { area, dangling } = facesOf(lines(...RECTANGLE, ...other, [10, 3, 20, 3]), null, { snap: 1e-8 })
  expect(sorted(area)).toEqual([20, 60])
  expect(Array.from(dangling)).toEqual([8])
})

test('a circle with two chords that cross in it has four faces that add up to its area', () => {
  const table = lines([-5, 0, 5, 0], [0, -5, 0, 5])
  pushArc(table, 5, 0, -5, 0, 0, 0, 5, 0, Math.PI, 2)
  pushArc(table, -5, 0, 5, 0, 0, 0, 5, Math.PI, Math.PI, 3)
  const { area } = facesOf(table, null, { snap: 1e-8 })
  expect(area.length).toBe(4)
  for (const a of area) expect(a).toBeWithin((25 * Math.PI) / 4, { relative: 1e-14 })
})

test('only the rows asked for are looked at, and dangling rows are rows of the given table', () => {
  const table = lines([50, 50, 60, 60], ...RECTANGLE, [0, 3, -4, 3])
  const { area, dangling } = facesOf(table, Uint32Array.from([1, 2, 3, 4, 5]), { snap: 1e-8 })
  expect(sorted(area)).toEqual([60])
  expect(Array.from(dangling)).toEqual([5])
})

test('a grid of 20 × 20 lines has 361 unit faces', () => {
  const table = emptyTable()
  for (let k = 0; k < 20; k++) {
    pushLine(table, k, 0, k, 19, k)
    pushLine(table, 19, k, 0, k, 20 + k)
  }
  const { area } = facesOf(table, null, { snap: 1e-8 })
  expect(area.length).toBe(361)
  for (const a of area) expect(a).toBeWithin(1, { relative: 1e-14 })
})
