import { type Expression, sql } from 'kysely'
import { AppError } from '@/lib/api/errors'
import type { Job, JobChange, JobFields, JobQuery } from '@/lib/api/schemas/job'
import type { Actor } from './actor'
import type { Db, Trx } from './client'
import { jobNumber, nextNumber } from './counter'
import { record } from './events'
import { newId, type TeamId } from './id'
import { containing, type Keyset, pageOf } from './list'
import { now } from './now'

const jobs = (db: Db, teamId: TeamId) =>
  db
    .selectFrom('job')
    .where('job.teamId', '=', teamId)
    .select((eb) => [
      'job.id',
      'job.number',
      'job.title',
      'job.client',
      'job.createdAt',
      'job.updatedAt',
      'job.binnedAt',
      'job.version',
      eb
        .selectFrom('profile')
        .whereRef('profile.jobId', '=', 'job.id')
        .where('profile.teamId', '=', teamId)
        .where('profile.binnedAt', 'is', null)
        .select(sql<number>`count(*)`.as('n'))
        .as('profiles'),
    ])

type Row = Omit<Job, 'number' | 'profiles'> & { number: number; profiles: number | null }

const KEYSET: Keyset<Row> = {
  number: { column: 'job.number', id: 'job.id', of: (row) => row.number },
  title: { column: 'job.title', id: 'job.id', of: (row) => row.title },
  updatedAt: { column: 'job.updatedAt', id: 'job.id', of: (row) => row.updatedAt },
}

const toView = ({ id, number, title, client, profiles, createdAt, updatedAt, binnedAt, version }: Row): Job => ({
  id,
  number: jobNumber(number),
  title,
  client,
  profiles: profiles ?? 0,
  createdAt,
  updatedAt,
  binnedAt,
  version,
})

export async function listJobs(db: Db, teamId: TeamId, query: JobQuery) {
  let found = jobs(db, teamId).where('job.binnedAt', query.bin ? 'is not' : 'is', null)
  for (const word of query.q?.split(/\s+/).filter(Boolean) ?? []) found = found.where(mentions(word))
  return pageOf(found, KEYSET, { ...query, filter: [query.q, query.bin] }, toView)
}

const mentions = (word: string): Expression<boolean> =>
  sql<boolean>`(job.title || ' ' || job.client || ' ' || printf('J-%04d', job.number)) like ${containing(word)} escape '\\'`

export async function getJob(db: Db, teamId: TeamId, id: string): Promise<Job> {
  const row = await jobs(db, teamId).where('job.id', '=', id).executeTakeFirst()
  if (!row) throw new AppError('not_found')
  return toView(row)
}

export const isJob = async (db: Db, teamId: TeamId, id: string): Promise<boolean> =>
  (await jobs(db, teamId).where('job.id', '=', id).executeTakeFirst()) !== undefined

/** A job that is not in the bin, for what is put into it. */
export async function requireOpenJob(trx: Trx, teamId: TeamId, id: string): Promise<Job> {
  const job = await getJob(trx, teamId, id)
  if (job.binnedAt) throw new AppError('binned', `Job ${job.number} is in the bin. Restore it first.`)
  return job
}

export async function openJob(trx: Trx, actor: Actor, fields: JobFields, id = newId()): Promise<Job> {
  const number = await nextNumber(trx, actor.teamId, 'job')
  const at = now()
  await trx
    .insertInto('job')
    .values({ id, teamId: actor.teamId, number, ...fields, createdAt: at, createdBy: actor.userId, updatedAt: at, version: 1 })
    .execute()
  await record(trx, actor, 'job.opened', 'job', id, { after: { number: jobNumber(number), ...fields } })
  return getJob(trx, actor.teamId, id)
}

async function update(trx: Trx, actor: Actor, before: Job, set: JobChange & { binnedAt?: string | null }): Promise<Job> {
  await trx
    .updateTable('job')
    .set({ ...set, updatedAt: now(), version: before.version + 1 })
    .where('teamId', '=', actor.teamId)
    .where('id', '=', before.id)
    .execute()
  return getJob(trx, actor.teamId, before.id)
}

async function seen(trx: Trx, actor: Actor, id: string, version: number): Promise<Job> {
  const current = await getJob(trx, actor.teamId, id)
  if (current.version !== version) throw new AppError('stale', undefined, { current })
  return current
}

export async function changeJob(trx: Trx, actor: Actor, id: string, version: number, change: JobChange): Promise<Job> {
  const before = await seen(trx, actor, id, version)
  if (before.binnedAt) throw new AppError('binned')
  const after = await update(trx, actor, before, change)
  await record(trx, actor, 'job.changed', 'job', id, {
    before: { title: before.title, client: before.client },
    after: { title: after.title, client: after.client },
  })
  return after
}

export async function binJob(trx: Trx, actor: Actor, id: string, version: number): Promise<Job> {
  const before = await seen(trx, actor, id, version)
  if (before.binnedAt) return before
  const after = await update(trx, actor, before, { binnedAt: now() })
  await record(trx, actor, 'job.binned', 'job', id)
  return after
}

/** Undo of binning; doing it twice changes nothing. */
export async function restoreJob(trx: Trx, actor: Actor, id: string): Promise<Job> {
  const before = await getJob(trx, actor.teamId, id)
  if (!before.binnedAt) return before
  const after = await update(trx, actor, before, { binnedAt: null })
  await record(trx, actor, 'job.restored', 'job', id)
  return after
}
