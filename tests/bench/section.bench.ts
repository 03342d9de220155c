import { readFileSync } from 'node:fs'
import { parseArgs } from 'node:util'
import { DEFAULT_RECIPE, type Recipe } from '@/lib/geometry/recipe'
import { chainStep, combineStep, figuresStep } from '@/lib/jobs/steps'
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
  // what the limit program computes, on its own: area, centroid and second moments
  momentsOf(region.edges, 0, region.edges.count, frameAt(section.centroid.x, section.centroid.y))
  tick()
  const [read, chain, combine, figures, integrals] = clock.slice(1).map((t, k) => (t - clock[k]) / 1000)
  return { section, seconds: { read, chain, combine, figures, integrals, total: (clock[4] - clock[0]) / 1000 } }
}

const results = Array.from({ length: rounds }, once)
const counted = results.slice(rounds > 2 ? Math.ceil(rounds * WARM_UP) : rounds - 1)
const keys = ['read', 'chain', 'combine', 'figures', 'integrals', 'total'] as const
const median = (numbers: number[]) => numbers.sort((a, b) => a - b)[numbers.length >> 1]
const seconds = Object.fromEntries(keys.map((key) => [key, median(counted.map((result) => result.seconds[key]))]))
const { area, centroid, ix, iy, ixy } = results[0].section
console.log(JSON.stringify({ A: area, cx: centroid.x, cy: centroid.y, Ix: ix, Iy: iy, Ixy: ixy, seconds }))
