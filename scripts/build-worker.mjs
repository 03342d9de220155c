// Bundles what runs outside the web server (TypeScript from lib/) into dist-worker/.
//
//   node scripts/build-worker.mjs [--help]
//
// `ensureBuilt(names)` rebuilds a bundle only where one of its sources is newer.
import { mkdirSync, readFileSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { fileURLToPath } from 'node:url'

const root = path.resolve(import.meta.dirname, '..')
const out = path.join(root, 'dist-worker')

/** bundle → entry */
const ENTRIES = {
  'section.child': 'lib/jobs/section.child.ts',
  watchdog: 'lib/jobs/watchdog.ts',
  'section.cli': 'lib/jobs/section.cli.ts',
  'section.bench': 'tests/bench/section.bench.ts',
}

const modified = (file) => statSync(path.join(root, file), { throwIfNoEntry: false })?.mtimeMs ?? Number.POSITIVE_INFINITY

function isFresh(name) {
  const built = statSync(path.join(out, `${name}.mjs`), { throwIfNoEntry: false })?.mtimeMs
  if (!built) return false
  try {
    const inputs = JSON.parse(readFileSync(path.join(out, `${name}.inputs.json`), 'utf8'))
    return inputs.every((file) => modified(file) < built)
  } catch {
    return false
  }
}

/** Builds those of the named bundles that are missing or older than a source. Two at once do not disturb each other. */
export async function ensureBuilt(names = ['section.child', 'watchdog', 'section.cli']) {
  const stale = names.filter((name) => !isFresh(name))
  if (stale.length === 0) return
  const { build } = await import('esbuild')
  mkdirSync(out, { recursive: true })
  for (const name of stale) {
    const { outputFiles, metafile } = await build({
      absWorkingDir: root,
      entryPoints: [ENTRIES[name]],
      bundle: true,
      platform: 'node',
      target: 'node20',
      format: 'esm',
      packages: 'external',
      write: false,
      metafile: true,
      logLevel: 'warning',
    })
    const inputs = Object.keys(metafile.inputs)
    const draft = path.join(out, `.${name}.${process.pid}`)
    writeFileSync(draft, outputFiles[0].contents)
    writeFileSync(path.join(out, `${name}.inputs.json`), JSON.stringify(inputs))
    renameSync(draft, path.join(out, `${name}.mjs`))
    rmSync(draft, { force: true })
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  if (process.argv.includes('--help')) {
    console.log(`usage: node scripts/build-worker.mjs

Bundles ${Object.keys(ENTRIES).join(', ')} into dist-worker/, each only where a source has changed.`)
  } else await ensureBuilt()
}
