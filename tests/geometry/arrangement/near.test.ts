import { expect, test } from 'vitest'
import { random } from '@/tests/support/random'
import { areaOf, Failures, perimeterOf, runsOf, VARIANTS, varied } from './campaign'
import { arrangementOf, where } from './combine'
import { type Kind, pairOf } from './pairs'
import { mapped, polygon, rectangle, turnAndMove } from './shapes'

const TOUCHING: Kind[] = ['shared edge', 'tangent outside', 'tangent inside', 'coincident arcs', 'vertex touch', 'identical']

for (const variant of VARIANTS) {
  const runs = runsOf(variant)
  test(`${runs} touching pairs with ${variant}, moved or turned by 1e-13 … 1e-3, keep their areas to the displacement and close`, () => {
    const failures = new Failures()
    for (let n = 1; n <= runs; n++) {
      const next = random(n)
      const [a, b] = varied(pairOf(TOUCHING[n % TOUCHING.length], next), variant, next)
      const by = 10 ** (-13 + (n % 11))
      const way = 6.3 * next()
      const near = mapped(b, next() < 0.5 ? turnAndMove(0, by * Math.cos(way), by * Math.sin(way)) : turnAndMove(by, 0, 0))
      const [exact, moved] = [arrangementOf([a, b]), arrangementOf([a, near])]
      const union = where(moved, ([p, q]) => p || q)
      const common = where(moved, ([p, q]) => p && q)
      const aOnly = where(moved, ([p, q]) => p && !q)
      const [A, B] = [areaOf(a), areaOf(near)]
      failures.check(n, `union + common at ${by}`, Math.abs(union.area + common.area - A - B), 1e-8 * (A + B))
      failures.check(n, `A − B at ${by}`, Math.abs(aOnly.area + common.area - A), 1e-8 * (A + B))
      failures.check(n, 'open ends', union.faults + common.faults + aOnly.faults, 0)
      const reach = 60 // turned about the origin, no point of the pair lies further from it
      const allowed = by * reach * perimeterOf(b) + 2 * moved.tolerance * (perimeterOf(a) + perimeterOf(b))
      const before = where(exact, ([p, q]) => p || q).area
      failures.check(n, `union against the unmoved at ${by}`, Math.abs(union.area - before), allowed)
    }
    failures.expectNone()
  })
}

test('a square moved by 1e-10 of its size against itself is still one square of four edges', () => {
  const a = rectangle(0, 0, 10, 10)
  const { loops, area } = where(arrangementOf([a, mapped(a, turnAndMove(0, 1e-9, 1e-9))]), ([p, q]) => p || q)
  expect(loops.edges.count).toBe(4)
  expect(area).toBe(100)
})

test('three lines through nearly one point leave no open end at any spacing from 1e-12 to 1e-5', () => {
  for (let e = -12; e <= -5; e++) {
    const d = 10 ** e
    const a = polygon([0, 0], [10, 0], [10, 10], [0, 10])
    const b = polygon([0, 0], [10, 10 + d], [-5, 12])
    const c = polygon([5, -3], [5 + d, 5], [5, 14], [-3, 5])
    const all = arrangementOf([a, b, c])
    const union = where(all, (held) => held.some(Boolean), 3)
    const odd = where(all, (held) => held.filter(Boolean).length % 2 === 1, 3)
    expect(union.faults + odd.faults).toBe(0)
  }
})
