import { describe, expect, test } from 'vitest'
import { aboutAxis } from '@/lib/section/axis'
import { bundlesOf } from '@/lib/section/bundles'
import { sectionOf } from '@/lib/section/section'
import { shareOf } from '@/lib/section/share'
import { EXACT_SHAPES } from '@/tests/support/exactCases'
import { randomProfile } from '@/tests/support/profiles'
import { random } from '@/tests/support/random'
import { regionOfProfile } from '@/tests/support/region'

describe('figures about a placed and turned axis', () => {
  test('a rectangle about its base has bh³/3, Wel bh²/3 above and no metal below', () => {
    const figures = aboutAxis(bundlesOf(EXACT_SHAPES.R1), { x: 30, y: 0, angle: 0 })
    expect(figures.iu).toBeWithin((60 * 100 ** 3) / 3, { relative: 1e-14 })
    expect(figures.elastic.left).toBeWithin((60 * 100 ** 2) / 3, { relative: 1e-14 })
    expect(figures.elastic.right).toBeNull()
    expect(figures.iuCentroid).toBeWithin(5000000, { relative: 1e-14 })
    expect(figures.plastic).toEqual({ modulus: 150000, offset: 50 })
    expect(figures.centroid).toEqual({ u: 0, v: 50 })
  })

  test('about axis 1 through the centroid the L has I1 983085.747609, no product, and the moduli of axis 1', () => {
    const { section } = sectionOf(EXACT_SHAPES.L, { lastDigit: 0, repairs: [] })
    const { x, y } = section?.centroid ?? { x: 0, y: 0 }
    const figures = aboutAxis(bundlesOf(EXACT_SHAPES.L), { x, y, angle: section?.theta ?? 0 })
    expect(figures.iu).toBeWithin(983085.747609, { relative: 1e-12 })
    expect(figures.iv).toBeWithin(212427.072903, { relative: 1e-11 })
    expect(figures.iuv).toBeWithin(0, { absolute: 1e-8 })
    expect(figures.elastic.left).toBeWithin(17914.456567, { relative: 1e-10 })
    expect(figures.elastic.right).toBeWithin(22314.868378, { relative: 1e-10 })
    expect(figures.plastic.modulus).toBeWithin(31126.680296, { relative: 1e-10 })
  })

  test('a rectangle turned by 30° has Iu = Ix cos² + Iy sin² and Iuv = −(Ix − Iy) sin cos of the turn seen from it', () => {
    const figures = aboutAxis(bundlesOf(EXACT_SHAPES.R2), { x: 25, y: 50, angle: -30 })
    expect(figures.iu).toBeWithin(3385416.666667, { relative: 1e-12 })
    expect(figures.iuv).toBeWithin(-1353164.693413, { relative: 1e-12 })
  })

  test('a full turn of the axis about any point comes back to itself', () => {
    const bundles = bundlesOf(EXACT_SHAPES.Z)
    const first = aboutAxis(bundles, { x: 12, y: -7, angle: 23 })
    const again = aboutAxis(bundles, { x: 12, y: -7, angle: 383 })
    expect(again.iu).toBeWithin(first.iu, { relative: 1e-12 })
    expect(again.plastic.offset).toBeWithin(first.plastic.offset, { relative: 1e-9 })
  })
})

describe('share of a second moment by distance from the axis', () => {
  test('of a rectangle, the outer fifths make 2 × 39.2 % of Ix and the middle fifth 0.8 %', () => {
    const bands = shareOf(bundlesOf(EXACT_SHAPES.R1), 0, 'x', 5)
    // ∫v² over a band of ±h/2: (0.5³ − 0.3³)/(2 × 0.5³) = 0.392 and 0.1³/0.5³ = 0.008
    expect(bands[0].share).toBeWithin(0.392, { relative: 1e-13 })
    expect(bands[4].share).toBeWithin(0.392, { relative: 1e-13 })
    expect(bands[2].share).toBeWithin(0.008, { relative: 1e-12 })
    expect(bands[2].area).toBeWithin(1200, { relative: 1e-13 })
    expect(bands[0].from).toBe(-50)
    expect(bands[4].to).toBe(50)
  })

  test('of the I, the two flanges of 10 mm make 86.1 % of Ix on 64.9 % of the area', () => {
    const bands = shareOf(bundlesOf(EXACT_SHAPES.I), 0, 'x', 20)
    const flange = (100 * 10 ** 3) / 12 + 1000 * 95 ** 2
    expect(bands[0].share + bands[19].share).toBeWithin((2 * flange) / (20982666 + 2 / 3), { relative: 1e-12 })
    expect(bands[0].area + bands[19].area).toBeWithin(2000, { relative: 1e-12 })
  })

  test.each(Array.from({ length: 12 }, (_, k) => 1000 + k))(
    'profile of seed %d: shares sum to 1 and areas to A about x, y, 1 and 2',
    (seed) => {
      const region = regionOfProfile(randomProfile(random(seed)))
      const { section } = sectionOf(region, { lastDigit: 0, repairs: [] })
      const bundles = bundlesOf(region)
      for (const axis of ['x', 'y', 'axis1', 'axis2'] as const) {
        const bands = shareOf(bundles, section?.theta ?? null, axis, 16)
        expect(bands.reduce((sum, { share }) => sum + share, 0)).toBeWithin(1, { absolute: 1e-12 })
        expect(bands.reduce((sum, { area }) => sum + area, 0)).toBeWithin(section?.area ?? 0, { relative: 1e-12 })
        for (const { share } of bands) expect(share).toBeGreaterThan(-1e-12)
      }
    },
  )
})
