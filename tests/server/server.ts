import { type ChildProcess, spawn } from 'node:child_process'
import { existsSync, mkdtempSync, rmSync } from 'node:fs'
import { createServer } from 'node:net'
import os from 'node:os'
import path from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'

const root = path.resolve(import.meta.dirname, '../..')

export const newDataDir = () => mkdtempSync(path.join(os.tmpdir(), 'sectionwright-server-'))
export const removeDataDir = (dir: string) => rmSync(dir, { recursive: true, force: true })

const freePort = () =>
  new Promise<number>((resolve) => {
    const probe = createServer().listen(0, '127.0.0.1', () => {
      const address = probe.address()
      probe.close(() => resolve(typeof address === 'object' && address ? address.port : 0))
    })
  })

export interface Server {
  url: string
  pid: number
  /** what it printed so far */
  printed: () => string
  /** ends it in its own way, or without a chance to do anything */
  stop: (signal?: 'SIGTERM' | 'SIGKILL') => Promise<void>
}

/** The real built server on a port of its own, with computations limited to 2 s. */
export async function startServer(dataDir: string, env: Record<string, string> = {}): Promise<Server> {
  if (!existsSync(path.join(root, process.env.NEXT_DIST ?? '.next', 'BUILD_ID'))) {
    throw new Error('These tests need the built server. Run: node scripts/bootstrap.mjs build')
  }
  const port = await freePort()
  const settings = {
    PORT: String(port),
    HOST: '127.0.0.1',
    DATA_DIR: dataDir,
    LOG_LEVEL: 'warn',
    COMPUTE_SECONDS: '2',
    OPINION_SECONDS: '2',
  }
  const child = spawn(process.execPath, ['scripts/serve.mjs'], {
    cwd: root,
    env: { ...process.env, ...settings, ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  let output = ''
  for (const stream of [child.stdout, child.stderr]) stream.on('data', (text) => (output += String(text)))
  const url = `http://127.0.0.1:${port}`
  await ready(child, url, () => output)
  return { url, pid: child.pid ?? 0, printed: () => output, stop: (signal = 'SIGTERM') => ended(child, signal) }
}

async function ready(child: ChildProcess, url: string, output: () => string): Promise<void> {
  for (let k = 0; k < 300; k++) {
    if (child.exitCode !== null) throw new Error(`The server ended:\n${output()}`)
    const answer = await fetch(`${url}/api/health`).catch(() => null)
    if (answer?.ok) return
    await wait(100)
  }
  child.kill('SIGKILL')
  throw new Error(`The server did not come up in 30 s:\n${output()}`)
}

async function ended(child: ChildProcess, signal: NodeJS.Signals): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return
  const gone = new Promise((resolve) => child.once('exit', resolve))
  child.kill(signal)
  await gone
}
