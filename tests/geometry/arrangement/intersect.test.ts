import { expect, test } from 'vitest'
import { intersectEdges } from '@/lib/geometry/arrangement/intersect'
import { BEZIER, type Edge, ELLIPSE, type Point } from '@/lib/geometry/edges'
import { random } from '@/tests/support/random'
import { arc, asBeziers, lineTo, mapped, turnAndMove } from './shapes'

const TOLERANCE = 1e-9
const p = (x: number, y: number): Point => ({ x, y })
const circleEdge = (x: number, y: number, r: number) => arc(p(x, y), r, 0, 2 * Math.PI, p(x + r, y), p(x + r, y))
const ellipse = (x: number, y: number, a: number, b: number): Edge => ({
  kind: ELLIPSE,
  a: p(x + a, y),
  b: p(x + a, y),
  centre: p(x, y),
  u: p(a, 0),
  v: p(0, b),
  start: 0,
  sweep: 2 * Math.PI,
  source: 0,
})
const bezier = (control: Point[], weights: number[] | null = null): Edge => ({
  kind: BEZIER,
  a: control[0],
  b: control[control.length - 1],
  control,
  weights,
  source: 0,
})
const at = (e: Edge, f: Edge) => intersectEdges(e, f, TOLERANCE).map((m) => [m.at.x, m.at.y])

test('two lines cross in (2, 1) at 0.5 and 0.25 of their lengths', () => {
  const [m, ...more] = intersectEdges(lineTo(p(0, 0), p(4, 2)), lineTo(p(0, 2), p(8, -2)), TOLERANCE)
  expect(more).toEqual([])
  expect(m.at).toEqual(p(2, 1))
  expect([m.te, m.tf]).toEqual([0.5, 0.25])
})

test('collinear lines share the stretch from 3 to 5', () => {
  const [m, ...more] = intersectEdges(lineTo(p(0, 0), p(5, 0)), lineTo(p(9, 0), p(3, 0)), TOLERANCE)
  expect(more).toEqual([])
  expect([m.at, m.to?.at]).toEqual([p(3, 0), p(5, 0)])
})

test('a line through a circle of radius 5 at height 3 meets it at x = ±4', () => {
  const found = at(lineTo(p(-9, 3), p(9, 3)), circleEdge(0, 0, 5))
  expect(found.map(([x]) => x).sort((a, b) => a - b)).toEqual([expect.closeTo(-4, 12), expect.closeTo(4, 12)])
})

test('a line that passes a circle at its radius ± half the tolerance touches it in one foot point', () => {
  for (const off of [-0.5, 0, 0.5]) {
    const found = at(lineTo(p(-9, 5 + off * TOLERANCE), p(7, 5 + off * TOLERANCE)), circleEdge(0, 0, 5))
    expect(found.length).toBe(1)
    expect(found[0][0]).toBeWithin(0, { absolute: 1e-7 })
  }
})

test('circles of radius 5 and 3 touch once from outside and once from inside', () => {
  expect(at(circleEdge(0, 0, 5), circleEdge(8, 0, 3))).toEqual([[5, 0]])
  expect(at(circleEdge(0, 0, 5), circleEdge(0, 2, 3)).map(([, y]) => y)).toEqual([expect.closeTo(5, 12)])
})

test('two arcs of one circle share the stretch over their common angle', () => {
  const [m, ...more] = intersectEdges(arc(p(1, 2), 4, 0, 2), arc(p(1, 2), 4, 1, 2), TOLERANCE)
  expect(more).toEqual([])
  expect(m.te).toBeWithin(1, { relative: 1e-12 })
  expect(m.to?.te).toBeWithin(2, { relative: 1e-12 })
})

test('ellipses with half-axes 5, 3 and 3, 5 meet in the four points |x| = |y| = 15/√34', () => {
  const found = at(ellipse(0, 0, 5, 3), ellipse(0, 0, 3, 5))
  expect(found.length).toBe(4)
  for (const [x, y] of found) {
    expect(Math.abs(x)).toBeWithin(15 / Math.sqrt(34), { relative: 1e-14 })
    expect(Math.abs(y)).toBeWithin(15 / Math.sqrt(34), { relative: 1e-14 })
  }
})

test('a circle round the end of an ellipse with the radius of curvature there touches it once', () => {
  // half-axes 5 and 3: radius of curvature at the long end 9/5
  const found = at(ellipse(0, 0, 5, 3), circleEdge(5 - 9 / 5, 0, 9 / 5))
  expect(found.length).toBe(1)
  expect(found[0][0]).toBeWithin(5, { absolute: 1e-6 })
})

test('a cubic y = x³ meets the line y = x/4 in −0.5, 0 and 0.5', () => {
  const cubic = bezier([p(-1, -1), p(-1 / 3, 1), p(1 / 3, -1), p(1, 1)])
  const found = at(cubic, lineTo(p(-2, -0.5), p(2, 0.5))).map(([x]) => x)
  expect(found.length).toBe(3)
  for (const [k, x] of [-0.5, 0, 0.5].entries()) expect(found[k]).toBeWithin(x, { absolute: 1e-15 })
})

test('two looped cubics turned against one another meet in the same points whichever comes first', () => {
  const s = bezier([p(0, 0), p(12, 5), p(-8, 5), p(4, 0)])
  const turned = mapped([s], turnAndMove(Math.PI / 2, 4.2, -0.3))[0]
  const found = intersectEdges(s, turned, TOLERANCE)
  const again = intersectEdges(turned, s, TOLERANCE).sort((m, n) => m.tf - n.tf)
  expect(found.length).toBeGreaterThan(0)
  expect(again.length).toBe(found.length)
  for (const [k, m] of found.entries()) expect(again[k].tf).toBeWithin(m.te, { absolute: 1e-9 })
})

test('a rational quadratic quarter circle shares its whole length with the arc it equals', () => {
  const quarter = arc(p(0, 0), 7, 0, Math.PI / 2, p(7, 0), p(0, 7))
  const [asCurve] = asBeziers([quarter], true)
  const [m, ...more] = intersectEdges(quarter, asCurve, 1e-9)
  expect(more).toEqual([])
  expect([m.at, m.to?.at]).toEqual([p(7, 0), p(0, 7)])
})

test('crossings of 200 random lines with an ellipse are those of the circle it is the affine image of, to 1e-12', () => {
  for (let seed = 1; seed <= 200; seed++) {
    const next = random(seed)
    const by: [number, number, number, number, number, number] = [1 + next(), next(), next(), 1 + next(), next(), next()]
    const line = lineTo(p(20 * next() - 10, -12), p(20 * next() - 10, 12))
    const before = intersectEdges(line, circleEdge(0, 0, 6), 1e-10)
    const after = intersectEdges(mapped([line], by)[0], mapped([circleEdge(0, 0, 6)], by)[0], 1e-10)
    expect([seed, after.length]).toEqual([seed, before.length])
    for (const [k, m] of before.entries()) expect(after[k].te).toBeWithin(m.te, { absolute: 1e-12 })
  }
})
