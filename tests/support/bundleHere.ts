import path from 'node:path'
import { build } from 'esbuild'

const root = path.resolve(import.meta.dirname, '../..')

/** Bundles one file of this repository beside node_modules, so that the bundle finds the packages. Gives its path. */
export async function bundleHere(entry: string): Promise<string> {
  const outfile = path.join(root, 'dist-worker', `${path.basename(entry, '.ts')}.mjs`)
  await build({
    absWorkingDir: root,
    entryPoints: [entry],
    outfile,
    bundle: true,
    platform: 'node',
    target: 'node20',
    format: 'esm',
    packages: 'external',
    logLevel: 'error',
  })
  return outfile
}
