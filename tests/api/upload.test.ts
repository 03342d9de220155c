import { createHash } from 'node:crypto'
import { readdirSync } from 'node:fs'
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest'
import { GET as files } from '@/app/api/v1/files/route'
import { GET as list } from '@/app/api/v1/profiles/[id]/revisions/route'
import { GET as readProfile } from '@/app/api/v1/profiles/[id]/route'
import { GET as file } from '@/app/api/v1/revisions/[id]/file/route'
import { GET as region } from '@/app/api/v1/revisions/[id]/region/route'
import { GET as read } from '@/app/api/v1/revisions/[id]/route'
import { GET as section } from '@/app/api/v1/revisions/[id]/section/route'
import type { Database } from '@/db/client'
import { RevisionAdded } from '@/lib/api/schemas/revision'
import { config } from '@/lib/config'
import { opinionsSettled } from '@/lib/jobs/saveRevision'
import type { SectionPool } from '@/lib/jobs/server-pool'
import { call, givenDatabase } from '@/tests/support/call'
import { rectanglesDxf } from '@/tests/support/rectanglesDxf'
import { givenTeam, type Member } from '@/tests/support/team'
import { givenJob, givenProfile } from '@/tests/support/things'
import { givenPool, upload } from '@/tests/support/upload'

const BOX = rectanglesDxf([0, 0, 40, 60], [5, 5, 30, 50])
const CONFIRMED = { confirmation: { by: 'typed', value: 60, measured: 60, what: 'depth', finished: 'finished' } }
const sha256 = createHash('sha256').update(BOX).digest('hex')

let pool: SectionPool
let database: Database
let me: Member
let profileId = ''
beforeAll(async () => {
  pool = await givenPool()
})
afterAll(() => pool.close())
beforeEach(async () => {
  await opinionsSettled()
  database = await givenDatabase()
  me = await givenTeam(database)
  profileId = (await givenProfile(database, me.actor, (await givenJob(database, me.actor)).id)).id
})
const rows = (table: string) => database.writer.prepare<[], { n: number }>(`select count(*) as n from ${table}`).get()?.n
const nothingStored = () => {
  expect(['revision', 'section', 'source_file', 'chunk', 'intake'].map(rows)).toEqual([0, 0, 0, 0, 0])
  expect(readdirSync(config().incomingDir)).toEqual([])
}

test('a 40 × 60 box with a 30 × 50 hole is saved as revision A with A 900 mm² and Ix 407,500 mm⁴', async () => {
  const answer = await upload(me, profileId, { bytes: BOX, name: 'box.dxf', fields: CONFIRMED })
  expect(answer.status, answer.text).toBe(201)
  const { revision, section: stored } = RevisionAdded.parse(answer.json)
  expect(revision).toMatchObject({
    letter: 'A',
    state: 'draft',
    file: { name: 'box.dxf', bytes: BOX.length, sha256, alsoIn: [] },
  })
  expect(stored.area).toBeWithin(900, { relative: 1e-12 })
  expect(stored.ix).toBeWithin((40 * 60 ** 3 - 30 * 50 ** 3) / 12, { relative: 1e-12 })
  const profile = await call(readProfile, { cookie: me.cookie, params: { id: profileId } })
  expect(profile.json).toMatchObject({
    revisions: 1,
    version: 2,
    latest: { id: revision.id, letter: 'A', figures: { ix: stored.ix } },
  })
  expect(['intake', 'source_file', 'revision'].map(rows)).toEqual([0, 1, 1])
  expect(readdirSync(config().incomingDir)).toEqual([])
})

test('the file comes back byte for byte, as a download that runs nothing', async () => {
  const bytes = new TextEncoder().encode(BOX.replace('$ACADVER', '$ACADVER').replaceAll('\n', '\r\n'))
  const { json } = await upload(me, profileId, { bytes, name: 'Ø 60 "x"; ../..\\a;b.dxf' })
  const { revision } = RevisionAdded.parse(json)
  const got = await call(file, { cookie: me.cookie, params: { id: revision.id } })
  expect(new Uint8Array(await got.response.arrayBuffer())).toEqual(bytes)
  expect(got.headers.get('content-disposition')).toBe(`attachment; filename="a;b.dxf"; filename*=UTF-8''a%3Bb.dxf`)
  expect(got.headers.get('content-security-policy')).toContain('sandbox')
  const packed = await call(region, { cookie: me.cookie, params: { id: revision.id } })
  expect((await packed.response.arrayBuffer()).byteLength).toBeGreaterThan(100)
  const answer = await call(section, { cookie: me.cookie, params: { id: revision.id } })
  expect(answer.json).toMatchObject({ source: { bytes: bytes.length }, section: { pieces: 1 } })
})

test('the second opinions come after the section and agree', async () => {
  const { json } = await upload(me, profileId, { bytes: BOX, fields: CONFIRMED })
  const { id } = RevisionAdded.parse(json).revision
  await opinionsSettled()
  const { opinions } = RevisionAdded.shape.revision.parse((await call(read, { cookie: me.cookie, params: { id } })).json)
  expect(opinions?.length).toBeGreaterThan(1)
  expect(opinions?.every(({ agrees }) => agrees !== false)).toBe(true)
})

test('a drawing that gives no section is 422 with findings, and nothing of it is stored', async () => {
  const answer = await upload(me, profileId, { bytes: 'This is no drawing.' })
  expect(answer.status).toBe(422)
  expect(answer.json.code).toBe('no_section')
  expect(JSON.stringify(answer.json.findings)).toContain('This is a text, not a DXF.')
  nothingStored()
})

test('figures that differ from what the browser showed by 1e-9 are refused, by 1e-14 saved', async () => {
  const shown = (area: number) => ({ ...CONFIRMED, shown: { area, ixy: 1e-9 } })
  const refused = await upload(me, profileId, { bytes: BOX, fields: shown(900 * (1 + 1e-9)) })
  expect(refused.json).toMatchObject({ status: 422, code: 'disagreement', different: ['area'] })
  nothingStored()
  expect((await upload(me, profileId, { bytes: BOX, fields: shown(900 * (1 + 1e-14)) })).status).toBe(201)
})

test('the same key gives the same revision once, another body with it is refused', async () => {
  const first = await upload(me, profileId, { bytes: BOX, key: 'key-0001' })
  const again = await upload(me, profileId, { bytes: BOX, key: 'key-0001' })
  expect([first.status, again.status]).toEqual([201, 201])
  expect(RevisionAdded.parse(again.json).revision.id).toBe(RevisionAdded.parse(first.json).revision.id)
  expect(rows('revision')).toBe(1)
  const other = await upload(me, profileId, { bytes: rectanglesDxf([0, 0, 1, 1]), key: 'key-0001' })
  expect(other.json).toMatchObject({ status: 422, code: 'key_reused' })
})

test('a refusal is kept with its key too', async () => {
  const refusals = [1, 2].map(() => upload(me, profileId, { bytes: 'nothing', key: 'key-0002' }))
  const [first] = await Promise.all([refusals[0]])
  const again = await upload(me, profileId, { bytes: 'nothing', key: 'key-0002' })
  await refusals[1]
  expect(again.status).toBe(422)
  expect(again.json.findings).toEqual(first.json.findings)
})

test('a retry while the first is at work is 409', async () => {
  const [first, second] = await Promise.all([1, 2].map(() => upload(me, profileId, { bytes: BOX, key: 'key-0003' })))
  expect([first.status, second.status].toSorted()).toEqual([201, 409])
  expect(rows('revision')).toBe(1)
})

test('a second profile from the same sheet needs no bytes, and each names the other', async () => {
  await upload(me, profileId, { bytes: BOX })
  const known = await call(files, { cookie: me.cookie, query: `?sha256=${sha256}` })
  expect(known.json).toMatchObject({ known: true, uses: [{ profileId, number: 'P-0001', letter: 'A' }] })
  const second = (await givenProfile(database, me.actor, (await givenJob(database, me.actor)).id)).id
  const { json } = await upload(me, second, { fileSha256: sha256 })
  expect(RevisionAdded.parse(json).revision.file.alsoIn).toEqual([{ profileId, number: 'P-0001', letter: 'A' }])
  expect([rows('source_file'), rows('revision')]).toEqual([1, 2])
  expect((await upload(me, second, { fileSha256: '0'.repeat(64) })).status).toBe(404)
})

test('revisions are A, B, C, newest first, and the profile shows the newest figures', async () => {
  for (const h of [60, 70, 80]) await upload(me, profileId, { bytes: rectanglesDxf([0, 0, 40, h]) })
  const { json } = await call(list, { cookie: me.cookie, params: { id: profileId } })
  expect(json).toMatchObject({ items: [{ letter: 'C' }, { letter: 'B' }, { letter: 'A' }] })
  const profile = await call(readProfile, { cookie: me.cookie, params: { id: profileId } })
  expect(profile.json).toMatchObject({ latest: { letter: 'C', figures: { area: 3200 } } })
})

test('a material gives the mass and is stored as used', async () => {
  const material = await database.read
    .selectFrom('material')
    .selectAll()
    .where('name', '=', 'EN AW-6060 T66')
    .executeTakeFirstOrThrow()
  const { json } = await upload(me, profileId, { bytes: BOX, recipe: { material: material.id } })
  const { revision, section: stored } = RevisionAdded.parse(json)
  expect(stored.mass).toBeWithin(2.43, { relative: 1e-12 })
  expect(revision.material).toEqual({ id: material.id, name: material.name, density: 2700, source: material.source })
  const unknown = await upload(me, profileId, { bytes: BOX, recipe: { material: 'd'.repeat(26) } })
  expect(unknown.json).toMatchObject({ status: 422, code: 'invalid' })
})

test('what is no multipart upload, has no file, or a recipe that cannot be used says so', async () => {
  const { POST } = await import('@/app/api/v1/profiles/[id]/revisions/route')
  const plain = await call(POST, { method: 'POST', cookie: me.cookie, params: { id: profileId }, body: {} })
  expect(plain.json).toMatchObject({ status: 415, code: 'not_multipart' })
  expect((await upload(me, profileId, { fields: {} })).json).toMatchObject({ status: 422, code: 'invalid' })
  expect((await upload(me, profileId, { bytes: BOX, recipe: { unit: 'ell' } })).json).toMatchObject({
    code: 'invalid',
    issues: [{ path: 'unit' }],
  })
  nothingStored()
})

test('a file over the limit is 413', async () => {
  const announced = await upload(me, profileId, { bytes: new Uint8Array(config().maxFileBytes + 1) })
  expect(announced.json).toMatchObject({ status: 413, code: 'too_large' })
  nothingStored()
})

test('nothing can be saved to a profile in the bin', async () => {
  await database.write.updateTable('profile').set({ binnedAt: new Date().toISOString() }).execute()
  expect((await upload(me, profileId, { bytes: BOX })).json).toMatchObject({ status: 409, code: 'binned' })
  nothingStored()
})
