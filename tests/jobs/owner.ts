import { DEFAULT_RECIPE } from '@/lib/geometry/recipe'
import { createSectionPool } from '@/lib/jobs/server-pool'

/** A parent to be killed: prints its child's pid, then gives it work without end. */
const pool = createSectionPool({ bundle: process.argv[2], size: 1, seconds: 60 })
const job = (name: string) => ({ path: 'unused', source: { name, bytes: 0, sha256: '' }, recipe: DEFAULT_RECIPE, materials: {} })

const first = await pool.run(job('plain'), { person: 'ann' })
if (first.ok) {
  await first.opinions
  const endless = pool.run(job('loop'), { person: 'ann' })
  setTimeout(() => console.log(first.answer.engineVersion), 100)
  await endless
}
