// Runs every check and says in one line how it went.
import { spawnSync } from 'node:child_process'
import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'

const HELP = `usage: npm test [-- NAME …]

Runs lint, types, unit (with property-based and route tests) and browser; or only those named:
  npm test -- unit browser`

const root = path.resolve(import.meta.dirname, '..')
const bin = (name) => path.join(root, 'node_modules', name)
const reports = mkdtempSync(path.join(os.tmpdir(), 'sectionwright-check-'))
const report = (name) => path.join(reports, `${name}.json`)

function run(file, args, env = {}) {
  const settings = { cwd: root, stdio: 'inherit', env: { ...process.env, NEXT_TELEMETRY_DISABLED: '1', ...env } }
  return spawnSync(process.execPath, [file, ...args], settings).status === 0
}
const one = (ok) => ({ passed: ok ? 1 : 0, failed: ok ? 0 : 1 })

function counted(ok, name, read) {
  try {
    const { passed, failed } = read(JSON.parse(readFileSync(report(name), 'utf8')))
    return { passed, failed: ok ? failed : Math.max(1, failed) }
  } catch {
    return one(ok)
  }
}

const CHECKS = {
  lint: () => one(run(bin('@biomejs/biome/bin/biome'), ['lint', '--error-on-warnings'])),
  types: () => one(run(bin('next/dist/bin/next'), ['typegen']) && run(bin('typescript/bin/tsc'), ['--noEmit'])),
  unit() {
    const ok = run(bin('vitest/vitest.mjs'), [
      'run',
      '--reporter=default',
      '--reporter=json',
      `--outputFile.json=${report('unit')}`,
    ])
    return counted(ok, 'unit', ({ numPassedTests, numFailedTests, numFailedTestSuites }) => ({
      passed: numPassedTests,
      failed: numFailedTests || numFailedTestSuites,
    }))
  },
  browser() {
    const env = { PLAYWRIGHT_JSON_OUTPUT_NAME: report('browser'), E2E_DATA_DIR: path.join(reports, 'data') }
    const ok = run(bin('@playwright/test/cli.js'), ['test', '--reporter=list,json', '--pass-with-no-tests'], env)
    return counted(ok, 'browser', ({ stats }) => ({ passed: stats.expected + stats.flaky, failed: stats.unexpected }))
  },
}

const asked = process.argv.slice(2)
const unknown = asked.filter((name) => !(name in CHECKS))
if (unknown.length > 0) {
  console.log(HELP)
  process.exit(asked.includes('--help') ? 0 : 1)
}

const started = Date.now()
const seconds = () => Math.round((Date.now() - started) / 1000)
const total = { passed: 0, failed: 0 }
for (const name of asked.length > 0 ? asked : Object.keys(CHECKS)) {
  console.log(`\n== ${name} (after ${seconds()} s)`)
  const { passed, failed } = CHECKS[name]()
  total.passed += passed
  total.failed += failed
}
rmSync(reports, { recursive: true, force: true })
console.log(`\nIn ${seconds()} s:`)
console.log(`${total.passed} passed, ${total.failed} failed`)
process.exit(total.failed === 0 ? 0 : 1)
