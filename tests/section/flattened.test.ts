import { describe, expect, test } from 'vitest'
import { newJet, jetAt } from '@/lib/geometry/evaluate'
import type { Region } from '@/lib/geometry/region'
import { sectionOf } from '@/lib/section/section'
import { randomProfile } from '@/tests/support/profiles'
import { random } from '@/tests/support/random'
import { regionOfProfile } from '@/tests/support/region'

type Corner = [x: number, y: number]

const CHORDS = 256

/** Every loop as a polygon of 256 chords an edge. */
function flattened({ edges, loopStart }: Region): Corner[][] {
  const jet = newJet()
  return Array.from({ length: loopStart.length - 1 }, (_, loop) => {
    const corners: Corner[] = []
    for (let i = loopStart[loop]; i < loopStart[loop + 1]; i++) {
      for (let k = 0; k < CHORDS; k++) {
        jetAt(edges, i, k / CHORDS, jet)
        corners.push([jet.x, jet.y])
      }
    }
    return corners
  })
}

/** Signed sum over all chords of the loops. */
function sumOver(loops: Corner[][], term: (x0: number, y0: number, x1: number, y1: number) => number): number {
  let sum = 0
  for (const loop of loops) {
    for (const [k, [x0, y0]] of loop.entries()) {
      const [x1, y1] = loop[(k + 1) % loop.length]
      sum += term(x0, y0, x1, y1)
    }
  }
  return sum
}

const areaOf = (loops: Corner[][]) => sumOver(loops, (x0, y0, x1, y1) => (x0 * y1 - x1 * y0) / 2)
const firstOf = (loops: Corner[][]) => sumOver(loops, (x0, y0, x1, y1) => ((x0 * y1 - x1 * y0) * (y0 + y1)) / 6)

/** What of the polygons lies above y = c (Sutherland & Hodgman's clipping, from memory). */
const clipped = (loops: Corner[][], c: number): Corner[][] =>
  loops.map((loop) =>
    loop.flatMap(([x0, y0], k): Corner[] => {
      const [x1, y1] = loop[(k + 1) % loop.length]
      const kept: Corner[] = y0 >= c ? [[x0, y0]] : []
      if (y0 >= c !== y1 >= c) kept.push([x0 + ((c - y0) / (y1 - y0)) * (x1 - x0), c])
      return kept
    }),
  )

function plasticOf(loops: Corner[][]): number {
  const half = areaOf(loops) / 2
  const heights = loops.flat().map(([, y]) => y)
  let low = Math.min(...heights)
  let high = Math.max(...heights)
  for (let step = 0; step < 60; step++) {
    const c = (low + high) / 2
    if (areaOf(clipped(loops, c)) > half) low = c
    else high = c
  }
  return 2 * firstOf(clipped(loops, low)) - firstOf(loops)
}

/** Greatest gap between the directions of the boundary points that touch the circle, degrees. */
function widestGap(loops: Corner[][], { x, y, radius }: { x: number; y: number; radius: number }): number {
  const touching = loops
    .flat()
    .filter(([px, py]) => Math.hypot(px - x, py - y) > radius * (1 - 1e-5))
    .map(([px, py]) => (Math.atan2(py - y, px - x) * 180) / Math.PI)
    .sort((a, b) => a - b)
  return Math.max(...touching.map((angle, k) => (k + 1 < touching.length ? touching[k + 1] : touching[0] + 360) - angle))
}

describe('against polygons of 256 chords an edge, summed and clipped another way', () => {
  test.each(Array.from({ length: 10 }, (_, k) => 500 + k))('profile of seed %d: A, Ix and Wpl,x agree to 2e-5', (seed) => {
    const region = regionOfProfile(randomProfile(random(seed)))
    const { section } = sectionOf(region, { lastDigit: 0, repairs: [] })
    if (!section) throw new Error('no section')
    const { x, y } = section.centroid
    const loops = flattened(region).map((loop) => loop.map(([px, py]): Corner => [px - x, py - y]))
    const relative = 2e-5
    expect(areaOf(loops)).toBeWithin(section.area, { relative })
    const ix = sumOver(loops, (x0, y0, x1, y1) => ((x0 * y1 - x1 * y0) * (y0 * y0 + y0 * y1 + y1 * y1)) / 12)
    expect(ix).toBeWithin(section.ix, { relative })
    expect(plasticOf(loops)).toBeWithin(section.plastic.x, { relative })
    const length = sumOver(loops, (x0, y0, x1, y1) => Math.hypot(x1 - x0, y1 - y0))
    expect(section.perimeter.outer + section.perimeter.inner).toBeWithin(length, { relative })
  })

  test.each(Array.from({ length: 10 }, (_, k) => 700 + k))(
    'profile of seed %d: nothing lies outside the circle, and it is held all round',
    (seed) => {
      const region = regionOfProfile(randomProfile(random(seed)))
      const { section } = sectionOf(region, { lastDigit: 0, repairs: [] })
      if (!section) throw new Error('no section')
      const { circle } = section
      const loops = flattened(region)
      for (const [px, py] of loops.flat())
        expect(Math.hypot(px - circle.x, py - circle.y)).toBeLessThanOrEqual(circle.radius * (1 + 1e-12))
      // a smallest circle touches on no less than half of itself; touching counts within 1e-5 of the radius, some 0.5°
      expect(widestGap(loops, circle)).toBeLessThan(181)
    },
  )
})
