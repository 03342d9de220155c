import { expect, test } from 'vitest'
import { ARC } from '@/lib/geometry/edges'
import { codesOf, Drawn } from './drawn'

/** n chords on a circle of radius r about x, y, from a to b degrees; written to `digits` decimals */
function chords(x: number, y: number, r: number, a: number, b: number, n: number, digits = 15): [number, number][] {
  return Array.from({ length: n + 1 }, (_, k) => {
    const t = ((a + ((b - a) * k) / n) * Math.PI) / 180
    return [Number((x + r * Math.cos(t)).toFixed(digits)), Number((y + r * Math.sin(t)).toFixed(digits))]
  })
}

/** 40 × 20 bar with its right end a half circle of 24 chords */
const bar = (digits: number) => new Drawn().polyline([[0, 0], ...chords(40, 10, 10, -90, 90, 24, digits), [0, 20]])

test('24 chords on a half circle of radius 10 are offered as one arc, with the area it adds', () => {
  const set = bar(15).outlines({ lastDigit: 0 })
  expect(set.arcOffers).toHaveLength(1)
  const [offer] = set.arcOffers
  expect(offer.chords).toBe(24)
  expect(offer.radius).toBeWithin(10, { relative: 1e-12 })
  expect(offer.centre.x).toBeWithin(40, { relative: 1e-12 })
  const delta = Math.PI / 24
  expect(offer.dArea).toBeWithin(24 * 50 * (delta - Math.sin(delta)), { relative: 1e-12 })
  expect(offer.dIy).toBeGreaterThan(0)
  expect(codesOf(set)).toEqual(['chords-on-circle'])
})

test('vertices written to three decimals are still offered, their radius right to 0.001', () => {
  const set = bar(3).outlines()
  expect(set.arcOffers.map(({ chords: n }) => n)).toEqual([24])
  expect(set.arcOffers[0].radius).toBeWithin(10, { absolute: 1e-3 })
})

test('an offer accepted gives the arc: area 800 + 50π to 1e-12, and nothing more is offered', () => {
  const { arcOffers } = bar(15).outlines({ lastDigit: 0 })
  const set = bar(15).outlines({ lastDigit: 0 }, [arcOffers[0].run])
  expect(set.area[0]).toBeWithin(800 + 50 * Math.PI, { relative: 1e-12 })
  expect(set.edges.count).toBe(4)
  expect(set.arcOffers).toEqual([])
  expect(codesOf(set)).toEqual(['arcs-from-chords'])
  expect(set.findings[0].params.area).toBeWithin(arcOffers[0].dArea, { relative: 1e-9 })
})

test('a run accepted is found whichever way the outline is drawn', () => {
  const { run } = bar(15).outlines({ lastDigit: 0 }).arcOffers[0]
  const back = { from: run.to, through: run.through, to: run.from }
  expect(bar(15).outlines({ lastDigit: 0 }, [back]).area[0]).toBeWithin(800 + 50 * Math.PI, { relative: 1e-12 })
})

test('a circle of 36 chords comes as two halves; both accepted give πr²', () => {
  const circle = () => new Drawn().polyline(chords(5, 5, 8, 0, 350, 35))
  const { arcOffers } = circle().outlines({ lastDigit: 0 })
  expect(arcOffers.map(({ chords: n }) => n)).toEqual([18, 18])
  const set = circle().outlines(
    { lastDigit: 0 },
    arcOffers.map(({ run }) => run),
  )
  expect(set.area[0]).toBeWithin(64 * Math.PI, { relative: 1e-12 })
  expect([...set.edges.kind.subarray(0, 2)]).toEqual([ARC, ARC])
})

test('hexagon, octagon, staircase and a coarse parabola are no arcs', () => {
  const steps: [number, number][] = Array.from({ length: 12 }, (_, n) => [Math.ceil(n / 2), Math.floor(n / 2)])
  const parabola: [number, number][] = Array.from({ length: 9 }, (_, n) => [n - 4, (n - 4) ** 2 / 2])
  for (const points of [chords(0, 0, 9, 0, 300, 5), chords(0, 0, 9, 0, 315, 7), [...steps, [0, 6] as [number, number]], parabola])
    expect(new Drawn().polyline(points).outlines({ lastDigit: 0 }).arcOffers).toEqual([])
})

test('two fillets of 6 chords in one outline are two offers, a hole turning the other way takes area', () => {
  const corner = chords(30, 30, 10, 0, 90, 6)
  const other = chords(10, 30, 10, 90, 180, 6)
  const set = new Drawn().polyline([[0, 0], [40, 0], ...corner, ...other]).outlines({ lastDigit: 0 })
  expect(set.arcOffers.map(({ chords: n }) => n)).toEqual([6, 6])
  const notch = new Drawn()
    .polyline([[-20, 0], [20, 0], [20, 20], ...chords(0, 20, 10, 0, -180, 16), [-20, 20]])
    .outlines({ lastDigit: 0 })
  expect(notch.arcOffers).toHaveLength(1)
  expect(notch.arcOffers[0].dArea).toBeLessThan(0)
})

test('a run that is not in the drawing is named and changes nothing', () => {
  const set = bar(15).outlines({ lastDigit: 0 }, [{ from: [100, 100], through: [105, 105], to: [110, 100] }])
  expect(codesOf(set)).toEqual(['arc-run-not-found', 'chords-on-circle'])
})

test('an ellipse of 400 chords is a free curve: no arcs are offered', () => {
  const ellipse = Array.from({ length: 400 }, (_, n): [number, number] => [
    30 * Math.cos((Math.PI * n) / 200),
    12 * Math.sin((Math.PI * n) / 200),
  ])
  expect(new Drawn().polyline(ellipse).outlines({ lastDigit: 0 }).arcOffers).toEqual([])
})
