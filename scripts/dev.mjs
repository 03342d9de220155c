// Serves the sources with hot reload.
import { spawn } from 'node:child_process'
import path from 'node:path'
import { ensureBuilt } from './build-worker.mjs'

if (process.argv.includes('--help')) {
  console.log(`usage: npm run dev

Serves the sources with hot reload on PORT (3000) and HOST (127.0.0.1).`)
  process.exit(0)
}

const root = path.resolve(import.meta.dirname, '..')
await ensureBuilt(['section.child', 'watchdog'])
const address = ['-H', process.env.HOST || '127.0.0.1', '-p', process.env.PORT || '3000']
const child = spawn(process.execPath, ['node_modules/next/dist/bin/next', 'dev', ...address], { cwd: root, stdio: 'inherit' })
for (const signal of ['SIGTERM', 'SIGINT']) process.on(signal, () => child.kill(signal))
child.on('exit', (code) => process.exit(code ?? 0))
