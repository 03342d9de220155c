import fc from 'fast-check'
import { expect, test } from 'vitest'
import { boundsOfEdges } from '@/lib/geometry/bounds'
import { loopArea, segmentArea } from '@/lib/geometry/edgeArea'
import { emptyTable, pushArc, pushBezier, pushEllipse, pushLine } from '@/lib/geometry/edges'
import { curvatureOf, jetAt, lengthOf, newJet } from '@/lib/geometry/evaluate'
import { insideLoop } from '@/lib/geometry/inside'
import { nearestOn } from '@/lib/geometry/nearest'
import { packRegion, unpackRegion } from '@/lib/geometry/pack'
import type { Region } from '@/lib/geometry/region'
import { snapperOf } from '@/lib/geometry/snap'
import { compensatedSum } from '@/lib/geometry/sum'
import { ellipseAxes, pathOf, regionPath } from '@/lib/geometry/svgPath'
import { transformEdges, transformRegion } from '@/lib/geometry/transform'
import { randomOutline, tableOf } from '../support/profiles'
import { random } from '../support/random'
import { Drawn } from './drawn'

const RUNS = Number(process.env.CAMPAIGN_RUNS ?? 300)
const seeds = (property: (seed: number) => void) =>
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 2 ** 31 }), (seed) => property(seed)),
    { numRuns: RUNS, seed: 20261201 },
  )

/** the conic weight that makes a quadratic piece a quarter circle */
const quarterAsBezier = () => {
  const table = emptyTable()
  pushBezier(table, 2, true, [1, 0, 1, 1, 1, Math.SQRT1_2, 0, 1, 1], 0)
  return table
}

const tube = (): Region => {
  const { edges } = new Drawn().circle(0, 0, 10).circle(0, 0, 8)
  return { edges, loopStart: Uint32Array.of(0, 1, 2), hole: Uint8Array.of(0, 1), piece: Uint32Array.of(0, 0), pieces: 1 }
}

test('compensated, 1e100 + 1 − 1e100 is 1', () => {
  expect(compensatedSum([1e100, 1, -1e100])).toBe(1)
})

test('a rational quadratic quarter circle has length π/2, segment π/4 − 1/2 and curvature 1 to 1e-14', () => {
  const table = quarterAsBezier()
  expect(lengthOf(table, 0)).toBeWithin(Math.PI / 2, { relative: 1e-14 })
  expect(segmentArea(table, 0)).toBeWithin(Math.PI / 4 - 0.5, { relative: 1e-14 })
  const jet = newJet()
  for (const t of [0, 0.2, 0.7, 1]) expect(curvatureOf(jetAt(table, 0, t, jet))).toBeWithin(1, { relative: 1e-13 })
})

test('at 1e6 from the origin the same quarter circle keeps segment and length to 1e-14', () => {
  const table = emptyTable()
  pushBezier(table, 2, true, [1e6 + 1, 1e6, 1, 1e6 + 1, 1e6 + 1, Math.SQRT1_2, 1e6, 1e6 + 1, 1], 0)
  expect(segmentArea(table, 0)).toBeWithin(Math.PI / 4 - 0.5, { relative: 1e-14 })
  expect(lengthOf(table, 0)).toBeWithin(Math.PI / 2, { relative: 1e-14 })
})

test('the cubic (0,0) (0,10) (10,10) (10,0) is at (5, 7.5) in the middle and encloses 60 with its chord', () => {
  const table = emptyTable()
  pushBezier(table, 3, false, [0, 0, 1, 0, 10, 1, 10, 10, 1, 10, 0, 1], 0)
  const { x, y } = jetAt(table, 0, 0.5, newJet())
  expect([x, y]).toEqual([5, 7.5])
  expect(segmentArea(table, 0)).toBeWithin(-60, { relative: 1e-15 })
  expect([...boundsOfEdges(table)]).toEqual([0, 0, 10, 7.5])
})

test("an arc of 1e-4 rad on a radius of 1e6 keeps its segment r²Δ³/12 to 1e-8, the series' next term", () => {
  const table = emptyTable()
  pushArc(table, 0, 0, 0, 0, 0, 0, 1e6, 0, 1e-4, 0)
  expect(segmentArea(table, 0)).toBeWithin((1e12 * 1e-12) / 12, { relative: 1e-9 })
})

test('an ellipse of half axes 5 and 3 turned by 30° reaches √(25·cos² + 9·sin²) in x', () => {
  const table = emptyTable()
  const [c, s] = [Math.cos(Math.PI / 6), 0.5]
  pushEllipse(table, 5 * c, 5 * s, 5 * c, 5 * s, 0, 0, 5 * c, 5 * s, -3 * s, 3 * c, 0, 2 * Math.PI, 0)
  const reach = Math.sqrt(25 * c * c + 9 * s * s)
  const [minX, , maxX] = boundsOfEdges(table)
  expect(maxX).toBeWithin(reach, { relative: 1e-15 })
  expect(minX).toBeWithin(-reach, { relative: 1e-15 })
  expect(loopArea(table, 0, 1)).toBeWithin(15 * Math.PI, { relative: 1e-15 })
  const axes = ellipseAxes(5 * c, 5 * s, -3 * s, 3 * c)
  expect(axes.major).toBeWithin(5, { relative: 1e-15 })
  expect(axes.minor).toBeWithin(3, { relative: 1e-14 })
  expect(axes.angle).toBeWithin(30, { relative: 1e-14 })
})

test(`on ${RUNS} random outlines a point inside has winding 1 by angles summed over a fine polyline, one outside 0`, () => {
  seeds((seed) => {
    const next = random(seed)
    const table = tableOf(randomOutline(next, { x: 3, y: -2 }, 20))
    const jet = newJet()
    for (let n = 0; n < 8; n++) {
      const x = 3 + 50 * (next() - 0.5)
      const y = -2 + 50 * (next() - 0.5)
      let near = Number.POSITIVE_INFINITY
      for (let i = 0; i < table.count; i++) near = Math.min(near, nearestOn(table, i, x, y).distance)
      if (near < 0.1) continue
      let winding = 0
      let before: [number, number] | null = null
      for (let i = 0; i < table.count; i++)
        for (let k = 0; k <= 16; k++) {
          jetAt(table, i, k / 16, jet)
          const to: [number, number] = [jet.x - x, jet.y - y]
          if (before) winding += Math.atan2(before[0] * to[1] - before[1] * to[0], before[0] * to[0] + before[1] * to[1])
          before = to
        }
      expect(insideLoop(table, 0, table.count, x, y)).toBe(Math.round(winding / (2 * Math.PI)) === 1)
    }
  })
})

test(`on ${RUNS} random outlines the nearest point is no further than the nearest of 400 samples an edge`, () => {
  seeds((seed) => {
    const next = random(seed)
    const table = tableOf(randomOutline(next, { x: 0, y: 0 }, 20))
    const [x, y] = [60 * (next() - 0.5), 60 * (next() - 0.5)]
    const jet = newJet()
    for (let i = 0; i < table.count; i++) {
      const near = nearestOn(table, i, x, y)
      let sampled = Number.POSITIVE_INFINITY
      for (let k = 0; k <= 400; k++) {
        jetAt(table, i, k / 400, jet)
        sampled = Math.min(sampled, Math.hypot(jet.x - x, jet.y - y))
      }
      expect(near.distance).toBeLessThanOrEqual(sampled + 1e-12)
      expect(sampled).toBeLessThanOrEqual(near.distance + 0.05)
      expect(Math.hypot(near.x - x, near.y - y)).toBeWithin(near.distance, { absolute: 1e-12 })
    }
  })
})

test('a tube scaled by 25.4, mirrored and turned by 90° has radii 254 and 203.2 exactly, and its hole still clockwise', () => {
  const region = tube()
  const moved = transformRegion(region, { scale: 25.4, mirror: true, turn: 90 })
  expect(moved.edges.shapes[2]).toBe(254)
  expect(moved.edges.shapes[7]).toBe(8 * 25.4)
  expect(loopArea(moved.edges, 0, 1)).toBeWithin(254 ** 2 * Math.PI, { relative: 1e-15 })
  expect(transformEdges(new Drawn().line(1, 2, 3, 4).edges, { turn: 90 }).ends).toEqual(Float64Array.of(-2, 1, -4, 3))
})

test(`${RUNS} random outlines mirrored as regions stay counter-clockwise, of the same area, joined to the last bit`, () => {
  seeds((seed) => {
    const edges = tableOf(randomOutline(random(seed), { x: 5, y: 7 }, 20))
    const region = {
      edges,
      loopStart: Uint32Array.of(0, edges.count),
      hole: Uint8Array.of(0),
      piece: Uint32Array.of(0),
      pieces: 1,
    }
    const mirrored = transformRegion(region, { mirror: true, turn: 20 }).edges
    expect(loopArea(mirrored, 0, edges.count)).toBeWithin(loopArea(edges, 0, edges.count), { relative: 1e-12 })
    for (let i = 0; i < edges.count; i++) {
      const next = 4 * ((i + 1) % edges.count)
      expect(mirrored.ends.slice(4 * i + 2, 4 * i + 4)).toEqual(mirrored.ends.slice(next, next + 2))
    }
  })
})

test(`${RUNS} random outlines packed and unpacked are the same to the last bit`, () => {
  seeds((seed) => {
    const edges = tableOf(randomOutline(random(seed), { x: 1 / 3, y: 1e6 }, 20))
    const region = {
      edges,
      loopStart: Uint32Array.of(0, edges.count),
      hole: Uint8Array.of(0),
      piece: Uint32Array.of(0),
      pieces: 1,
    }
    const back = unpackRegion(packRegion(region))
    expect(back.edges.ends).toEqual(edges.ends.slice(0, 4 * edges.count))
    expect(back.edges.shapes).toEqual(edges.shapes.slice(0, edges.shapesUsed))
    expect(back.edges.kind).toEqual(edges.kind.slice(0, edges.count))
    expect([back.loopStart, back.hole, back.piece, back.pieces]).toEqual([region.loopStart, region.hole, region.piece, 1])
  })
})

test('bytes of another kind or cut short are refused', () => {
  const bytes = packRegion(tube())
  expect(() => unpackRegion(bytes.subarray(0, bytes.length - 1))).toThrow(RangeError)
  expect(() => unpackRegion(new Uint8Array(64))).toThrow('These bytes are not a packed region.')
})

test('paths turn y down: a line, a quarter arc drawn counter-clockwise with sweep flag 0, a circle in two halves', () => {
  const { edges } = new Drawn().line(0, 0, 10, 5).arc(10, 10, 5, 270, 360)
  expect(pathOf(edges, 0, 2, false)).toBe('M0 0L10 -5A5 5 0 0 0 15 -10')
  expect(regionPath(tube())).toBe('M10 0A10 10 0 0 0 -10 0A10 10 0 0 0 10 0ZM8 0A8 8 0 0 0 -8 0A8 8 0 0 0 8 0Z')
})

test('cubics stay C, and a place 1e6 from the origin is drawn about the origin given', () => {
  const table = emptyTable()
  pushBezier(table, 3, false, [1e6, 0, 1, 1e6, 10, 1, 1e6 + 10, 10, 1, 1e6 + 10, 0.125, 1], 0)
  expect(pathOf(table, 0, 1, false, { x: 1e6, y: 0 })).toBe('M0 0C0 -10 10 -10 10 -0.125')
})

test('an elliptical arc is written with its half axes and its turn, y down', () => {
  const table = emptyTable()
  pushEllipse(table, 0, 5, -3, 0, 0, 0, 0, 5, -3, 0, 0, Math.PI / 2, 0)
  expect(pathOf(table, 0, 1, false)).toBe('M0 -5A5 3 -90 0 0 -3 0')
})

test('snapping prefers an end to a nearer edge, then middle or centre, then the edge; beyond the radius nothing', () => {
  const drawn = new Drawn().line(0, 0, 10, 0).circle(30, 0, 4)
  pushLine(drawn.edges, 10, 0, 10, 10, 9)
  const snap = snapperOf(drawn.edges)
  expect(snap(9.6, 0.1, 0.5)).toMatchObject({ kind: 'end', x: 10, y: 0 })
  expect(snap(5.2, 0.1, 0.5)).toMatchObject({ kind: 'middle', x: 5, y: 0 })
  expect(snap(30.2, 0.2, 0.5)).toMatchObject({ kind: 'centre', x: 30, y: 0 })
  expect(snap(7.5, 0.3, 0.5)).toMatchObject({ kind: 'edge', x: 7.5, y: 0 })
  expect(snap(7.5, 0.6, 0.5)).toBeNull()
})
