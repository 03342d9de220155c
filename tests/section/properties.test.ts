import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { Region } from '@/lib/geometry/region'
import { type Similarity, transformRegion } from '@/lib/geometry/transform'
import { sectionOf } from '@/lib/section/section'
import type { Section } from '@/lib/section/types'
import { randomProfile, splitRandomly } from '@/tests/support/profiles'
import { random } from '@/tests/support/random'
import { regionOfProfile } from '@/tests/support/region'

const RUNS = Number(process.env.CAMPAIGN_RUNS ?? 60)

const seeds = (property: (seed: number) => void) =>
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 2 ** 31 }), (seed) => property(seed)),
    { numRuns: RUNS, seed: 20261201 },
  )

function sectionFor(region: Region): Section {
  const { section } = sectionOf(region, { lastDigit: 0, repairs: [] })
  if (!section) throw new Error('no section')
  return section
}

const profileFor = (seed: number) => randomProfile(random(seed))

/** θ and the angle wanted, as the same axis: modulo 180°. */
const halfTurns = (angle: number): number => Math.abs(((((angle + 90) % 180) + 180) % 180) - 90)

/** What a similarity must do to every figure that it cannot change but in size. */
function expectMoved(before: Section, after: Section, { scale, turn, mirror }: Required<Similarity>): void {
  const relative = 1e-9
  const size = after.circle.radius
  expect(after.area).toBeWithin(before.area * scale ** 2, { relative })
  expect(after.perimeter.outer).toBeWithin(before.perimeter.outer * scale, { relative })
  expect(after.perimeter.inner).toBeWithin(before.perimeter.inner * scale, { relative })
  expect(after.ip).toBeWithin(before.ip * scale ** 4, { relative })
  expect(after.i1).toBeWithin(before.i1 * scale ** 4, { relative })
  expect(after.i2).toBeWithin(before.i2 * scale ** 4, { relative })
  expect(after.circle.radius).toBeWithin(before.circle.radius * scale, { relative })
  if (before.theta === null || after.theta === null) {
    expect(after.theta).toBe(before.theta)
    return
  }
  const sense = mirror ? -1 : 1
  const sensitivity = before.ip / (before.i1 - before.i2)
  expect(halfTurns(after.theta - (sense * before.theta + turn))).toBeWithin(0, { absolute: 6e-8 * sensitivity })
  expect(after.plastic.axis1).toBeWithin((before.plastic.axis1 ?? 0) * scale ** 3, { relative: relative * sensitivity })
  expect(after.plastic.axis2).toBeWithin((before.plastic.axis2 ?? 0) * scale ** 3, { relative: relative * sensitivity })
  expect(Math.abs(after.plastic.at.axis1 ?? 0)).toBeWithin(Math.abs(before.plastic.at.axis1 ?? 0) * scale, {
    absolute: 1e-8 * size * sensitivity,
  })
  const fibres = ({ elastic: e }: Section) =>
    [
      [e.axis1Left, e.axis1Right],
      [e.axis2Left, e.axis2Right],
    ].map((pair) => pair.map(Number).sort((a, b) => a - b))
  for (const [k, pair] of fibres(after).entries()) {
    for (const [j, value] of pair.entries()) {
      expect(value).toBeWithin(fibres(before)[k][j] * scale ** 3, { relative: 2e-9 * sensitivity })
    }
  }
}

describe('random profiles of lines, arcs, elliptical arcs and splines', () => {
  test('moved, turned, scaled and mirrored, every figure follows to 1e-9', () => {
    seeds((seed) => {
      const next = random(seed ^ 0x5bd1e995)
      const region = regionOfProfile(profileFor(seed))
      const move: Required<Similarity> = {
        move: { x: 2e3 * (next() - 0.5), y: 2e3 * (next() - 0.5) },
        scale: 10 ** (4 * next() - 2),
        turn: 360 * next(),
        mirror: next() < 0.5,
      }
      expectMoved(sectionFor(region), sectionFor(transformRegion(region, move)), move)
    })
  })

  test('a quarter turn swaps Ix and Iy, top becomes left, and the sign of Ixy changes', () => {
    seeds((seed) => {
      const region = regionOfProfile(profileFor(seed))
      const before = sectionFor(region)
      const after = sectionFor(transformRegion(region, { turn: 90 }))
      const relative = 1e-11
      expect(after.ix).toBeWithin(before.iy, { relative })
      expect(after.iy).toBeWithin(before.ix, { relative })
      expect(after.ixy).toBeWithin(-before.ixy, { absolute: relative * before.ip })
      expect(after.elastic.yLeft).toBeWithin(before.elastic.xTop, { relative })
      expect(after.elastic.xTop).toBeWithin(before.elastic.yRight, { relative })
      expect(after.plastic.y).toBeWithin(before.plastic.x, { relative: 1e-9 })
      expect(after.plastic.at.y).toBeWithin(-before.plastic.at.x, { absolute: 1e-9 * before.circle.radius })
      expect(after.freePlastic.y).toBeWithin(before.freePlastic.x, { relative: 1e-9 })
    })
  })

  test('mirrored, Ixy and θ change sign and right becomes left', () => {
    seeds((seed) => {
      const region = regionOfProfile(profileFor(seed))
      const before = sectionFor(region)
      const after = sectionFor(transformRegion(region, { mirror: true }))
      expect(after.ixy).toBeWithin(-before.ixy, { absolute: 1e-12 * before.ip })
      expect(after.elastic.yLeft).toBeWithin(before.elastic.yRight, { relative: 1e-12 })
      expect(after.elastic.xTop).toBeWithin(before.elastic.xTop, { relative: 1e-12 })
    })
  })

  test('edges cut in pieces change nothing beyond 1e-11', () => {
    seeds((seed) => {
      const profile = profileFor(seed)
      const next = random(seed ^ 0x2545f491)
      const before = sectionFor(regionOfProfile(profile))
      const cut = profile.map(({ outline, depth }) => ({ outline: splitRandomly(next, outline), depth }))
      const after = sectionFor(regionOfProfile(cut))
      const relative = 1e-11
      for (const key of ['area', 'ix', 'iy', 'ip', 'i1', 'i2', 'rx', 'ry'] as const)
        expect(after[key]).toBeWithin(before[key], { relative })
      expect(after.perimeter.outer).toBeWithin(before.perimeter.outer, { relative })
      expect(after.plastic.x).toBeWithin(before.plastic.x, { relative: 1e-9 })
      expect(after.circle.radius).toBeWithin(before.circle.radius, { relative: 1e-10 })
      expect(after.elastic.xTop).toBeWithin(before.elastic.xTop, { relative: 1e-10 })
    })
  })

  test('a hole and its plug make the solid: area and second moments about one point add up to 1e-12', () => {
    seeds((seed) => {
      const [solid, ...inner] = profileFor(seed)
      const holes = inner.filter(({ depth }) => depth === 1)
      const whole = sectionFor(regionOfProfile([solid]))
      const parts = [
        sectionFor(regionOfProfile([solid, ...holes])),
        ...holes.map(({ outline }) => sectionFor(regionOfProfile([{ outline, depth: 0 }]))),
      ]
      const about = (value: (s: Section) => number) => parts.reduce((sum, s) => sum + value(s), 0)
      const { x, y } = whole.centroid
      expect(about((s) => s.area)).toBeWithin(whole.area, { relative: 1e-12 })
      expect(about((s) => s.ix + s.area * (s.centroid.y - y) ** 2)).toBeWithin(whole.ix, { relative: 1e-11 })
      expect(about((s) => s.iy + s.area * (s.centroid.x - x) ** 2)).toBeWithin(whole.iy, { relative: 1e-11 })
    })
  })

  test('order of size: I1 ≥ Ix, Iy ≥ I2; plastic exceeds elastic; free plastic lies between elastic and plastic', () => {
    seeds((seed) => {
      const s = sectionFor(regionOfProfile(profileFor(seed)))
      const slack = 1e-12 * s.ip
      expect(s.i1).toBeGreaterThanOrEqual(Math.max(s.ix, s.iy) - slack)
      expect(s.i2).toBeLessThanOrEqual(Math.min(s.ix, s.iy) + slack)
      expect(s.i1 + s.i2).toBeWithin(s.ip, { relative: 1e-13 })
      expect(s.plasticShape.x).toBeGreaterThan(1)
      expect(s.plasticShape.y).toBeGreaterThan(1)
      expect(s.freePlastic.x).toBeLessThanOrEqual(s.plastic.x * (1 + 1e-9))
      expect(s.freePlastic.y).toBeLessThanOrEqual(s.plastic.y * (1 + 1e-9))
    })
  })
})
