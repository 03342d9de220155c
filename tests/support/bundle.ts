import { mkdirSync, mkdtempSync } from 'node:fs'
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
