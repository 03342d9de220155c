import { afterAll, expect, test } from 'vitest'
import { rectanglesDxf } from '@/tests/support/rectanglesDxf'
import { inspect, WHOLE } from './inspect'
import { firstPerson } from './person'
import { newDataDir, removeDataDir, startServer } from './server'

const dataDir = newDataDir()
afterAll(() => removeDataDir(dataDir))

test('a full disk refuses 8 MiB with 507, keeps what was there, and takes 1 KiB after', async () => {
  // pages of 4 KiB: room for about 4 MiB in all
  const server = await startServer(dataDir, { MAX_PAGES: '1000' })
  const me = await firstPerson(server.url)
  const profileId = await me.profile()
  const small = rectanglesDxf([0, 0, 40, 60])
  expect((await me.upload(profileId, small)).status).toBe(201)
  const large = `999\n${'x'.repeat(1000)}\n`.repeat(8 * 1024) + small
  const refused = await me.upload(profileId, large, { key: 'large-one' })
  expect(refused).toMatchObject({ status: 507, json: { code: 'storage_full' } })
  expect(String(refused.json.title)).toContain('Nothing was saved')
  expect((await me.upload(profileId, rectanglesDxf([0, 0, 40, 70]))).status).toBe(201)
  await server.stop()
  expect(inspect(dataDir)).toMatchObject({ ...WHOLE, revisions: 2 })
})
