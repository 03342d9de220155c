import { expect, test } from 'vitest'
import { edgeAt } from '@/lib/geometry/edges'
import { random } from '@/tests/support/random'
import { areaOf, Failures, RUNS } from './campaign'
import { arrangementOf, where } from './combine'
import { circle, mapped, rectangle, rounded, type Shape, turnAndMove } from './shapes'

const gridShape = (next: () => number): Shape => {
  const whole = (low: number, high: number) => low + Math.floor(next() * (high - low + 1))
  const [x, y, w, h] = [whole(0, 12), whole(0, 12), 2 * whole(1, 6), 2 * whole(1, 6)]
  const pick = whole(0, 2)
  if (pick === 0) return circle(x, y, whole(1, 6))
  return pick === 1 ? rectangle(x, y, w, h) : rounded(x, y, w, h, whole(1, Math.min(w, h) / 2))
}

test(`${Math.ceil(RUNS / 5)} chains of 8 adds and cuts on a grid keep the areas step by step to 1e-9, turned ones too`, () => {
  const failures = new Failures()
  for (let seed = 1; seed <= Math.ceil(RUNS / 5); seed++) {
    const next = random(seed)
    const by = seed % 2 === 0 ? turnAndMove(6.3 * next(), 3 * next(), 3 * next()) : null
    const place = (shape: Shape) => (by ? mapped(shape, by) : shape)
    let metal = place(gridShape(next))
    for (let step = 0; step < 8; step++) {
      const other = place(gridShape(next))
      const both = arrangementOf([metal, other])
      const [union, common, rest] = [
        where(both, ([p, q]) => p || q),
        where(both, ([p, q]) => p && q),
        where(both, ([p, q]) => p && !q),
      ]
      const [A, B] = [loopsArea(metal), areaOf(other)]
      failures.check(seed, `step ${step} union`, Math.abs(union.area + common.area - A - B), 1e-9 * (A + B))
      failures.check(seed, `step ${step} cut`, Math.abs(rest.area + common.area - A), 1e-9 * (A + B))
      failures.check(seed, `step ${step} open ends`, union.faults + common.faults + rest.faults, 0)
      const { loops } = next() < 0.6 ? union : rest
      metal = Array.from({ length: loops.edges.count }, (_, i) => edgeAt(loops.edges, i))
    }
  }
  failures.expectNone()
})

/** Net area of edges that form any number of loops. */
const loopsArea = (edges: Shape) => (edges.length === 0 ? 0 : where(arrangementOf([edges]), ([p]) => p, 1).area)

test(`${Math.ceil(RUNS / 5)} plates less up to five holes that may cross the edge equal plate − union of the holes to 1e-9`, () => {
  const failures = new Failures()
  for (let seed = 1; seed <= Math.ceil(RUNS / 5); seed++) {
    const next = random(1000 + seed)
    const by = turnAndMove(seed % 2 ? 0 : 6.3 * next(), 0, 0)
    const plate = mapped(rounded(0, 0, 40, 24, 4), by)
    const holes = Array.from({ length: 1 + Math.floor(5 * next()) }, () =>
      mapped(next() < 0.5 ? circle(4 * Math.floor(10 * next()), 4 * Math.floor(6 * next()), 4) : gridShape(next), by),
    )
    const all = arrangementOf([plate, ...holes])
    const count = holes.length + 1
    const net = where(all, ([p, ...q]) => p && !q.some(Boolean), count)
    const cut = where(all, ([p, ...q]) => p && q.some(Boolean), count)
    failures.check(seed, 'net + cut', Math.abs(net.area + cut.area - areaOf(plate)), 1e-9 * areaOf(plate))
    failures.check(seed, 'open ends', net.faults + cut.faults, 0)
  }
  failures.expectNone()
})

test('a pair moved by 1e6 has the area it had to 1e-10', () => {
  for (let seed = 1; seed <= 40; seed++) {
    const next = random(seed)
    const pair = [gridShape(next), gridShape(next)]
    const area = (shapes: Shape[]) => where(arrangementOf(shapes), ([p, q]) => p || q).area
    expect(area(pair.map((s) => mapped(s, [1, 0, 0, 1, 1e6, -1e6])))).toBeWithin(area(pair), { relative: 1e-10 })
  }
})
