import { createHash } from 'node:crypto'
import { existsSync, readdirSync, rmSync, writeFileSync } from 'node:fs'
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest'
import { writeBlob } from '@/db/blobs'
import type { Database } from '@/db/client'
import { newId } from '@/db/id'
import type { Intake } from '@/db/intakes'
import { setClock } from '@/db/now'
import { getRevision } from '@/db/revisions'
import { RecipeInput } from '@/lib/api/schemas/recipe'
import { RevisionFields } from '@/lib/api/schemas/revision'
import { config } from '@/lib/config'
import { GET as intakes } from '@/app/api/v1/intakes/route'
import { incomingPath, isEarlier, takeIn } from '@/lib/jobs/intake'
import { recover } from '@/lib/jobs/recovery'
import { opinionsSettled } from '@/lib/jobs/saveRevision'
import type { SectionPool } from '@/lib/jobs/server-pool'
import { sweep } from '@/lib/jobs/sweep'
import { call, givenDatabase } from '@/tests/support/call'
import { rectanglesDxf } from '@/tests/support/rectanglesDxf'
import { givenMember, givenTeam, type Member } from '@/tests/support/team'
import { givenJob, givenProfile, givenRevision } from '@/tests/support/things'
import { givenPool, upload } from '@/tests/support/upload'

const BOX = rectanglesDxf([0, 0, 40, 60])
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
  setClock()
  database = await givenDatabase()
  me = await givenTeam(database)
  profileId = (await givenProfile(database, me.actor, (await givenJob(database, me.actor)).id)).id
})
const rows = (text: string) => database.writer.prepare<[], { n: number }>(`select count(*) as n from ${text}`).get()?.n

/** An upload at the moment before it is computed: what a killed server leaves. */
async function interrupted(key: string | null = null): Promise<Intake> {
  const id = newId()
  writeFileSync(incomingPath(id), BOX)
  const form = { recipe: RecipeInput.parse({}), fields: RevisionFields.parse({}) }
  const taken = await takeIn(me.actor, { id, profileId, key, fileName: 'a.dxf', sha256, bytes: BOX.length, form })
  if (isEarlier(taken)) throw new Error('answered before')
  return taken
}

test('an upload that was taken in is finished at the next start, and the retry with its key gets that revision', async () => {
  const { id } = await interrupted('retried-key')
  await writeBlob(`${id}-file`, [Buffer.from(BOX)])
  writeFileSync(incomingPath('stray'), 'half a file')
  await recover()
  await opinionsSettled()
  expect(await getRevision(database.read, me.actor.teamId, id)).toMatchObject({ letter: 'A', file: { sha256 } })
  expect([rows('intake'), rows('source_file'), readdirSync(config().incomingDir)]).toEqual([0, 1, []])
  const key = database.writer
    .prepare<[], { status: number; result_id: string }>('select status, result_id from idempotency')
    .get()
  expect(key).toEqual({ status: 201, result_id: id })
})

test('an upload under way is listed for its own person only, until its revision is there', async () => {
  const { id } = await interrupted()
  const items = async ({ cookie }: Member) => (await call(intakes, { cookie })).json.items
  expect(await items(me)).toEqual([expect.objectContaining({ id, profileId, number: 'P-0001', fileName: 'a.dxf' })])
  expect(await items(await givenMember(database, me.actor.teamId, { roles: ['designer'] }))).toEqual([])
  await recover()
  await opinionsSettled()
  expect(await items(me)).toEqual([])
})

test('an upload whose bytes are gone, or that was tried three times, is given up and written down', async () => {
  rmSync(incomingPath((await interrupted()).id))
  const tried = await interrupted('tried-key')
  database.writer.prepare('update intake set attempts = 3 where id = ?').run(tried.id)
  await recover()
  expect([rows('revision'), rows('intake'), rows("event where verb = 'upload.given_up'"), rows('idempotency')]).toEqual([
    0, 0, 2, 0,
  ])
  expect(existsSync(incomingPath(tried.id))).toBe(false)
})

test('second opinions lost with a stopped server are asked again; the section stays as it was', async () => {
  const { json } = await upload(me, profileId, { bytes: BOX })
  await opinionsSettled()
  const id = String(Object(json.revision).id)
  const before = await getRevision(database.read, me.actor.teamId, id)
  database.writer.prepare('update revision set opinions = null').run()
  await recover()
  await opinionsSettled()
  expect(await getRevision(database.read, me.actor.teamId, id)).toEqual(before)
})

test('after 30 days the bin is emptied with file and chunks, other uses of the file stay', async () => {
  await givenRevision(database, me.actor, profileId, { bytes: Buffer.from('only here') })
  const other = await givenProfile(database, me.actor, (await givenJob(database, me.actor)).id)
  await givenRevision(database, me.actor, profileId, { bytes: Buffer.from('in both') })
  await givenRevision(database, me.actor, other.id, { bytes: Buffer.from('in both') })
  const binned = new Date().toISOString()
  database.writer.prepare('update profile set binned_at = ? where id = ?').run(binned, profileId)
  await sweep()
  expect(rows('profile')).toBe(2)
  setClock(() => new Date(Date.parse(binned) + 31 * 86_400_000))
  await sweep()
  expect([rows('profile'), rows('revision'), rows('source_file'), rows('section')]).toEqual([1, 1, 1, 1])
  expect(rows('chunk')).toBe(2)
  expect(rows("event where verb = 'profile.purged'")).toBe(1)
})
