// The built product on a port and a database of its own, set up and signed in, for the benchmarks.
import { spawn } from 'node:child_process'
import { existsSync, mkdtempSync, rmSync } from 'node:fs'
import { createServer } from 'node:net'
import { loadavg, tmpdir } from 'node:os'
import path from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'
import { chromium } from '@playwright/test'

const root = path.resolve(import.meta.dirname, '../..')
export const fixture = (name) => path.join(root, 'fixtures', name)

export const median = (values) => quantile(values, 0.5)
export function quantile(values, q) {
  const sorted = [...values].sort((a, b) => a - b)
  return sorted[Math.min(sorted.length - 1, Math.floor(q * sorted.length))]
}

/** One line: what was aimed at, what was measured. */
export function report(met, text) {
  console.log(`${met ? 'met    ' : 'NOT MET'}  ${text}`)
}

export const freePort = () =>
  new Promise((resolve) => {
    const probe = createServer().listen(0, '127.0.0.1', () => {
      const { port } = probe.address()
      probe.close(() => resolve(port))
    })
  })

export async function startProduct() {
  console.log(`\nload of this machine ${loadavg()[0].toFixed(1)}; times of the wall clock count only where it is quiet`)
  const dataDir = mkdtempSync(path.join(tmpdir(), 'sectionwright-bench-server-'))
  const port = await freePort()
  const url = `http://localhost:${port}`
  const env = { ...process.env, PORT: String(port), HOST: '127.0.0.1', DATA_DIR: dataDir }
  const server = spawn(process.execPath, ['scripts/serve.mjs'], { cwd: root, env, stdio: ['ignore', 'ignore', 'inherit'] })
  const ended = new Promise((resolve) => server.once('exit', resolve))
  const stop = async () => {
    server.kill('SIGTERM')
    await ended
    rmSync(dataDir, { recursive: true, force: true })
  }
  while (!(await fetch(`${url}/api/health`).catch(() => null))?.ok) {
    if (server.exitCode !== null) throw new Error('The server did not come up. Is it built? node scripts/bootstrap.mjs build')
    await wait(100)
  }

  const headers = { origin: url, 'content-type': 'application/json' }
  const send = async (at, body, more = {}) => {
    const answer = await fetch(`${url}/api/v1${at}`, {
      method: 'POST',
      headers: { ...headers, ...more },
      body: JSON.stringify(body),
    })
    if (!answer.ok) throw new Error(`${at}: ${answer.status} ${await answer.text()}`)
    return answer
  }
  const account = { team: 'Bench', name: 'Bench', email: 'bench@example.org', password: 'a long pass phrase' }
  const cookie = (await send('/setup', account)).headers.get('set-cookie').split(';')[0]
  headers.cookie = cookie
  const job = await (await send('/jobs', { title: 'Bench' })).json()

  /** A profile to which drawings can be saved. */
  const addProfile = async (title) => (await send('/profiles', { jobId: job.id, title })).json()
  /** Saves a revision through the upload route; the answer and how long it took, ms. */
  async function save(profileId, name, bytes) {
    const form = new FormData()
    form.set('recipe', JSON.stringify({ unit: 'mm' }))
    form.set('fields', '{}')
    form.set('file', new Blob([bytes], { type: 'application/dxf' }), name)
    const key = `bench-${Math.random().toString(36).slice(2)}-${Date.now()}`
    const start = performance.now()
    const answer = await fetch(`${url}/api/v1/profiles/${profileId}/revisions`, {
      method: 'POST',
      headers: { origin: url, cookie, 'idempotency-key': key },
      body: form,
    })
    const text = await answer.text()
    const ms = performance.now() - start
    if (answer.status !== 201) throw new Error(`saving ${name}: ${answer.status} ${text.slice(0, 500)}`)
    return { revision: JSON.parse(text).revision, ms }
  }
  return { url, pid: server.pid, cookie, stop, addProfile, save }
}

const BROWSERS = [process.env.CHROMIUM ?? '', '/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome']
const FLAGS = [
  '--headless',
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
]

/** Chromium as the browser tests start it, with the cookie of a product. */
export async function openBrowser({ url, cookie }, args = []) {
  const executablePath = BROWSERS.find((file) => file !== '' && existsSync(file))
  const browser = await chromium.launch({ executablePath, args: [...FLAGS, ...args] })
  const context = await browser.newContext({ baseURL: url, viewport: { width: 1440, height: 900 } })
  const [name, ...value] = cookie.split('=')
  await context.addCookies([{ name, value: value.join('='), url }])
  return { browser, context }
}
