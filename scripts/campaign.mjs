// Runs the randomised tests of npm test with large counts.
import { spawnSync } from 'node:child_process'
import path from 'node:path'
import { parseArgs } from 'node:util'

const USAGE = `usage: npm run campaign -- [options] [FILTER …]

Runs the same test files as npm test, with many more random cases. FILTER is a part of a test file's path.

  --runs N       random cases of each property (default 20000)
  --kills N      times that the server is killed (default 50)
  --seed N       first seed (default: from the clock); it is printed and repeats the run
  --help         print this

The counts reach the tests as CAMPAIGN_RUNS, CAMPAIGN_KILLS and CAMPAIGN_SEED.`

const { values, positionals } = parseArgs({
  allowPositionals: true,
  options: {
    runs: { type: 'string', default: '20000' },
    kills: { type: 'string', default: '50' },
    seed: { type: 'string' },
    help: { type: 'boolean', default: false },
  },
})
if (values.help) {
  console.log(USAGE)
  process.exit(0)
}
for (const name of ['runs', 'kills', 'seed']) {
  if (values[name] !== undefined && !/^\d+$/.test(values[name])) {
    console.error(`--${name} takes a whole number, not "${values[name]}".`)
    process.exit(2)
  }
}

const seed = values.seed ?? String(Date.now() % 2 ** 31)
console.log(`campaign: ${values.runs} runs, ${values.kills} kills, seed ${seed}`)
const root = path.resolve(import.meta.dirname, '..')
const started = Date.now()
const vitest = path.join(root, 'node_modules', 'vitest', 'vitest.mjs')
// a campaign may run for hours: no test is cut short
const { status } = spawnSync(process.execPath, [vitest, 'run', '--testTimeout=0', '--hookTimeout=0', ...positionals], {
  cwd: root,
  stdio: 'inherit',
  env: { ...process.env, CAMPAIGN_RUNS: values.runs, CAMPAIGN_KILLS: values.kills, CAMPAIGN_SEED: seed },
})
console.log(`campaign: ${status === 0 ? 'passed' : 'FAILED'} after ${Math.round((Date.now() - started) / 1000)} s, seed ${seed}`)
process.exitCode = status ?? 1
