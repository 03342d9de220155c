// npm run backup, restore, reset-password, team:create: builds the commands where a source has changed, then runs one.
import { mkdirSync } from 'node:fs'
import path from 'node:path'
import { pathToFileURL } from 'node:url'
import { build } from 'esbuild'

const root = path.resolve(import.meta.dirname, '..')
const outfile = path.join(root, 'dist-worker', 'admin.mjs')
mkdirSync(path.dirname(outfile), { recursive: true })
await build({
  absWorkingDir: root,
  entryPoints: ['scripts/admin/main.ts'],
  outfile,
  bundle: true,
  platform: 'node',
  target: 'node20',
  format: 'esm',
  packages: 'external',
  logLevel: 'warning',
})
await import(pathToFileURL(outfile).href)
