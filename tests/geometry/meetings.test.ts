import { expect, test } from 'vitest'
import { pushEdge } from '@/lib/geometry/edges'
import { outlinesOf } from '@/lib/geometry/outlines'
import { allRows, ellipseBetween } from '../support/profiles'
import { random } from '../support/random'
import { codesOf, Drawn, TOLERANCES } from './drawn'

test('two rectangles that cross have no depth, one cluster and one finding', () => {
  const set = new Drawn().rectangle(0, 0, 10, 10).rectangle(5, 5, 15, 15).outlines()
  expect([...set.depth]).toEqual([-1, -1])
  expect(set.clusters).toEqual([[0, 1]])
  expect(codesOf(set)).toEqual(['outlines-cross'])
})

test('a hole that touches the outer edge has depth 1', () => {
  const set = new Drawn().rectangle(0, 0, 10, 10).circle(2, 5, 2).outlines()
  expect([...set.depth]).toEqual([0, 1])
  expect(set.clusters).toEqual([[0, 1]])
  expect(codesOf(set)).toEqual(['outlines-touch'])
})

test('a hole that overruns the outer edge by 1e-5 crosses it', () => {
  const set = new Drawn()
    .rectangle(0, 0, 10, 10)
    .circle(2 - 1e-5, 5, 2)
    .outlines()
  expect([...set.depth]).toEqual([-1, -1])
})

test('a hole that shares half a side with the outer edge has depth 1', () => {
  const set = new Drawn().rectangle(0, 0, 10, 10).rectangle(0, 2, 4, 7).outlines()
  expect([...set.depth]).toEqual([0, 1])
})

test('corner to corner, two squares touch and both have depth 0', () => {
  const set = new Drawn().rectangle(0, 0, 10, 10).rectangle(10, 10, 20, 20).outlines()
  expect([...set.depth]).toEqual([0, 0])
  expect(set.clusters).toEqual([[0, 1]])
})

test('two tangent circles touch; 1e-5 apart they do not', () => {
  expect(new Drawn().circle(0, 0, 5).circle(10, 0, 5).outlines().clusters).toEqual([[0, 1]])
  expect(
    new Drawn()
      .circle(0, 0, 5)
      .circle(10 + 1e-5, 0, 5)
      .outlines().clusters,
  ).toEqual([])
})

test('a figure of eight crosses itself at (5, 5)', () => {
  const set = new Drawn()
    .polyline([
      [0, 0],
      [10, 10],
      [10, 0],
      [0, 12],
    ])
    .outlines()
  expect(codesOf(set)).toEqual(['outline-crosses-itself'])
  expect([...set.depth]).toEqual([-1])
})

test('two halves that meet in one point touch themselves there, and keep depth 0', () => {
  const hourglass = new Drawn()
    .polyline([
      [0, 0],
      [10, 0],
      [5, 5],
      [10, 10],
      [0, 10],
      [5, 5],
    ])
    .outlines()
  expect(codesOf(hourglass)).toEqual(['outline-touches-itself'])
  expect(hourglass.findings[0].at).toEqual([5, 5])
  expect([...hourglass.depth]).toEqual([0])
  expect(hourglass.clusters).toEqual([[0]])
})

test('a plate with a hole drawn as one polyline, by a cut there and back, has area 84 and depth 0', () => {
  const set = new Drawn()
    .polyline([
      [0, 0],
      [10, 0],
      [10, 10],
      [0, 10],
      [0, 5],
      [3, 5],
      [3, 7],
      [7, 7],
      [7, 3],
      [3, 3],
      [3, 5],
      [0, 5],
    ])
    .circle(5, 5, 1)
    .outlines()
  expect(codesOf(set)).toEqual(['outline-touches-itself'])
  expect(set.area[0]).toBe(84)
  expect([...set.depth]).toEqual([0, 0])
})

test('a spike there and back is told as touching itself', () => {
  const set = new Drawn()
    .polyline([
      [0, 0],
      [10, 0],
      [4, 0],
      [4, 10],
    ])
    .outlines()
  expect(codesOf(set)).toEqual(['outline-touches-itself'])
})

test('an outline that winds twice round its middle crosses itself', () => {
  const star: [number, number][] = [0, 2, 4, 1, 3].map((n) => [
    10 * Math.cos((2 * Math.PI * n) / 5),
    10 * Math.sin((2 * Math.PI * n) / 5),
  ])
  expect(codesOf(new Drawn().polyline(star).outlines())).toEqual(['outline-crosses-itself'])
})

test('an elliptical outline and a rectangle that cross are found', () => {
  const drawn = new Drawn().rectangle(0, 0, 10, 10)
  pushEdge(drawn.edges, ellipseBetween({ x: 8, y: 2 }, { x: 8, y: 8 }, 0.9, 1.4, 0.1, 9))
  pushEdge(drawn.edges, ellipseBetween({ x: 8, y: 8 }, { x: 8, y: 2 }, 0.9, 0.7, 0, 9))
  const set = outlinesOf(drawn.edges, allRows(drawn.edges), TOLERANCES, { arcs: [], mmPerUnit: 1 })
  expect([...set.depth]).toEqual([-1, -1])
})

test('nesting 60 deep comes out as drawn, whatever the order', () => {
  const next = random(5)
  const order = Array.from({ length: 60 }, (_, n) => n).sort(() => next() - 0.5)
  const drawn = new Drawn()
  for (const n of order) drawn.rectangle(n, n, 200 - n, 200 - n)
  expect([...drawn.outlines().depth]).toEqual(order)
})

test('a clipped corner inside the box of another outline is outside that outline', () => {
  const set = new Drawn()
    .polyline([
      [0, 0],
      [20, 0],
      [20, 4],
      [4, 4],
      [4, 20],
      [0, 20],
    ])
    .rectangle(10, 10, 15, 15)
    .circle(2, 10, 1)
    .outlines()
  expect([...set.depth]).toEqual([0, 0, 1])
})
