import { type Expression, sql } from 'kysely'
import { AppError } from '@/lib/api/errors'
import type { Profile, ProfileChange, ProfileFields, ProfileQuery } from '@/lib/api/schemas/profile'
import { type Condition, readSearch } from '@/lib/api/search'
import type { Actor } from './actor'
import type { Db, Trx } from './client'
import { nextNumber, profileNumber } from './counter'
import { record } from './events'
import { newId, type TeamId } from './id'
import { requireOpenJob } from './jobs'
import { containing, type Keyset, pageOf } from './list'
import { getMaterial } from './materials'
import { now } from './now'
import { requireMember } from './people'
import { type ProfileRow, profileColumns, toProfileView } from './profileView'

const plain = (column: 'number' | 'title' | 'updatedAt') => ({
  column: `profile.${column}`,
  id: 'profile.id',
  of: (row: ProfileRow) => row[column],
})
const figure = (column: 'area' | 'mass' | 'ix' | 'iy' | 'circle') => ({
  column: `profile.${column}`,
  id: 'profile.id',
  of: (row: ProfileRow) => row[column],
  nullable: true,
})
const KEYSET: Keyset<ProfileRow> = {
  number: plain('number'),
  title: plain('title'),
  updatedAt: plain('updatedAt'),
  area: figure('area'),
  mass: figure('mass'),
  ix: figure('ix'),
  iy: figure('iy'),
  circle: figure('circle'),
}

/** Left joins, though every owner is there: SQLite leaves out those that a count does not read. */
const profiles = (db: Db, teamId: TeamId) =>
  db
    .selectFrom('profile')
    .innerJoin('job', 'job.id', 'profile.jobId')
    .leftJoin('user as owner', 'owner.id', 'profile.ownerId')
    .leftJoin('material', 'material.id', 'profile.materialId')
    .leftJoin('revision', 'revision.id', 'profile.latestRevisionId')
    .where('profile.teamId', '=', teamId)
    .select(profileColumns)

/** Without the bin: neither the profile nor its job is in it. The bin shows the profiles put there themselves. */
export async function listProfiles(db: Db, teamId: TeamId, query: ProfileQuery) {
  const { q = '', jobId, ownerId, materialId, bin } = query
  const { words, conditions } = readSearch(q)
  let found = profiles(db, teamId)
  found = bin
    ? found.where('profile.binnedAt', 'is not', null)
    : found.where('profile.binnedAt', 'is', null).where('job.binnedAt', 'is', null)
  if (jobId) found = found.where('profile.jobId', '=', jobId)
  if (ownerId) found = found.where('profile.ownerId', '=', ownerId)
  if (materialId) found = found.where('profile.materialId', '=', materialId)
  for (const word of words) found = found.where(mentions(word))
  for (const condition of conditions) found = found.where(meets(condition))
  return pageOf(found, KEYSET, { ...query, filter: [q, jobId, ownerId, materialId, bin] }, toProfileView)
}

const mentions = (word: string): Expression<boolean> => sql<boolean>`(profile.title || ' ' || profile.drawing_number || ' ' ||
  printf('P-%04d', profile.number) || ' ' || job.title || ' ' || job.client || ' ' || ifnull(material.name, ''))
  like ${containing(word)} escape '\\'`

const meets = ({ figure, op, value }: Condition): Expression<boolean> =>
  sql<boolean>`${sql.ref(`profile.${figure}`)} ${sql.raw(op)} ${value}`

export async function getProfile(db: Db, teamId: TeamId, id: string): Promise<Profile> {
  const row = await profiles(db, teamId).where('profile.id', '=', id).executeTakeFirst()
  if (!row) throw new AppError('not_found')
  return toProfileView(row)
}

async function checkReferences(trx: Trx, teamId: TeamId, { jobId, materialId, ownerId }: ProfileChange): Promise<void> {
  if (jobId) await requireOpenJob(trx, teamId, jobId)
  if (materialId) await getMaterial(trx, teamId, materialId)
  if (ownerId) await requireMember(trx, teamId, ownerId)
}

export async function addProfile(trx: Trx, actor: Actor, fields: ProfileFields, id = newId()): Promise<Profile> {
  await checkReferences(trx, actor.teamId, fields)
  const number = await nextNumber(trx, actor.teamId, 'profile')
  const at = now()
  const stored = { ...fields, ownerId: fields.ownerId ?? actor.userId }
  await trx
    .insertInto('profile')
    .values({ id, teamId: actor.teamId, number, ...stored, createdAt: at, updatedAt: at, revisions: 0, version: 1 })
    .execute()
  await record(trx, actor, 'profile.added', 'profile', id, { after: { number: profileNumber(number), ...stored } })
  return getProfile(trx, actor.teamId, id)
}

type Stored = ProfileChange & { binnedAt?: string | null }

async function update(trx: Trx, actor: Actor, before: Profile, set: Stored): Promise<Profile> {
  await trx
    .updateTable('profile')
    .set({ ...set, updatedAt: now(), version: before.version + 1 })
    .where('teamId', '=', actor.teamId)
    .where('id', '=', before.id)
    .execute()
  return getProfile(trx, actor.teamId, before.id)
}

async function seen(trx: Trx, actor: Actor, id: string, version: number): Promise<Profile> {
  const current = await getProfile(trx, actor.teamId, id)
  if (current.version !== version) throw new AppError('stale', undefined, { current })
  return current
}

const changeable = ({ title, drawingNumber, job, material, owner }: Profile) => ({
  title,
  drawingNumber,
  jobId: job.id,
  materialId: material?.id ?? null,
  ownerId: owner.id,
})

export async function changeProfile(
  trx: Trx,
  actor: Actor,
  id: string,
  version: number,
  change: ProfileChange,
): Promise<Profile> {
  const before = await seen(trx, actor, id, version)
  if (before.binnedAt) throw new AppError('binned')
  await checkReferences(trx, actor.teamId, change)
  const after = await update(trx, actor, before, change)
  await record(trx, actor, 'profile.changed', 'profile', id, { before: changeable(before), after: changeable(after) })
  return after
}

export async function binProfile(trx: Trx, actor: Actor, id: string, version: number): Promise<Profile> {
  const before = await seen(trx, actor, id, version)
  if (before.binnedAt) return before
  const after = await update(trx, actor, before, { binnedAt: now() })
  await record(trx, actor, 'profile.binned', 'profile', id)
  return after
}

/** Undo of binning; doing it twice changes nothing. */
export async function restoreProfile(trx: Trx, actor: Actor, id: string): Promise<Profile> {
  const before = await getProfile(trx, actor.teamId, id)
  if (!before.binnedAt) return before
  const after = await update(trx, actor, before, { binnedAt: null })
  await record(trx, actor, 'profile.restored', 'profile', id)
  return after
}
