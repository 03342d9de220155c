import { readFileSync } from 'node:fs'
import { parseArgs } from 'node:util'
import type { Drawing } from '@/lib/dxf/drawing'
import { boundsOfEdges } from '@/lib/geometry/bounds'
import { closedLoops } from '@/lib/geometry/closedLoops'
import { loopTester, nest } from '@/lib/geometry/nest'
import { DEFAULT_RECIPE, mmPerUnit, type Recipe } from '@/lib/geometry/recipe'
import { measured } from '@/lib/geometry/relations'
import { type Chained, chainStep, combineStep, figuresStep } from '@/lib/jobs/steps'
import { readTask } from '@/lib/jobs/tasks'
import { frameAt } from '@/lib/section/frame'
import { momentsOf } from '@/lib/section/moments'

/** Rounds until the compiler has done its work are not counted. */
const WARM_UP = 1 / 3
const NO_LIMITS = { bytes: Number.POSITIVE_INFINITY, entities: Number.POSITIVE_INFINITY, nesting: 32 }

const { values, positionals } = parseArgs({
  allowPositionals: true,
  options: { rounds: { type: 'string', default: '1' }, recipe: { type: 'string' } },
})
const rounds = Number(values.rounds)
const given: Partial<Recipe> = values.recipe ? JSON.parse(readFileSync(values.recipe, 'utf8')) : {}
const recipe: Recipe = { ...DEFAULT_RECIPE, ...given }

function chainAndNest({ edges }: Drawing, { selection, tolerances }: Chained): void {
  const closed = closedLoops(edges, selection.edges, tolerances, mmPerUnit(recipe))
  const loopStart = Uint32Array.from(closed.loopStart)
  const boxes = boundsOfEdges(closed.edges)
  const loops = measured(closed.edges, loopStart, boxes)
  const probes = Float64Array.from({ length: 2 * loops.count }, (_, k) => closed.edges.ends[4 * loopStart[k >> 1] + (k & 1)])
  nest(loops, loopTester(loops, boxes), probes, new Uint8Array(loops.count))
}

function once() {
  const clock = [performance.now()]
  const tick = () => clock.push(performance.now())
  const drawing = readTask(readFileSync(positionals[0]), NO_LIMITS)
  tick()
  const chained = chainStep(drawing, recipe)
  tick()
  const combined = combineStep(chained, recipe)
  tick()
  const { section, region } = figuresStep(drawing, combined, recipe, {})
  tick()
  if (!section || !region) throw new Error(`${positionals[0]} gives no section`)
  // what the limit program does, on its own: chaining, nesting, area and moments without any check
  chainAndNest(drawing, chained)
  tick()
  momentsOf(region.edges, 0, region.edges.count, frameAt(section.centroid.x, section.centroid.y))
  tick()
  const [read, chain, combine, figures, bareChain, integrals] = clock.slice(1).map((t, k) => (t - clock[k]) / 1000)
  const core = read + bareChain + integrals
  return { section, seconds: { read, chain, combine, figures, core, total: (clock[4] - clock[0]) / 1000 } }
}

const results = Array.from({ length: rounds }, once)
const counted = results.slice(rounds > 2 ? Math.ceil(rounds * WARM_UP) : rounds - 1)
const keys = ['read', 'chain', 'combine', 'figures', 'core', 'total'] as const
const median = (numbers: number[]) => numbers.sort((a, b) => a - b)[numbers.length >> 1]
const seconds = Object.fromEntries(keys.map((key) => [key, median(counted.map((result) => result.seconds[key]))]))
const { area, centroid, ix, iy, ixy } = results[0].section
console.log(JSON.stringify({ A: area, cx: centroid.x, cy: centroid.y, Ix: ix, Iy: iy, Ixy: ixy, seconds }))
