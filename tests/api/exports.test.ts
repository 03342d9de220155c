import { afterAll, beforeAll, expect, test } from 'vitest'
import { POST as demo } from '@/app/api/v1/demo/route'
import { GET as profiles } from '@/app/api/v1/profiles/route'
import { GET as csv } from '@/app/api/v1/revisions/[id]/figures.csv/route'
import { GET as picture } from '@/app/api/v1/revisions/[id]/picture.svg/route'
import { GET as regionDxf } from '@/app/api/v1/revisions/[id]/region.dxf/route'
import { readBlob } from '@/db/blobs'
import type { Database } from '@/db/client'
import { newTeamId, type TeamId } from '@/db/id'
import { listMaterials } from '@/db/materials'
import { getRevision, getStored } from '@/db/revisions'
import { createTeam } from '@/db/teams'
import { page } from '@/lib/api/schemas/common'
import { Profile } from '@/lib/api/schemas/profile'
import { RevisionAdded } from '@/lib/api/schemas/revision'
import { ROLES } from '@/lib/auth/permissions'
import { DEFAULT_RECIPE } from '@/lib/geometry/recipe'
import { opinionsSettled } from '@/lib/jobs/saveRevision'
import type { SectionPool } from '@/lib/jobs/server-pool'
import { readTask, sectionTask } from '@/lib/jobs/tasks'
import { call, givenDatabase } from '@/tests/support/call'
import { rectanglesDxf } from '@/tests/support/rectanglesDxf'
import { givenMember, givenTeam, type Member } from '@/tests/support/team'
import { givenJob, givenProfile } from '@/tests/support/things'
import { givenPool, upload } from '@/tests/support/upload'

let pool: SectionPool
let database: Database
beforeAll(async () => {
  pool = await givenPool()
})
afterAll(async () => {
  await opinionsSettled()
  await pool.close()
})

async function saved(name: string): Promise<{ me: Member; id: string; profileId: string; area: number }> {
  database = await givenDatabase()
  const me = await givenTeam(database)
  const profileId = (await givenProfile(database, me.actor, (await givenJob(database, me.actor)).id, '=cmd|1')).id
  const { json } = await upload(me, profileId, { bytes: rectanglesDxf([0, 0, 40, 60], [5, 5, 30, 50]), name })
  const { revision, section } = RevisionAdded.parse(json)
  await opinionsSettled()
  return { me, id: revision.id, profileId, area: section.area }
}

test('figures as CSV carry full precision and no cell that a spreadsheet would run', async () => {
  const { me, id } = await saved('@evil.dxf')
  const { text, headers } = await call(csv, { cookie: me.cookie, params: { id }, query: '?separator=semicolon&bom=true' })
  expect(headers.get('content-disposition')).toContain('P-0001-A.csv')
  expect(text).toContain('ix;I_x;407500;mm4')
  expect(text).toMatch(/^caution;.*A competent person checks each figure/m)
  for (const line of text.slice(1).split('\r\n')) for (const cell of line.split(';')) expect(cell).not.toMatch(/^"?[=+@]/)
})

test('the clean region as DXF gives the same section when it is uploaded again', async () => {
  const { me, id, profileId, area } = await saved('a.dxf')
  const { text, headers } = await call(regionDxf, { cookie: me.cookie, params: { id } })
  expect(headers.get('content-disposition')).toContain('P-0001-A.dxf')
  const { json } = await upload(me, profileId, { bytes: text })
  expect(RevisionAdded.parse(json).section.area).toBe(area)
})

test('the picture is one SVG without script, style or text that needs a font', async () => {
  const { me, id } = await saved('<script>alert(1)</script>.dxf')
  const { text, headers } = await call(picture, { cookie: me.cookie, params: { id } })
  expect(headers.get('content-type')).toBe('image/svg+xml')
  expect(text).toMatch(/^<svg /)
  expect(text).not.toMatch(/<script|<text|style=|href=/)
})

/** Bytes, recipe and engine version are the whole input: the stored section comes out again to the last bit. */
async function expectSameWhenRecomputed(teamId: TeamId, id: string) {
  const { answer, file } = await getRevision(database.read, teamId, id)
  const { blobId } = await getStored(database.read, teamId, id)
  const chunks: Uint8Array[] = []
  for await (const chunk of readBlob(database.read, blobId)) chunks.push(chunk)
  const used = await listMaterials(database.read, teamId)
  const materials = Object.fromEntries(used.map(({ id: key, name, density, source }) => [key, { name, density, source }]))
  const { name, bytes, sha256 } = file
  const recipe = { ...DEFAULT_RECIPE, ...answer.recipe }
  const again = sectionTask(readTask(Buffer.concat(chunks)), { name, bytes, sha256 }, recipe, materials)
  expect(again.answer.section).toEqual(answer.section)
}

test('the demo loads 13 profiles in 3 jobs, twice alike to the last digit, and once a team', async () => {
  const stories: string[] = []
  for (const _ of [1, 2]) {
    database = await givenDatabase()
    const { teamId } = await database.write.transaction().execute((trx) => createTeam(trx, 'Demo', newTeamId('e'.repeat(26))))
    const me = await givenMember(database, teamId, { roles: ROLES, administrator: true })
    const loaded = await call(demo, { method: 'POST', cookie: me.cookie })
    expect(loaded.json, loaded.text).toEqual({ jobs: 3, profiles: 13 })
    const { json } = await call(profiles, { cookie: me.cookie, query: '?sort=number&dir=asc' })
    const { items } = page(Profile).parse(json)
    expect(items.filter(({ latest }) => latest === null)).toEqual([])
    stories.push(JSON.stringify(items.map(({ owner: _, material, ...item }) => ({ ...item, material: material?.name }))))
    expect((await call(demo, { method: 'POST', cookie: me.cookie })).json).toMatchObject({ status: 409, code: 'taken' })
    await opinionsSettled()
    for (const { latest } of items) await expectSameWhenRecomputed(teamId, latest?.id ?? '')
  }
  expect(stories[0]).toBe(stories[1])
})
