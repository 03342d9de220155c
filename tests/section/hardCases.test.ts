import { describe, expect, test } from 'vitest'
import { emptyTable, pushArc, pushLine } from '@/lib/geometry/edges'
import type { Region } from '@/lib/geometry/region'
import { transformRegion } from '@/lib/geometry/transform'
import { frameAt } from '@/lib/section/frame'
import { momentsOf } from '@/lib/section/moments'
import { sectionOf } from '@/lib/section/section'
import type { Section } from '@/lib/section/types'
import { beziers, circle, rectangle, regionOf, regionOfLoops, type Vertex } from '@/tests/support/region'

function sectionFor(region: Region, lastDigit = 0): Section {
  const { section } = sectionOf(region, { lastDigit, repairs: [] })
  if (!section) throw new Error('no section')
  return section
}

describe('far origins and thin shapes', () => {
  test('a 50 mm square cornered at (1e6, 1e6) keeps Ix = 520833.333 to 1e-14 and its centroid to the last digit', () => {
    const s = sectionFor(regionOf(rectangle(1e6, 1e6, 50, 50)))
    expect(s.ix).toBeWithin(50 ** 4 / 12, { relative: 1e-14 })
    expect(s.centroid).toEqual({ x: 1000025, y: 1000025 })
    expect(s.elastic.xTop).toBeWithin(50 ** 3 / 6, { relative: 1e-14 })
    expect(s.plastic.x).toBeWithin(50 ** 3 / 4, { relative: 1e-14 })
    expect(s.circle.radius).toBeWithin(25 * Math.SQRT2, { relative: 1e-14 })
  })

  // bd³/12 in the strip's own axes; what is lost is the rounding of its corners, 1e-13 mm on a thickness of 0.3 mm
  test.each([1, 17.3, 44.999, 60, 89.9])(
    'a strip 800 × 0.3 turned by %d° keeps I2 = bt³/12 to 1e-10 and θ across it to 1e-12°',
    (turn) => {
      const s = sectionFor(transformRegion(regionOf(rectangle(0, 0, 800, 0.3)), { turn }))
      expect(s.i2).toBeWithin((800 * 0.3 ** 3) / 12, { relative: 1e-10 })
      expect(s.i1).toBeWithin((0.3 * 800 ** 3) / 12, { relative: 1e-11 })
      expect(s.theta).toBeWithin(turn - 90, { absolute: 1e-12 })
      expect(s.plastic.axis2).toBeWithin((800 * 0.3 ** 2) / 4, { relative: 1e-9 })
      expect(s.elastic.axis2Left).toBeWithin((800 * 0.3 ** 2) / 6, { relative: 1e-9 })
    },
  )

  test('from Ix, Iy, Ixy alone the turned strip’s I2 would have lost ten digits', () => {
    const region = transformRegion(regionOf(rectangle(0, 0, 800, 0.003)), { turn: 30 })
    const s = sectionFor(region)
    const wanted = (800 * 0.003 ** 3) / 12
    const plain = (s.ix + s.iy) / 2 - Math.hypot((s.ix - s.iy) / 2, s.ixy)
    expect(s.i2).toBeWithin(wanted, { relative: 1e-8 })
    expect(Math.abs(plain - wanted) / wanted).toBeGreaterThan(1e-6)
  })

  test('an arc of radius 1e9 mm over a chord of 100 mm keeps the area of its 1.25e-6 mm sagitta’s segment', () => {
    const bow: Vertex[] = [
      [0, 0],
      [100, 0],
      [100, 10],
      [0, 10],
    ]
    const sweep = 2 * Math.asin(50 / 1e9)
    const table = emptyTable()
    bow.forEach(([x, y], i) => {
      const [nextX, nextY] = bow[(i + 1) % 4]
      if (i === 0) pushArc(table, x, y, nextX, nextY, 50, Math.sqrt(1e18 - 2500), 1e9, -Math.PI / 2 - sweep / 2, sweep, 0)
      else pushLine(table, x, y, nextX, nextY, 0)
    })
    const { area } = momentsOf(table, 0, table.count, frameAt(50, 5))
    // ⅔ × chord × sagitta, the next term is 1e-16 of it; 1000 mm² leave 1e-13 of rounding
    expect(area - 1000).toBeWithin((2 / 3) * 100 * 1.25e-6, { absolute: 3e-13 })
  })

  test('an arc of 359.9° closed by its chord has the circle’s area but for a segment of 1.4e-7 mm²', () => {
    const sweep = (359.9 * Math.PI) / 180
    const r = 20
    const table = emptyTable()
    const at = (a: number): [number, number] => [r * Math.cos(a), r * Math.sin(a)]
    pushArc(table, ...at(0), ...at(sweep), 0, 0, r, 0, sweep, 0)
    pushLine(table, ...at(sweep), ...at(0), 0)
    const region = { ...regionOf(rectangle(0, 0, 1, 1)), edges: table, loopStart: Uint32Array.of(0, 2) }
    const s = sectionFor(region)
    const gap = 2 * Math.PI - sweep
    expect(s.area).toBeWithin(Math.PI * r * r - (r * r * (gap - Math.sin(gap))) / 2, { relative: 1e-14 })
    expect(s.extents.maxX).toBeWithin(r, { relative: 1e-15 })
    expect(s.circle.radius).toBeWithin(r, { relative: 1e-12 })
  })

  test('ends snapped 0.004 mm off their arcs close the loop: turned and moved, the area stays to 1e-12', () => {
    const table = emptyTable()
    pushLine(table, 0, 0, 40.003, 0.002, 0)
    pushArc(table, 40.003, 0.002, 0.004, -0.001, 20, 0, 20, 0, Math.PI, 0)
    pushLine(table, 0.004, -0.001, 0, 0, 0)
    const region: Region = { ...regionOf(rectangle(0, 0, 1, 1)), edges: table, loopStart: Uint32Array.of(0, 3) }
    const before = sectionFor(region)
    const after = sectionFor(transformRegion(region, { turn: 77, move: { x: 900, y: -300 } }))
    expect(after.area).toBeWithin(before.area, { relative: 1e-12 })
    expect(after.ip).toBeWithin(before.ip, { relative: 1e-11 })
    expect(before.area).toBeWithin(0.5 * Math.PI * 400, { absolute: 0.004 * 120 })
  })

  test('ten thousand short lines along a circle come to the polygon’s area ½nr² sin(2π/n) to 1e-14', () => {
    const n = 10_000
    const region = regionOf(
      Array.from({ length: n }, (_, k): Vertex => [50 * Math.cos((2 * Math.PI * k) / n), 50 * Math.sin((2 * Math.PI * k) / n)]),
    )
    const s = sectionFor(region)
    expect(s.area).toBeWithin(0.5 * n * 2500 * Math.sin((2 * Math.PI) / n), { relative: 1e-14 })
    expect(s.theta).toBeNull()
    expect(s.plastic.x).toBeWithin((4 * 50 ** 3) / 3, { relative: 1e-6 })
  })
})

describe('every axis principal', () => {
  test('a square and a hexagon have no θ and no moduli about axes 1 and 2, but I1 and I2', () => {
    const hexagon = Array.from(
      { length: 6 },
      (_, k): Vertex => [30 * Math.cos((k * Math.PI) / 3), 30 * Math.sin((k * Math.PI) / 3)],
    )
    for (const region of [regionOf(rectangle(3, 4, 20, 20)), regionOf(hexagon)]) {
      const { section, findings } = sectionOf(region, { lastDigit: 0, repairs: [] })
      expect(section?.theta).toBeNull()
      expect(section?.elastic.axis1Left).toBeNull()
      expect(section?.plastic.axis2).toBeNull()
      expect(section?.plasticShape.axis1).toBeNull()
      expect(section?.i1).toBeWithin(section?.ix ?? 0, { relative: 1e-12 })
      expect(findings.map(({ code }) => code)).toEqual(['all-axes-principal'])
      expect(section?.origin).not.toHaveProperty('theta')
    }
  })

  test('40 × 40.0001 has its axis upright when exact, none when the drawing is written to 0.001', () => {
    const region = regionOf(rectangle(0, 0, 40, 40.0001))
    expect(sectionFor(region).theta).toBe(0)
    expect(sectionFor(region, 0.0005).theta).toBeNull()
  })

  test('an upright turned by −90° + 1e-12° is still given as +90°, one by −89.99° is not', () => {
    const flat = regionOf(rectangle(0, 0, 50, 100))
    expect(sectionFor(transformRegion(flat, { turn: -90 + 1e-12 })).theta).toBeWithin(90, { absolute: 1e-9 })
    expect(sectionFor(transformRegion(flat, { turn: -89.99 })).theta).toBeWithin(-89.99, { absolute: 1e-9 })
    expect(sectionFor(transformRegion(flat, { turn: 90 })).theta).toBe(90)
    expect(sectionFor(transformRegion(flat, { turn: -89.999 }), 0.0005).theta).toBeWithin(-89.999, { absolute: 1e-9 })
  })
})

describe('circumscribing circle', () => {
  test('a stadium 100 × 40 has its circle of radius 50 through the two arcs, at its middle', () => {
    const stadium = regionOf([
      [-30, -20],
      [30, -20, 1],
      [30, 20],
      [-30, 20, 1],
    ])
    const { circle: c } = sectionFor(transformRegion(stadium, { turn: 33, move: { x: 7, y: -4 } }))
    expect(c.radius).toBeWithin(50, { relative: 1e-12 })
    expect(c.x).toBeWithin(7, { absolute: 1e-10 })
    expect(c.y).toBeWithin(-4, { absolute: 1e-10 })
  })

  test('three discs of radius 10 at the corners of a triangle of side 80 are held by 10 + 80/√3', () => {
    const at = [0, 1, 2].map((k) => [
      (80 / Math.sqrt(3)) * Math.cos(1 + (2 * k * Math.PI) / 3),
      (80 / Math.sqrt(3)) * Math.sin(1 + (2 * k * Math.PI) / 3),
    ])
    const region = regionOfLoops(at.map(([x, y], piece) => ({ ...circle(x, y, 10), piece })))
    const { circle: c } = sectionFor(region)
    expect(c.radius).toBeWithin(10 + 80 / Math.sqrt(3), { relative: 1e-12 })
    expect(Math.hypot(c.x, c.y)).toBeWithin(0, { absolute: 1e-10 })
  })

  test('an acute triangle is held by its circumcircle abc/4A, an obtuse one by its longest side', () => {
    const acute = sectionFor(
      regionOf([
        [0, 0],
        [90, 0],
        [30, 70],
      ]),
    )
    const sides = Math.hypot(30, 70) * Math.hypot(60, 70) * 90
    expect(acute.circle.radius).toBeWithin(sides / (4 * acute.area), { relative: 1e-13 })
    const obtuse = regionOf([
      [0, 0],
      [90, 0],
      [30, 10],
    ])
    expect(sectionFor(obtuse).circle).toEqual({ x: 45, y: 0, radius: 45 })
  })
})

describe('plus and minus, and origin', () => {
  test('the digits’ ± of A is δ × perimeter and covers what moving every edge by δ really does', () => {
    const delta = 0.005
    const s = sectionFor(regionOf(rectangle(0, 0, 60, 100)), delta)
    expect(s.origin.area.plusMinus?.digits).toBeWithin(delta * 320, { relative: 1e-12 })
    const grown = sectionFor(regionOf(rectangle(-delta, -delta, 60 + 2 * delta, 100 + 2 * delta)))
    for (const key of ['area', 'ix', 'iy', 'i1', 'i2'] as const) {
      const bound = s.origin[key].plusMinus?.digits ?? 0
      expect(Math.abs(grown[key] - s[key])).toBeLessThanOrEqual(bound * 1.001)
      expect(Math.abs(grown[key] - s[key])).toBeGreaterThan(bound * 0.5)
    }
    expect(Math.abs(grown.elastic.xTop - s.elastic.xTop)).toBeLessThanOrEqual(s.origin['elastic.xTop'].plusMinus?.digits ?? 0)
    expect(Math.abs(grown.plastic.x - s.plastic.x)).toBeLessThanOrEqual(s.origin['plastic.x'].plusMinus?.digits ?? 0)
    expect(Math.abs(grown.circle.radius - s.circle.radius)).toBeLessThanOrEqual(
      2 * (s.origin['circle.radius'].plusMinus?.digits ?? 0),
    )
  })

  test('a repair of 0.02 mm² at the top counts 0.02 in A and 0.02 × 50² in Ix, nothing in digits of an exact drawing', () => {
    const { section } = sectionOf(regionOf(rectangle(0, 0, 60, 100)), {
      lastDigit: 0,
      repairs: [{ x: 30, y: 100, gap: 0.004, area: -0.02 }],
    })
    expect(section?.origin.area.plusMinus).toMatchObject({ repairs: 0.02 })
    expect(section?.origin.ix.plusMinus?.repairs).toBeWithin(50, { relative: 1e-12 })
    expect(section?.origin.ix.plusMinus?.digits).toBeUndefined()
  })

  test('lines and arcs are exact but for plastic figures and the circle; a rational spline makes all iterated', () => {
    const kinds = (region: Region) => sectionFor(region).origin
    const lines = kinds(regionOf(rectangle(0, 0, 60, 100)))
    expect(lines.ix.kind).toBe('exact')
    expect(lines['perimeter.outer'].kind).toBe('exact')
    expect(lines['plastic.x'].kind).toBe('iterated')
    const w = Math.SQRT1_2
    const disc = kinds(
      regionOfLoops([
        beziers([
          [
            [10, 0, 1],
            [10, 10, w],
            [0, 10, 1],
          ],
          [
            [0, 10, 1],
            [-10, 10, w],
            [-10, 0, 1],
          ],
          [
            [-10, 0, 1],
            [-10, -10, w],
            [0, -10, 1],
          ],
          [
            [0, -10, 1],
            [10, -10, w],
            [10, 0, 1],
          ],
        ]),
      ]),
    )
    expect(disc.ix.kind).toBe('iterated')
    expect(disc.area.kind).toBe('iterated')
  })

  test('a polynomial spline leaves A and Ix exact, extremes and perimeter iterated', () => {
    const k = 0.55
    const blob = regionOfLoops([
      beziers([
        [
          [10, 0, 1],
          [10, 10 * k, 1],
          [10 * k, 10, 1],
          [0, 10, 1],
        ],
        [
          [0, 10, 1],
          [-10 * k, 10, 1],
          [-10, 10 * k, 1],
          [-10, 0, 1],
        ],
        [
          [-10, 0, 1],
          [-10, -10 * k, 1],
          [-10 * k, -10, 1],
          [0, -10, 1],
        ],
        [
          [0, -10, 1],
          [10 * k, -10, 1],
          [10, -10 * k, 1],
          [10, 0, 1],
        ],
      ]),
    ])
    const { origin } = sectionFor(blob)
    expect(origin.area.kind).toBe('exact')
    expect(origin.ix.kind).toBe('exact')
    expect(origin['elastic.xTop'].kind).toBe('iterated')
    expect(origin['perimeter.outer'].kind).toBe('iterated')
    expect(origin['extents.maxY'].kind).toBe('iterated')
  })

  test('a rational circle of four pieces has A = πr², Ix = πr⁴/4 and perimeter 2πr to 1e-13', () => {
    const w = Math.SQRT1_2
    const s = sectionFor(
      regionOfLoops([
        beziers([
          [
            [10, 0, 1],
            [10, 10, w],
            [0, 10, 1],
          ],
          [
            [0, 10, 1],
            [-10, 10, w],
            [-10, 0, 1],
          ],
          [
            [-10, 0, 1],
            [-10, -10, w],
            [0, -10, 1],
          ],
          [
            [0, -10, 1],
            [10, -10, w],
            [10, 0, 1],
          ],
        ]),
      ]),
    )
    expect(s.area).toBeWithin(Math.PI * 100, { relative: 1e-13 })
    expect(s.ix).toBeWithin((Math.PI * 1e4) / 4, { relative: 1e-13 })
    expect(s.perimeter.outer).toBeWithin(20 * Math.PI, { relative: 1e-13 })
    expect(s.plastic.x).toBeWithin(4000 / 3, { relative: 1e-12 })
    expect(s.circle.radius).toBeWithin(10, { relative: 1e-12 })
  })
})

describe('no metal', () => {
  test('a hair of 1e-9 mm at 1e6 mm from the origin is refused as too thin, not computed from rounding', () => {
    const { section, findings } = sectionOf(regionOf(rectangle(1e6, 1e6, 50, 1e-9)), { lastDigit: 0, repairs: [] })
    expect(section).toBeNull()
    expect(findings.map(({ code, severity }) => [code, severity])).toEqual([['too-thin', 'error']])
  })

  test('an empty region and one of negative area give no section but a finding', () => {
    const empty: Region = {
      ...regionOf(rectangle(0, 0, 1, 1)),
      edges: emptyTable(),
      loopStart: Uint32Array.of(0),
      hole: new Uint8Array(0),
    }
    const hollow = regionOf([...rectangle(0, 0, 10, 10)].reverse())
    for (const region of [empty, hollow]) {
      const { section, findings } = sectionOf(region, { lastDigit: 0, repairs: [] })
      expect(section).toBeNull()
      expect(findings.map(({ code }) => code)).toEqual(['no-metal'])
    }
  })
})
