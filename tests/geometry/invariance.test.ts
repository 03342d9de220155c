import fc from 'fast-check'
import { expect, test } from 'vitest'
import type { Edge, EdgeTable } from '@/lib/geometry/edges'
import { outlinesOf } from '@/lib/geometry/outlines'
import type { OutlineSet } from '@/lib/geometry/outlineSet'
import { type Similarity, transformEdges } from '@/lib/geometry/transform'
import { allRows, randomProfile, shuffled, splitRandomly, tableOf } from '../support/profiles'
import { random } from '../support/random'

const RUNS = Number(process.env.CAMPAIGN_RUNS ?? 300)

const outlines = (table: EdgeTable, scale = 1): OutlineSet =>
  outlinesOf(
    table,
    allRows(table),
    { lastDigit: 0, chaining: 0.01 * scale, duplicate: 1e-4 * scale, snap: 1e-7 * scale },
    { arcs: [], mmPerUnit: 1 / scale },
  )

/** Outlines whatever their order: area, depth and edges, greatest first. */
const summary = (set: OutlineSet) =>
  Array.from({ length: set.count }, (_, k) => ({
    area: set.area[k],
    depth: set.depth[k],
    edges: set.loopStart[k + 1] - set.loopStart[k],
  })).sort((a, b) => b.area - a.area)

const seeds = (property: (seed: number) => void) =>
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 2 ** 31 }), (seed) => property(seed)),
    { numRuns: RUNS, seed: 20261201 },
  )

/** The same profile, drawn another way, gives outlines of the same depths and of areas scaled by `factor`. */
function expectSame(before: OutlineSet, after: OutlineSet, factor: number, relative: number): void {
  const wanted = summary(before)
  const got = summary(after)
  expect(got.map(({ depth }) => depth)).toEqual(wanted.map(({ depth }) => depth))
  for (const [k, { area }] of got.entries()) expect(area).toBeWithin(factor * wanted[k].area, { relative })
  expect(after.openStart).toHaveLength(1)
}

const profileOf = (seed: number): { edges: Edge[]; depths: number[] } => {
  const profile = randomProfile(random(seed))
  return { edges: profile.flatMap(({ outline }) => outline), depths: profile.map(({ depth }) => depth) }
}

test(`${RUNS} random profiles of all edge kinds give one outline each with the depth they were drawn at`, () => {
  seeds((seed) => {
    const { edges, depths } = profileOf(seed)
    const set = outlines(tableOf(edges))
    expect([...set.depth].sort()).toEqual(depths.sort())
    expect(set.findings.filter(({ severity }) => severity !== 'note')).toEqual([])
    expect(set.clusters).toEqual([])
  })
})

test(`${RUNS} random profiles shuffled and reversed give the same areas to 1e-13 and the same names`, () => {
  seeds((seed) => {
    const { edges } = profileOf(seed)
    const before = outlines(tableOf(edges))
    const after = outlines(tableOf(shuffled(random(seed + 1), edges)))
    expectSame(before, after, 1, 1e-13)
    const names = (set: OutlineSet) =>
      Array.from({ length: set.count }, (_, k) => `${set.at[2 * k].toFixed(9)} ${set.at[2 * k + 1].toFixed(9)}`).sort()
    expect(names(after)).toEqual(names(before))
  })
})

test(`${RUNS} random profiles cut into pieces keep area and nesting to 1e-12`, () => {
  seeds((seed) => {
    const { edges } = profileOf(seed)
    const pieces = shuffled(random(seed + 2), splitRandomly(random(seed + 1), edges))
    expectSame(outlines(tableOf(edges)), outlines(tableOf(pieces)), 1, 1e-12)
  })
})

test.each<[string, Similarity, number, number]>([
  ['moved by 1000', { move: { x: 1000, y: -700 } }, 1, 1e-11],
  ['turned by 33°', { turn: 33 }, 1, 1e-12],
  ['mirrored', { mirror: true }, 1, 1e-12],
  ['scaled by 25.4', { scale: 25.4 }, 25.4, 1e-12],
  ['scaled by 0.001, mirrored and turned by 90°', { scale: 0.001, mirror: true, turn: 90 }, 0.001, 1e-12],
])(`${RUNS} random profiles %s keep nesting, and areas follow`, (_name, similarity, scale, relative) => {
  seeds((seed) => {
    const { edges } = profileOf(seed)
    const table = tableOf(edges)
    expectSame(outlines(table), outlines(transformEdges(table, similarity), scale), scale * scale, relative)
  })
})
