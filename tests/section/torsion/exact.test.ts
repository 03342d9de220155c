import { expect, test } from 'vitest'
import { pushArc, pushEllipse } from '@/lib/geometry/edges'
import type { Region } from '@/lib/geometry/region'
import { torsionOf } from '@/lib/section/torsion/torsion'
import { type LoopSpec, rectangle, regionOf, regionOfLoops } from '../../support/region'

const QUARTER = Math.SQRT2 - 1

/** An ellipse of half axes a along x and b, as four elliptical arcs; clockwise for a hole. */
const ellipse = (a: number, b: number, sense: 1 | -1 = 1): LoopSpec => ({
  hole: sense < 0,
  push: (table) => {
    for (let q = 0; q < 4; q++) {
      const [start, end] = [(sense * q * Math.PI) / 2, (sense * (q + 1) * Math.PI) / 2]
      const ends: [number, number, number, number] = [
        a * Math.cos(start),
        b * Math.sin(start),
        a * Math.cos(end),
        b * Math.sin(end),
      ]
      if (a === b) pushArc(table, ...ends, 0, 0, a, start, end - start, 0)
      else pushEllipse(table, ...ends, 0, 0, a, 0, 0, b, start, end - start, 0)
    }
  },
})

/** A circular sector of radius 50 over an angle, its corner at the origin, as arcs of at most 90°. */
function sector(degrees: number): Region {
  const pieces = Math.ceil(degrees / 90)
  const step = (degrees * Math.PI) / 180 / pieces
  const arc = Array.from({ length: pieces + 1 }, (_, i): [number, number, number?] => {
    const point: [number, number] = [50 * Math.cos(i * step), 50 * Math.sin(i * step)]
    return i < pieces ? [...point, Math.tan(step / 4)] : point
  })
  return regionOf([[0, 0], ...arc])
}

/** β of J = βb³h, b ≤ h: Saint-Venant's series (Timoshenko & Goodier, Theory of Elasticity, from memory). */
function rectangleJ(b: number, h: number): number {
  let sum = 0
  for (let n = 1; n < 200; n += 2) sum += Math.tanh((n * Math.PI * h) / (2 * b)) / n ** 5
  return (b ** 3 * h * (1 - ((192 * b) / (Math.PI ** 5 * h)) * sum)) / 3
}

/** J = (8α³/π²)r⁴Σ 1/(n²(nπ + 2α)²), n odd: the series of the sector, summed with its tail as an integral. */
function sectorJ(degrees: number, r: number): number {
  const alpha = (degrees * Math.PI) / 180
  let sum = 0
  const last = 200_001
  for (let n = 1; n < last; n += 2) sum += 1 / (n * n * (n * Math.PI + 2 * alpha) ** 2)
  return ((8 * alpha ** 3) / Math.PI ** 2) * r ** 4 * (sum + 1 / (6 * Math.PI ** 2 * last ** 3))
}

const exact: [string, Region, number][] = [
  ['a rectangle 60 × 100', regionOf(rectangle(0, 0, 60, 100)), rectangleJ(60, 100)],
  ['a square of 100', regionOf(rectangle(0, 0, 100, 100)), rectangleJ(100, 100)],
  ['a strip 2 × 200', regionOf(rectangle(0, 0, 200, 2)), rectangleJ(2, 200)],
  ['a strip 0.3 × 200', regionOf(rectangle(0, 0, 0.3, 200)), rectangleJ(0.3, 200)],
  ['an ellipse of half axes 40 and 20', regionOfLoops([ellipse(40, 20)]), (Math.PI * 40 ** 3 * 20 ** 3) / (40 ** 2 + 20 ** 2)],
  ['a tube 100 × 10', regionOfLoops([ellipse(50, 50), ellipse(40, 40, -1)]), (Math.PI * (50 ** 4 - 40 ** 4)) / 2],
  [
    'a hollow of similar ellipses',
    regionOfLoops([ellipse(40, 20), ellipse(32, 16, -1)]),
    ((Math.PI * 40 ** 3 * 20 ** 3) / 2000) * (1 - 0.8 ** 4),
  ],
  [
    'an equilateral triangle of 100',
    regionOf([
      [0, 0],
      [100, 0],
      [50, 50 * Math.sqrt(3)],
    ]),
    (Math.sqrt(3) * 100 ** 4) / 80,
  ],
  [
    'a semicircle of radius 50',
    regionOf([
      [50, 0, 1],
      [-50, 0],
    ]),
    50 ** 4 * (Math.PI / 2 - 4 / Math.PI),
  ],
  [
    'a quarter circle of radius 50',
    regionOf([
      [0, 0],
      [50, 0, QUARTER],
      [0, 50],
    ]),
    50 ** 4 * (Math.PI / 6 - (2 * Math.LN2) / Math.PI),
  ],
  ...[2, 10, 45, 60, 120, 180, 270, 359].map((angle): [string, Region, number] => [
    `a sector of ${angle}°`,
    sector(angle),
    sectorJ(angle, 50),
  ]),
]

test.each(exact)('J of %s lies between bounds a 500th and a 5000th apart', (_name, region, j) => {
  for (const bracket of [0.002, 0.0002]) {
    const torsion = torsionOf(region, { bracket })
    expect(torsion).not.toBeNull()
    if (!torsion) return
    expect(torsion.lower).toBeLessThanOrEqual(j * (1 + 1e-11))
    expect(torsion.upper).toBeGreaterThanOrEqual(j * (1 - 1e-11))
    expect((torsion.upper - torsion.lower) / torsion.upper).toBeLessThanOrEqual(bracket)
  }
})

test('the two bounds close in from both sides: lower and upper never cross on finer meshes', () => {
  const region = regionOf([
    [0, 0],
    [60, 0],
    [60, 10],
    [10, 10],
    [10, 80],
    [0, 80],
  ])
  const all = [0.02, 0.005, 0.001, 0.0002, 0.00005].map((bracket) => torsionOf(region, { bracket }))
  const lower = Math.max(...all.map((torsion) => torsion?.lower ?? Number.NaN))
  const upper = Math.min(...all.map((torsion) => torsion?.upper ?? Number.NaN))
  expect(lower).toBeLessThanOrEqual(upper)
  expect(upper / lower - 1).toBeLessThan(0.0001)
})

// Shear centre after Trefftz, warping constant and shear areas by quadrilaterals of degree 7 to 9 with exact arcs, an independent program.
const shear: [string, Region, number, [number, number, number, number, number, number]][] = [
  ['a rectangle 60 × 100', regionOf(rectangle(0, 0, 60, 100)), 6000, [30, 50, 3.487039e8, 0.8333333, 0.8333333, 0]],
  [
    'a semicircle',
    regionOf([
      [50, 0, 1],
      [-50, 0],
    ]),
    3926.99081699,
    [0, 25.4647909, 9.250055e7, 0.8571429, 0.7661458, 0],
  ],
  [
    'a quarter circle',
    regionOf([
      [0, 0],
      [50, 0, QUARTER],
      [0, 50],
    ]),
    1963.49540849,
    [21.129715, 21.129715, 3.429907e6, 0.8087381, 0.8087381, 0.071044],
  ],
  [
    'an L 80 × 60 × 10',
    regionOf([
      [0, 0],
      [60, 0],
      [60, 10],
      [10, 10],
      [10, 80],
      [0, 80],
    ]),
    1300,
    [5.052164, 6.027704, 1.56155e7, 0.3775349, 0.5217775, 0.0047939],
  ],
  [
    'a U 100 × 50 × 5',
    regionOf([
      [0, 0],
      [50, 0],
      [50, 5],
      [5, 5],
      [5, 95],
      [50, 95],
      [50, 100],
      [0, 100],
    ]),
    950,
    [-15.114938, 50, 3.572761e8, 0.3240522, 0.4275296, 0],
  ],
  [
    'a Z of 100',
    regionOf([
      [-44, 0],
      [6, 0],
      [6, 94],
      [50, 94],
      [50, 100],
      [0, 100],
      [0, 6],
      [-44, 6],
    ]),
    1128,
    [3, 50, 5.739367e8, 0.4187589, 0.4696343, -0.1825],
  ],
]

test.each(shear)(
  'shear centre, warping constant and shear areas of %s agree to 1e-4',
  (_name, region, area, [x, y, warping, kx, ky, axy]) => {
    const torsion = torsionOf(region, { bracket: 0.00002 })
    if (!torsion) throw new Error('no mesh')
    expect(torsion.x).toBeWithin(x, { absolute: 1e-3 })
    expect(torsion.y).toBeWithin(y, { absolute: 1e-3 })
    expect(torsion.warping).toBeWithin(warping, { relative: 1e-4 })
    expect(1 / (area * torsion.shearXX)).toBeWithin(kx, { relative: 1e-4 })
    expect(1 / (area * torsion.shearYY)).toBeWithin(ky, { relative: 1e-4 })
    expect(area * torsion.shearXY).toBeWithin(axy, { absolute: 2e-4 })
  },
)
