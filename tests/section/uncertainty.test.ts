import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { LINE } from '@/lib/geometry/edges'
import type { Region } from '@/lib/geometry/region'
import { transformRegion } from '@/lib/geometry/transform'
import { FIGURES } from '@/lib/section/figures/index'
import { sectionOf } from '@/lib/section/section'
import { randomProfile } from '@/tests/support/profiles'
import { random } from '@/tests/support/random'
import { regionOfProfile } from '@/tests/support/region'

const RUNS = Number(process.env.CAMPAIGN_RUNS ?? 60)

/** The region with every joint moved by up to δ in x and y, both edges of the joint alike. */
function shaken({ edges, loopStart, ...rest }: Region, delta: number, next: () => number): Region {
  const ends = edges.ends.slice()
  for (let loop = 0; loop + 1 < loopStart.length; loop++) {
    for (let i = loopStart[loop]; i < loopStart[loop + 1]; i++) {
      const after = i + 1 < loopStart[loop + 1] ? i + 1 : loopStart[loop]
      for (const k of [0, 1]) {
        const moved = ends[4 * after + k] + delta * (2 * next() - 1)
        ends[4 * after + k] = moved
        ends[4 * i + 2 + k] = moved
      }
    }
  }
  return { edges: { ...edges, ends }, loopStart, ...rest }
}

/** Figures that say where the section lies. */
const placed = (key: string): boolean => /^(extents|centroid|shearCentre)\.|^circle\.[xy]$/.test(key)

describe('the ± from the drawing’s digits', () => {
  test('covers what random polygons’ figures do when every corner moves by its last digit', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 2 ** 31 }), (seed) => {
        const delta = 10 ** -(3 + (seed % 4))
        const next = random(seed ^ 0x1234567)
        const region = regionOfProfile(randomProfile(random(seed), 50, ['line']))
        expect(region.edges.kind.subarray(0, region.edges.count).every((kind) => kind === LINE)).toBe(true)
        const before = sectionOf(region, { lastDigit: delta, repairs: [], density: 2700 }).section
        const after = sectionOf(shaken(region, delta, next), { lastDigit: delta, repairs: [], density: 2700 }).section
        if (!before || !after || before.theta === null || after.theta === null) return
        for (const { key, value } of FIGURES) {
          const was = value(before)
          const is = value(after)
          const { digits, numerics } = before.origin[key]?.plusMinus ?? {}
          if (typeof was !== 'number' || typeof is !== 'number' || digits === undefined) continue
          const turned = key === 'theta' || key.startsWith('freePlastic.angle')
          const off = turned ? Math.abs(((((is - was + 90) % 180) + 180) % 180) - 90) : Math.abs(is - was)
          // a corner may move by √2 δ across an edge
          expect(off, `${key}, seed ${seed}`).toBeLessThanOrEqual(Math.SQRT2 * digits * 1.02 + (numerics ?? 0))
        }
      }),
      { numRuns: RUNS, seed: 20261202 },
    )
  })
})

describe('the ± from the numerics', () => {
  test('covers what moving profiles of every kind of edge 1e6 mm away does to their figures', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 2 ** 31 }), (seed) => {
        const region = regionOfProfile(randomProfile(random(seed)))
        const away = transformRegion(region, { move: { x: 1e6, y: -1e6 } })
        const before = sectionOf(region, { lastDigit: 0, repairs: [] }).section
        const after = sectionOf(away, { lastDigit: 0, repairs: [] }).section
        if (!before || !after) throw new Error('no section')
        for (const { key, value } of FIGURES) {
          const was = value(before)
          const is = value(after)
          const numerics = after.origin[key]?.plusMinus?.numerics
          if (typeof was !== 'number' || typeof is !== 'number' || numerics === undefined || placed(key)) continue
          expect(Math.abs(is - was), `${key}, seed ${seed}`).toBeLessThanOrEqual(numerics)
        }
      }),
      { numRuns: RUNS, seed: 20261203 },
    )
  })
})
