import type { TeamId } from '@/db/id'
import { expect, test } from 'vitest'
import type { Database } from '@/db/client'
import { listProfiles } from '@/db/profiles'
import type { Profile, ProfileQuery } from '@/lib/api/schemas/profile'
import { freshDatabase } from '@/tests/support/database'
import { random } from '@/tests/support/random'
import { givenTeam } from '@/tests/support/team'
import { givenJob, givenProfile, givenRevision } from '@/tests/support/things'

const SORTS = ['number', 'title', 'updatedAt', 'area', 'mass', 'ix', 'iy', 'circle'] as const
const ASK: ProfileQuery = { sort: 'number', dir: 'asc', limit: 3, bin: false }

async function given() {
  const database = await freshDatabase()
  const { actor } = await givenTeam(database)
  const job = await givenJob(database, actor)
  const next = random(7)
  for (let k = 0; k < 11; k++) {
    const profile = await givenProfile(database, actor, job.id, `Bar ${'bdac'[k % 4]}`)
    if (k % 3 > 0) await givenRevision(database, actor, profile.id, { b: 10 + Math.floor(next() * 3), h: 40 })
  }
  return { database, teamId: actor.teamId, jobId: job.id }
}

async function everyPage({ read }: Database, teamId: TeamId, ask: ProfileQuery): Promise<Profile[]> {
  const found: Profile[] = []
  for (let cursor: string | undefined; ; ) {
    const { items, next, total } = await listProfiles(read, teamId, { ...ask, cursor })
    expect(total).toBe(11)
    found.push(...items)
    if (next === null) return found
    cursor = next
  }
}

test('pages of three visit 11 profiles once each in every order, those without a figure last', async () => {
  const { database, teamId } = await given()
  for (const sort of SORTS) {
    for (const dir of ['asc', 'desc'] as const) {
      const found = await everyPage(database, teamId, { ...ASK, sort, dir })
      expect(new Set(found.map(({ id }) => id)).size).toBe(11)
      const whole = await listProfiles(database.read, teamId, { ...ASK, sort, dir, limit: 200 })
      expect(found.map(({ id }) => id)).toEqual(whole.items.map(({ id }) => id))
      if (sort === 'ix') {
        const values = found.map(({ latest }) => latest?.figures.ix)
        expect(values.slice(-4)).toEqual([undefined, undefined, undefined, undefined])
        const known = values.slice(0, 7).map(Number)
        expect(known).toEqual(known.toSorted((a, b) => (dir === 'asc' ? a - b : b - a)))
      }
    }
  }
})

test('a cursor of another order or filter is refused', async () => {
  const { database, teamId, jobId } = await given()
  const { next } = await listProfiles(database.read, teamId, ASK)
  const cursor = next ?? ''
  await expect(listProfiles(database.read, teamId, { ...ASK, cursor, dir: 'desc' })).rejects.toMatchObject({ code: 'invalid' })
  await expect(listProfiles(database.read, teamId, { ...ASK, cursor, jobId })).rejects.toMatchObject({ code: 'invalid' })
  await expect(listProfiles(database.read, teamId, { ...ASK, cursor: 'nonsense' })).rejects.toMatchObject({ code: 'invalid' })
})

test('every order of profiles is read from an index, without sorting 100,000 rows', async () => {
  const { database, teamId } = await given()
  for (const figure of ['area', 'mass', 'ix', 'iy', 'circle']) {
    for (const [dir, behind] of [
      ['asc', 'is null'],
      ['desc', 'is not null'],
    ]) {
      const order = `(profile.${figure} ${behind}) ${dir}, profile.${figure} ${dir}, profile.id ${dir}`
      const text = `explain query plan select id from profile where profile.team_id = ? and profile.binned_at is null order by ${order}`
      const plan = database.writer.prepare<[string], { detail: string }>(text).all(teamId)
      expect(plan.map(({ detail }) => detail).join()).not.toMatch(/TEMP B-TREE/)
    }
  }
})

test('conditions and words narrow the list: 20 mm wide, over 40 cm⁴ none', async () => {
  const { database, teamId } = await given()
  const count = async (q: string) => (await listProfiles(database.read, teamId, { ...ASK, q, limit: 200 })).total
  expect(await count('ix>=1cm4')).toBe(7)
  expect(await count('ix>=40cm4')).toBe(0)
  expect(await count('bar mass<=1.3')).toBe(7)
  expect(await count('P-0003')).toBe(1)
  expect(await count('100%')).toBe(0)
})
