// How fast the built server answers a JSON read through the session check; see tests/bench/README.md.
import { spawn } from 'node:child_process'
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'
import autocannon from 'autocannon'

const root = path.resolve(import.meta.dirname, '..')

const freePort = () =>
  new Promise((found) => {
    const probe = createServer().listen(0, '127.0.0.1', () => {
      const { port } = probe.address()
      probe.close(() => found(port))
    })
  })

/** Starts a command that serves `url` and waits until it answers. */
async function serving(args, env, url) {
  const child = spawn(process.execPath, args, { cwd: root, env: { ...process.env, ...env }, stdio: 'ignore' })
  for (let k = 0; k < 300; k++) {
    const response = await fetch(url).catch(() => null)
    if (response?.ok) return child
    if (child.exitCode !== null) break
    await wait(100)
  }
  child.kill('SIGKILL')
  throw new Error(`${args[0]} did not come up.`)
}

async function ended(child) {
  const gone = new Promise((resolve) => child.once('exit', resolve))
  child.kill('SIGTERM')
  await gone
}

async function answered(response) {
  if (!response.ok) throw new Error(`${response.url} answered ${response.status}: ${await response.text()}`)
  return response.json()
}

/** A team, its administrator's cookie and one stored section. */
async function withSection(url) {
  const person = { team: 'Bench', name: 'Bench', email: 'bench@example.org', password: 'long enough' }
  const setup = await fetch(`${url}/api/v1/setup`, { method: 'POST', body: JSON.stringify(person) })
  const cookie = setup.headers.get('set-cookie')?.split(';')[0]
  if (!cookie) throw new Error(`Setting up answered ${setup.status}.`)
  const headers = { cookie, origin: url }
  const post = (where, body) => fetch(`${url}/api/v1${where}`, { method: 'POST', headers, body }).then(answered)
  const job = await post('/jobs', JSON.stringify({ title: 'Bench' }))
  const profile = await post('/profiles', JSON.stringify({ jobId: job.id, title: 'Bench' }))
  const form = new FormData()
  form.set('file', new File([readFileSync(path.join(root, 'fixtures', 'cases', 'p10.dxf'))], 'p10.dxf'))
  const started = performance.now()
  const { revision } = await post(`/profiles/${profile.id}/revisions`, form)
  const cold = performance.now() - started
  const saves = []
  for (let k = 0; k < 5; k++) {
    const again = performance.now()
    await post(`/profiles/${profile.id}/revisions`, form)
    saves.push(performance.now() - again)
  }
  return { cookie, profile, revision, cold, warm: saves.sort((a, b) => a - b)[2] }
}

async function rate(url, headers, { seconds, connections }) {
  const { requests, errors, non2xx } = await autocannon({ url, headers, connections, duration: seconds })
  if (errors + non2xx > 0) throw new Error(`${url}: ${errors} errors, ${non2xx} answers other than 2xx.`)
  return requests.average
}

/** Loads the bare server, the route with the least in it and two JSON reads in turn, and prints their rates. */
export async function benchHttp({ seconds, connections, rounds }) {
  if (!existsSync(path.join(root, process.env.NEXT_DIST ?? '.next', 'BUILD_ID'))) {
    console.log('The server is not built, so its rate is not measured. Run: node scripts/bootstrap.mjs build')
    return
  }
  const dataDir = mkdtempSync(path.join(tmpdir(), 'sectionwright-bench-'))
  const [port, limitPort] = [await freePort(), await freePort()]
  const url = `http://127.0.0.1:${port}`
  const bare = `http://127.0.0.1:${limitPort}/sections/1`
  const env = { PORT: String(port), HOST: '127.0.0.1', DATA_DIR: dataDir, LOG_LEVEL: 'error' }
  const server = await serving(['scripts/serve.mjs'], env, `${url}/api/health`)
  const limit = await serving(['tests/bench/http-limit.mjs'], { PORT: String(limitPort) }, bare)
  try {
    const { cookie, profile, revision, cold, warm } = await withSection(url)
    const targets = [
      ['bare node:http, one row', bare, {}],
      ['GET /api/health, no session', `${url}/api/health`, {}],
      ['GET /api/v1/profiles/{id}', `${url}/api/v1/profiles/${profile.id}`, { cookie }],
      ['GET /api/v1/revisions/{id}/section', `${url}/api/v1/revisions/${revision.id}/section`, { cookie }],
    ]
    const rates = targets.map(() => [])
    for (let round = 0; round < rounds; round++) {
      for (const [k, [, where, headers]] of targets.entries()) rates[k].push(await rate(where, headers, { seconds, connections }))
    }
    const medians = rates.map((list) => list.sort((a, b) => a - b)[list.length >> 1])
    console.log(`\nrequests per second, median of ${rounds} × ${seconds} s, ${connections} connections\n`)
    console.log('| what | per second | to the bare server | to /api/health |\n| --- | --- | --- | --- |')
    for (const [k, [name]] of targets.entries()) {
      const share = (base) => (medians[k] / medians[base]).toFixed(3)
      console.log(`| ${name} | ${Math.round(medians[k])} | ${share(0)} | ${share(1)} |`)
    }
    console.log(
      `\nsave of p10.dxf: ${Math.round(cold)} ms the first time, ${Math.round(warm)} ms with a warm child (median of 5)`,
    )
  } finally {
    await Promise.all([ended(server), ended(limit)])
    rmSync(dataDir, { recursive: true, force: true })
  }
}
