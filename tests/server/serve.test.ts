import { spawnSync } from 'node:child_process'
import { existsSync, mkdtempSync, readdirSync, rmSync, statSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { rectanglesDxf } from '@/tests/support/rectanglesDxf'
import { inspect, WHOLE } from './inspect'
import { firstPerson, type Person } from './person'
import { newDataDir, removeDataDir, type Server, startServer } from './server'

const root = path.resolve(import.meta.dirname, '../..')
const dataDir = newDataDir()
let server: Server
let me: Person
let profileId = ''
beforeAll(async () => {
  server = await startServer(dataDir)
  me = await firstPerson(server.url)
  profileId = await me.profile()
})
afterAll(async () => {
  await server.stop()
  removeDataDir(dataDir)
})

function admin(...args: string[]) {
  const { status, stdout, stderr } = spawnSync(process.execPath, ['scripts/admin.mjs', ...args], {
    cwd: root,
    encoding: 'utf8',
    env: { ...process.env, DATA_DIR: dataDir },
  })
  return { status, said: stdout + stderr }
}

const signIn = async (password: string, email = 'Ann@Example.org') => {
  const csrf = await fetch(`${server.url}/api/auth/csrf`)
  const { csrfToken } = Object(await csrf.json())
  const cookie = csrf.headers
    .getSetCookie()
    .map((each) => each.split(';')[0])
    .join('; ')
  const body = new URLSearchParams({ csrfToken, email, password, json: 'true', callbackUrl: '/' })
  return fetch(`${server.url}/api/auth/callback/credentials`, { method: 'POST', body, headers: { cookie, origin: server.url } })
}
const sessionOf = (response: Response) =>
  response.headers.getSetCookie().find((each) => each.startsWith('next-auth.session-token='))

test('signing in gives an opaque HttpOnly cookie, signing out ends it on the server', async () => {
  const response = await signIn('long enough')
  const set = sessionOf(response) ?? ''
  expect(set).toMatch(/^next-auth\.session-token=[\w-]{43}; .*HttpOnly; SameSite=Lax/)
  const cookie = set.split(';')[0]
  const status = async () => (await fetch(`${server.url}/api/v1/me`, { headers: { cookie } })).status
  expect(await status()).toBe(200)
  const csrf = await fetch(`${server.url}/api/auth/csrf`, { headers: { cookie } })
  const { csrfToken } = Object(await csrf.json())
  const cookies = [cookie, ...csrf.headers.getSetCookie().map((each) => each.split(';')[0])].join('; ')
  const body = new URLSearchParams({ csrfToken, json: 'true', callbackUrl: '/' })
  await fetch(`${server.url}/api/auth/signout`, { method: 'POST', body, headers: { cookie: cookies, origin: server.url } })
  expect(await status()).toBe(401)
})

test('a body of 100 kB does not reach the sign-in', async () => {
  const body = new URLSearchParams({ password: 'x'.repeat(100_000) })
  expect((await fetch(`${server.url}/api/auth/callback/credentials`, { method: 'POST', body })).status).toBe(413)
})

test('a wrong password opens nothing', async () => {
  const response = await signIn('wrong')
  expect([response.status, sessionOf(response)]).toEqual([401, undefined])
})

test('who is disabled in every team is told so at the door', async () => {
  const { json } = await me.post('/invitations', { email: 'out@example.org', roles: ['viewer'] })
  const token = String(json.url).split('/').at(-1)
  await me.post('/invitations/accept', { token, name: 'Out', password: 'long enough' })
  const { items } = Object((await me.ask('/people')).json)
  const out = Array.from(items, Object).find(({ email }) => email === 'out@example.org')
  const headers = { 'if-match': '1' }
  await me.ask(`/people/${out.id}`, { method: 'PATCH', body: JSON.stringify({ disabled: true }), headers })
  const response = await signIn('long enough', 'out@example.org')
  expect(Object(await response.json()).url).toContain('error=forbidden')
})

test('a page carries a policy with a nonce of its own, and sends a stranger to sign in', async () => {
  const pages = await Promise.all([1, 2].map(() => fetch(`${server.url}/sign-in`)))
  const nonces = pages.map(({ headers }) => /'nonce-([^']+)'/.exec(headers.get('content-security-policy') ?? '')?.[1])
  expect(nonces[0]).toBeTruthy()
  expect(nonces[0]).not.toBe(nonces[1])
  expect(await pages[0].text()).not.toMatch(/ style="/)
  const home = await fetch(`${server.url}/`, { redirect: 'manual' })
  expect([home.status, home.headers.get('location')]).toEqual([307, '/sign-in'])
  const jobs = await fetch(`${server.url}/jobs?q=north&sort=title`, { redirect: 'manual' })
  expect(jobs.headers.get('location')).toBe('/sign-in?to=%2Fjobs%3Fq%3Dnorth%26sort%3Dtitle')
})

test('60 MiB are taken in whole, 65 MiB are 413, and the server lives on', async () => {
  const padding = `999\n${'x'.repeat(1019)}\n`
  const whole = padding.repeat(60 * 1024) + rectanglesDxf([0, 0, 40, 60])
  const saved = await me.upload(profileId, whole)
  expect(saved.status, JSON.stringify(saved.json.findings ?? saved.json).slice(0, 300)).toBe(201)
  expect(Object(Object(saved.json.revision).file).bytes).toBe(whole.length)
  expect((await me.upload(profileId, padding.repeat(65 * 1024)).catch(() => ({ status: 413 }))).status).toBe(413)
  expect((await fetch(`${server.url}/api/health`)).status).toBe(200)
})

test('an upload that the client breaks off leaves nothing behind', async () => {
  const abort = new AbortController()
  const body = new ReadableStream<Uint8Array>({
    async pull(controller) {
      controller.enqueue(
        new TextEncoder().encode(
          `--b\r\ncontent-disposition: form-data; name="file"; filename="a.dxf"\r\n\r\n${'x'.repeat(1e5)}`,
        ),
      )
      await wait(50)
    },
  })
  const headers = { cookie: me.cookie, origin: server.url, 'content-type': 'multipart/form-data; boundary=b' }
  const init: RequestInit & { duplex: 'half' } = { method: 'POST', body, headers, duplex: 'half', signal: abort.signal }
  const sent = fetch(`${server.url}/api/v1/profiles/${profileId}/revisions`, init).catch(() => null)
  await wait(400)
  abort.abort()
  await sent
  await wait(500)
  expect(readdirSync(path.join(dataDir, 'incoming'))).toEqual([])
})

test('the data folder and its secret are for the server’s user only', () => {
  expect(statSync(dataDir).mode & 0o777).toBe(0o700)
  expect(statSync(path.join(dataDir, 'secret')).mode & 0o777).toBe(0o600)
})

test('a backup made while the server runs is restored with everything in it; restoring over a running server is refused', async () => {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'sectionwright-backup-'))
  const file = path.join(folder, 'kept.sqlite')
  expect(admin('backup', file)).toMatchObject({ status: 0, said: expect.stringContaining('checked and sound') })
  const before = (await me.ask('/events?limit=200')).json
  await me.post('/jobs', { title: 'After the backup' })
  expect(admin('restore', file)).toMatchObject({ status: 1, said: expect.stringContaining('The server is running') })
  await server.stop()
  expect(admin('restore', file)).toMatchObject({ status: 0 })
  server = await startServer(dataDir)
  me = me.at(server.url)
  expect((await me.ask('/events?limit=200')).json).toEqual(before)
  expect(existsSync(path.join(dataDir, 'backups'))).toBe(true)
  rmSync(folder, { recursive: true })
})

test('a new password is printed, opens the door and ends the old sessions; a further team shares nothing', async () => {
  const { said } = admin('reset-password', 'ann@example.org')
  const password = said.trim().split(' ').at(-1) ?? ''
  expect((await me.ask('/me')).status).toBe(401)
  const cookie = sessionOf(await signIn(password))?.split(';')[0] ?? ''
  expect(admin('team-create', 'Second', 'ann@example.org')).toMatchObject({
    status: 0,
    said: expect.stringContaining('“Second”'),
  })
  const { teams } = Object((await me.ask('/me', { headers: { cookie } })).json)
  expect(teams).toHaveLength(2)
  expect(admin('reset-password', 'nobody@example.org')).toMatchObject({ status: 1 })
})

test('a busy port is told in one sentence', () => {
  const port = new URL(server.url).port
  const { status, stderr } = spawnSync(process.execPath, ['scripts/serve.mjs'], {
    cwd: root,
    encoding: 'utf8',
    env: { ...process.env, PORT: port, DATA_DIR: dataDir },
  })
  expect([status, stderr.trim()]).toEqual([
    1,
    `Port ${port} is in use. Stop what runs there, or choose another: PORT=${Number(port) + 1} npm start`,
  ])
})

test('stopped in its own way the server leaves a sound database', async () => {
  await server.stop()
  expect(inspect(dataDir)).toMatchObject(WHOLE)
})
