import { beforeEach, expect, test } from 'vitest'
import { POST as restore } from '@/app/api/v1/jobs/[id]/restore/route'
import { DELETE as bin, PATCH as change, GET as read } from '@/app/api/v1/jobs/[id]/route'
import { GET as list, POST as open } from '@/app/api/v1/jobs/route'
import { GET as readProfile } from '@/app/api/v1/profiles/[id]/route'
import { POST as add, GET as profiles } from '@/app/api/v1/profiles/route'
import { page } from '@/lib/api/schemas/common'
import { Job } from '@/lib/api/schemas/job'
import { Profile } from '@/lib/api/schemas/profile'
import { call, givenDatabase } from '@/tests/support/call'
import { givenTeam, type Member } from '@/tests/support/team'

let me: Member
beforeEach(async () => {
  me = await givenTeam(await givenDatabase())
})
const cookie = () => me.cookie
const openJob = async (title: string) => Job.parse((await call(open, { method: 'POST', cookie: cookie(), body: { title } })).json)

test('jobs are numbered J-0001, J-0002 in their team', async () => {
  expect((await openJob('North')).number).toBe('J-0001')
  expect((await openJob('South')).number).toBe('J-0002')
  const other = await givenTeam(await givenDatabase())
  expect((await call(open, { method: 'POST', cookie: other.cookie, body: { title: 'East' } })).json).toMatchObject({
    number: 'J-0001',
  })
})

test('a change without the version seen is 428, with an old one 412 and shows what stands now', async () => {
  const { id } = await openJob('North')
  const ask = { method: 'PATCH', cookie: cookie(), params: { id } }
  expect((await call(change, { ...ask, body: { title: 'A' } })).status).toBe(428)
  expect((await call(change, { ...ask, body: { title: 'A' }, version: 1 })).json).toMatchObject({ title: 'A', version: 2 })
  const stale = await call(change, { ...ask, body: { title: 'B' }, version: 1 })
  expect(stale.status).toBe(412)
  expect(stale.json).toMatchObject({ code: 'stale', current: { title: 'A', version: 2 } })
  expect(stale.headers.get('content-type')).toBe('application/problem+json')
})

test('a change of one field leaves the others', async () => {
  const { json } = await call(open, { method: 'POST', cookie: cookie(), body: { title: 'North', client: 'Port' } })
  const { id } = Job.parse(json)
  const changed = await call(change, { method: 'PATCH', cookie: cookie(), params: { id }, body: { title: 'South' }, version: 1 })
  expect(changed.json).toMatchObject({ title: 'South', client: 'Port' })
})

test('what is wrong with a body is said field by field', async () => {
  const { status, json } = await call(open, { method: 'POST', cookie: cookie(), body: { title: ' ', colour: 'red' } })
  expect(status).toBe(422)
  expect(json).toMatchObject({ code: 'invalid', issues: [{ path: 'title' }, { path: '' }] })
  const broken = await call(open, { method: 'POST', cookie: cookie(), headers: { 'content-type': 'application/json' } })
  expect(broken.json).toMatchObject({ code: 'invalid', detail: 'The body is not JSON.' })
})

test('a binned job takes its profiles out of the lists, undo brings both back', async () => {
  const job = await openJob('North')
  const added = await call(add, { method: 'POST', cookie: cookie(), body: { jobId: job.id, title: 'Bar' } })
  const profile = Profile.parse(added.json)
  const listed = async () => [
    page(Job).parse((await call(list, { cookie: cookie() })).json).total,
    page(Profile).parse((await call(profiles, { cookie: cookie() })).json).total,
  ]
  expect(await listed()).toEqual([1, 1])
  const binned = await call(bin, { method: 'DELETE', cookie: cookie(), params: { id: job.id }, version: job.version })
  expect(binned.json).toMatchObject({ version: 2 })
  expect(await listed()).toEqual([0, 0])
  expect(page(Job).parse((await call(list, { cookie: cookie(), query: '?bin=true' })).json).items[0].binnedAt).not.toBeNull()
  expect((await call(readProfile, { cookie: cookie(), params: { id: profile.id } })).status).toBe(200)
  const refused = await call(add, { method: 'POST', cookie: cookie(), body: { jobId: job.id, title: 'Late' } })
  expect(refused.json).toMatchObject({ status: 409, code: 'binned' })
  await call(restore, { method: 'POST', cookie: cookie(), params: { id: job.id } })
  expect(await listed()).toEqual([1, 1])
  expect((await call(read, { cookie: cookie(), params: { id: job.id } })).json).toMatchObject({ binnedAt: null, version: 3 })
})

test('a profile cannot be put into another team’s job or made of its material', async () => {
  const job = await openJob('North')
  const body = { jobId: job.id, title: 'Bar', materialId: 'b'.repeat(26) }
  expect((await call(add, { method: 'POST', cookie: cookie(), body })).status).toBe(404)
})

test('words find a job in any of its fields, percent signs are only text', async () => {
  await call(open, { method: 'POST', cookie: cookie(), body: { title: 'North 100 %', client: 'Port of Almere' } })
  await openJob('South')
  const total = async (q: string) =>
    page(Job).parse((await call(list, { cookie: cookie(), query: `?q=${encodeURIComponent(q)}` })).json).total
  expect([await total('almere north'), await total('j-0002'), await total('%'), await total('_'), await total('')]).toEqual([
    1, 1, 1, 0, 2,
  ])
})
