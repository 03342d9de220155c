import { expect, test } from 'vitest'
import { reversed } from '@/lib/geometry/edges'
import { loopArea } from '@/lib/geometry/edgeArea'
import type { Region } from '@/lib/geometry/region'
import { transformRegion } from '@/lib/geometry/transform'
import { torsionOf } from '@/lib/section/torsion/torsion'
import { randomProfile, tableOf } from '../../support/profiles'
import { random } from '../../support/random'

const RUNS = Number(process.env.CAMPAIGN_RUNS ?? 200)

/** A random profile with its holes, metal on the left. */
function regionFor(seed: number): Region {
  const next = random(seed)
  const loops = randomProfile(next)
    .filter(({ depth }) => depth < 2)
    .map(({ outline, depth }) => {
      const table = tableOf(outline)
      const isRight = loopArea(table, 0, table.count) > 0 === (depth === 0)
      return isRight ? outline : outline.map(reversed).reverse()
    })
  const loopStart = [0]
  for (const loop of loops) loopStart.push(loopStart[loopStart.length - 1] + loop.length)
  return {
    edges: tableOf(loops.flat()),
    loopStart: Uint32Array.from(loopStart),
    hole: Uint8Array.from(loops, (_, k) => (k === 0 ? 0 : 1)),
    piece: new Uint32Array(loops.length),
    pieces: 1,
  }
}

test(`${RUNS} random profiles of lines, arcs, ellipses and splines: each is meshed and solved, its bounds a 500th apart`, () => {
  const failed: string[] = []
  for (let seed = 1; seed <= RUNS; seed++) {
    const torsion = torsionOf(regionFor(seed))
    if (!torsion || !(torsion.lower <= torsion.upper && torsion.upper / torsion.lower - 1 <= 0.0021))
      failed.push(`seed ${seed}: ${JSON.stringify(torsion)}`)
  }
  expect(failed).toEqual([])
})

test('moved, turned, mirrored and scaled profiles keep bounds that overlap, J going with the fourth power', () => {
  for (let seed = 1; seed <= Math.min(RUNS, 40); seed++) {
    const region = regionFor(seed)
    const scale = 0.3 + 3 * random(seed + 1000)()
    const other = torsionOf(
      transformRegion(region, { mirror: seed % 2 === 0, scale, turn: 37.3 * seed, move: { x: 1000, y: -2e4 } }),
    )
    const own = torsionOf(region)
    if (!own || !other) throw new Error(`seed ${seed}: no mesh`)
    expect(other.lower / scale ** 4, `seed ${seed}`).toBeLessThanOrEqual(own.upper * (1 + 1e-9))
    expect(other.upper / scale ** 4, `seed ${seed}`).toBeGreaterThanOrEqual(own.lower * (1 - 1e-9))
  }
})
