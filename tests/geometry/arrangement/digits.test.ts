import { test } from 'vitest'
import { ARC, type Point } from '@/lib/geometry/edges'
import { random } from '@/tests/support/random'
import { areaOf, Failures, perimeterOf, runsOf, VARIANTS, varied } from './campaign'
import { arrangementOf, where } from './combine'
import { KINDS, pairOf } from './pairs'
import { mapped, type Shape, turnAndMove } from './shapes'

/** Ends, centres, radii and angles each rounded as a drawing writes them: ends no longer lie on their carriers. */
function rounded(shape: Shape, unit: number): Shape {
  const r = (v: number) => Math.round(v / unit) * unit
  const p = ({ x, y }: Point) => ({ x: r(x), y: r(y) })
  return shape.map((e) => {
    const ends = { a: p(e.a), b: p(e.b) }
    if (e.kind !== ARC) return { ...e, ...ends }
    const sweep = Math.abs(e.sweep) > 6.28 ? e.sweep : r(e.sweep)
    return { ...e, ...ends, centre: p(e.centre), radius: r(e.radius), start: r(e.start), sweep }
  })
}

for (const variant of VARIANTS) {
  const runs = runsOf(variant)
  test(`${runs} turned pairs with ${variant}, written with 3 to 8 digits, leave no open end and keep areas to the digits`, () => {
    const failures = new Failures()
    for (let seed = 1; seed <= runs; seed++) {
      const next = random(seed)
      const unit = 10 ** -[3, 4, 5, 6, 8][seed % 5]
      const by = turnAndMove(6 * next(), 3 * next(), 3 * next())
      const [a, b] = varied(pairOf(KINDS[seed % KINDS.length], next), variant, next).map((s) => rounded(mapped(s, by), unit))
      const both = arrangementOf([a, b])
      const union = where(both, ([p, q]) => p || q)
      const common = where(both, ([p, q]) => p && q)
      const rest = where(both, ([p, q]) => p && !q)
      const [A, B] = [areaOf(a), areaOf(b)]
      const allowed = 3 * unit * (perimeterOf(a) + perimeterOf(b)) + 1e-9 * (A + B)
      failures.check(seed, `union + common at ${unit}`, Math.abs(union.area + common.area - A - B), allowed)
      failures.check(seed, `A − B at ${unit}`, Math.abs(rest.area + common.area - A), allowed)
      failures.check(seed, `open ends at ${unit}`, union.faults + common.faults + rest.faults, 0)
    }
    failures.expectNone()
  })
}
