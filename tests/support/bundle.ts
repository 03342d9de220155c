import { mkdirSync, mkdtempSync, readdirSync, rmSync, statSync } from 'node:fs'
import path from 'node:path'
import { build } from 'esbuild'

const root = path.resolve(import.meta.dirname, '../..')

/**
 * Bundles modules of this repository, given by their paths from its root, into a fresh folder; returns their paths.
 * The folder lies within the repository, so that packages are found.
 */
export async function bundle(...entries: string[]): Promise<string[]> {
  const folder = path.join(root, 'dist-worker', 'tests')
  mkdirSync(folder, { recursive: true })
  removeOld(folder)
  const outdir = mkdtempSync(path.join(folder, 'bundle-'))
  await build({
    absWorkingDir: root,
    entryPoints: entries.map((entry) => ({ in: entry, out: path.basename(entry, '.ts') })),
    outdir,
    outExtension: { '.js': '.mjs' },
    bundle: true,
    platform: 'node',
    target: 'node20',
    format: 'esm',
    packages: 'external',
    logLevel: 'error',
  })
  return entries.map((entry) => path.join(outdir, `${path.basename(entry, '.ts')}.mjs`))
}

const HOUR = 3_600_000

/** Earlier runs may still use what is newer than an hour. */
function removeOld(folder: string): void {
  for (const name of readdirSync(folder)) {
    const at = path.join(folder, name)
    const { mtimeMs = Date.now() } = statSync(at, { throwIfNoEntry: false }) ?? {}
    if (Date.now() - mtimeMs > HOUR) rmSync(at, { recursive: true, force: true })
  }
}
