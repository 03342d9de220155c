import { expect, test } from 'vitest'
import { codesOf, Drawn } from './drawn'

test('a side drawn twice is one side: area 100, one finding with 10 mm', () => {
  const set = new Drawn().lines(0, 0, 10, 10).line(10, 0, 0, 0).outlines()
  expect([...set.area]).toEqual([100])
  expect(codesOf(set)).toEqual(['edges-doubled'])
  expect(set.findings[0].params).toMatchObject({ count: 1, length: 10 })
})

test('two lines that overlap by 3 along one side become that side', () => {
  const set = new Drawn()
    .line(0, 0, 10, 0)
    .line(10, 0, 10, 10)
    .line(10, 10, 4, 10)
    .line(7, 10, 0, 10)
    .line(0, 10, 0, 0)
    .outlines()
  expect([...set.area]).toEqual([100])
  expect(set.findings[0].params.length).toBeWithin(3, { absolute: 1e-12 })
})

test('two arcs of one circle that overlap by 30° become a half circle', () => {
  const set = new Drawn().arc(0, 0, 10, 0, 100).arc(0, 0, 10, 70, 180).line(-10, 0, 10, 0).outlines()
  expect(set.count).toBe(1)
  expect(set.area[0]).toBeWithin(50 * Math.PI, { relative: 1e-14 })
})

test('three arcs that overlap all round become a circle', () => {
  const set = new Drawn().arc(0, 0, 10, 0, 140).arc(0, 0, 10, 120, 260).arc(0, 0, 10, 240, 380).outlines()
  expect(set.count).toBe(1)
  expect(set.area[0]).toBeWithin(100 * Math.PI, { relative: 1e-14 })
})

test('arcs whose radii differ by 5e-5, within the duplicate tolerance: the longer one holds', () => {
  const set = new Drawn().arc(0, 0, 10, 0, 180).arc(0, 0, 10.00005, 40, 100).line(-10, 0, 10, 0).outlines({ duplicate: 1e-4 })
  expect(set.count).toBe(1)
  expect(set.area[0]).toBeWithin(50 * Math.PI, { relative: 1e-14 })
  expect(codesOf(set)).toEqual(['edges-doubled'])
})

test('an arc drawn on a circle, and the circle drawn twice: one outline', () => {
  const set = new Drawn().circle(30, 25, 12).circle(30, 25, 12).arc(30, 25, 12, 40, 130).outlines()
  expect(set.count).toBe(1)
  expect(codesOf(set).sort()).toEqual(['edges-doubled', 'outlines-coincident'])
})

test('a whole outline of loose lines drawn twice is one outline', () => {
  const set = new Drawn().lines(0, 0, 10, 10).lines(0, 0, 10, 10).outlines()
  expect([...set.area]).toEqual([100])
  expect(set.findings[0].params).toMatchObject({ count: 4, length: 40 })
})

test('the same closed outline with other vertices counts once', () => {
  const set = new Drawn()
    .rectangle(0, 0, 10, 10)
    .polyline([
      [5, 0],
      [10, 0],
      [10, 10],
      [0, 10],
      [0, 0],
    ])
    .outlines()
  expect([...set.area]).toEqual([100])
  expect(codesOf(set)).toEqual(['outlines-coincident'])
})

test('a slit of 0.008, wider than the duplicate tolerance of 0.001, is kept', () => {
  const slit: [number, number][] = [
    [0, 0],
    [20, 0],
    [20, 10],
    [10.008, 10],
    [10.008, 2],
    [10, 2],
    [10, 10],
    [0, 10],
  ]
  const drawn = new Drawn()
  for (const [i, [x, y]] of slit.entries()) drawn.line(x, y, ...slit[(i + 1) % slit.length])
  const set = drawn.outlines({ duplicate: 0.001, lastDigit: 0 })
  expect(set.area[0]).toBeWithin(200 - 0.008 * 8, { absolute: 1e-12 })
  expect(set.findings).toEqual([])
})

test('two rectangles of loose lines that share part of a side are two outlines that touch, not a doubled edge', () => {
  const set = new Drawn().lines(0, 0, 10, 10).lines(10, 2, 15, 8).outlines()
  expect([...set.area]).toEqual([100, 30])
  expect([...set.depth]).toEqual([0, 0])
  expect(set.clusters).toEqual([[0, 1]])
  expect(codesOf(set)).toEqual(['outlines-touch'])
})

test('an outline 20 long and 0.0005 wide counts, and is named with its width as thinner than the duplicate tolerance', () => {
  const set = new Drawn().rectangle(0, 0, 20, 0.0005).outlines({ duplicate: 0.001 })
  expect([...set.area]).toEqual([0.01])
  expect(codesOf(set)).toEqual(['outline-thin'])
  expect(set.findings[0].params.width).toBeWithin(0.0005, { relative: 1e-4 })
})
