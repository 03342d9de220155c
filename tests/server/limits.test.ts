import { setTimeout as wait } from 'node:timers/promises'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { rectanglesDxf } from '@/tests/support/rectanglesDxf'
import { inspect, WHOLE } from './inspect'
import { firstPerson, type Person } from './person'
import { newDataDir, removeDataDir, type Server, startServer } from './server'

const dataDir = newDataDir()
let server: Server
let me: Person
let profileId = ''
beforeAll(async () => {
  server = await startServer(dataDir, { COMPUTE_CHILDREN: '1', SIGN_IN_ATTEMPTS: '1' })
  me = await firstPerson(server.url)
  profileId = await me.profile()
})
afterAll(async () => {
  await server.stop()
  removeDataDir(dataDir)
})

/** n bars lying over n bars: n² crossings from 2n outlines. */
function lattice(n: number): string {
  const bars = Array.from({ length: n }, (_, k): [number, number, number, number][] => [
    [3 * k, -1, 1, 3 * n + 1],
    [-1, 3 * k, 3 * n + 1, 1],
  ])
  return rectanglesDxf(...bars.flat())
}

test('a drawing of 9,000,000 crossings is stopped after 2 s with a sentence, and the next one is computed', async () => {
  const started = Date.now()
  const { status, json } = await me.upload(profileId, lattice(3000))
  expect(Date.now() - started).toBeLessThan(30_000)
  expect([status, json.code], JSON.stringify(json).slice(0, 500)).toEqual([422, 'compute_limit'])
  expect(json.detail).toContain('more than the 2 s')
  expect((await me.upload(profileId, rectanglesDxf([0, 0, 40, 60]))).status).toBe(201)
})

test('of six uploads at once by one person three are computed, the others told to wait with Retry-After', async () => {
  const answers = await Promise.all(Array.from({ length: 6 }, () => me.upload(profileId, rectanglesDxf([0, 0, 40, 60]))))
  const statuses = answers.map(({ status }) => status)
  expect(statuses.filter((status) => status === 201).length).toBeGreaterThanOrEqual(3)
  expect(statuses.every((status) => status === 201 || status === 429)).toBe(true)
})

test('an address made up in X-Forwarded-For does not get round the limit of attempts', async () => {
  const csrf = await fetch(`${server.url}/api/auth/csrf`)
  const { csrfToken } = Object(await csrf.json())
  const set = csrf.headers.getSetCookie().map((each) => each.split(';')[0])
  const attempt = async (k: number): Promise<string | null> => {
    const body = new URLSearchParams({ csrfToken, email: `n${k}@example.org`, password: 'x', json: 'true', callbackUrl: '/' })
    const headers = { cookie: set.join('; '), origin: server.url, 'x-forwarded-for': `10.0.0.${k}` }
    const response = await fetch(`${server.url}/api/auth/callback/credentials`, { method: 'POST', body, headers })
    return new URL(Object(await response.json()).url).searchParams.get('error')
  }
  // all at once: one attempt comes back every 12 s
  const errors = await Promise.all(Array.from({ length: 7 }, (_, k) => attempt(k)))
  expect(errors.filter((error) => error === 'wrong_password')).toHaveLength(5)
  expect(errors.filter((error) => error === 'too_many')).toHaveLength(2)
})

test('a computation that its person cancels frees the child at once', async () => {
  const patient = await startServer(newDataDir(), { COMPUTE_SECONDS: '60', COMPUTE_CHILDREN: '1' })
  const person = await firstPerson(patient.url)
  const profile = await person.profile()
  const abort = new AbortController()
  const cancelled = person.upload(profile, lattice(3000), { signal: abort.signal }).catch(() => 'cancelled')
  await wait(1500)
  abort.abort()
  expect(await cancelled).toBe('cancelled')
  const started = Date.now()
  expect((await person.upload(profile, rectanglesDxf([0, 0, 40, 60]))).status).toBe(201)
  expect(Date.now() - started).toBeLessThan(30_000)
  await patient.stop()
})

test('nothing is left of what was stopped or sent away', async () => {
  await server.stop()
  expect(inspect(dataDir)).toMatchObject(WHOLE)
})
