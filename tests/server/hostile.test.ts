import { afterAll, beforeAll, expect, test } from 'vitest'
import { z } from 'zod'
import { Finding } from '@/lib/api/schemas/section'
import { HOSTILE } from '@/tests/support/hostile'
import { rectanglesDxf } from '@/tests/support/rectanglesDxf'
import { inspect, WHOLE } from './inspect'
import { firstPerson, type Person } from './person'
import { newDataDir, removeDataDir, type Server, startServer } from './server'

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

const Findings = z.array(Finding)
let saved = 0

test.each(HOSTILE)('$name: a clear sentence and nothing stored, or read right', async ({ bytes, file, expects }) => {
  const started = Date.now()
  const { status, json } = await me.upload(profileId, new Uint8Array(bytes), { name: file })
  expect(Date.now() - started).toBeLessThan(20_000)
  if ('area' in expects) {
    expect(status, JSON.stringify(json.findings ?? json)).toBe(201)
    saved++
    expect(Number(Object(json.section).area)).toBeWithin(expects.area, { relative: 1e-9 })
  } else {
    expect([413, 422]).toContain(status)
    const sentences = [json.detail, ...Findings.parse(json.findings ?? []).map(({ message }) => message)].join(' ')
    expect(sentences).toMatch(expects.says)
  }
})

test('after all of it the server takes a good drawing and holds only what was good', async () => {
  expect((await me.upload(profileId, rectanglesDxf([0, 0, 40, 60]))).status).toBe(201)
  await server.stop()
  expect(inspect(dataDir)).toMatchObject({ ...WHOLE, revisions: saved + 1 })
})
