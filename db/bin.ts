import type { Db, Trx } from './client'
import { record } from './events'
import type { TeamId } from './id'

interface Binned {
  id: string
  teamId: TeamId
}

/** What lies in the bin since before `limit`, profiles of such jobs too. Not of one team: the server itself asks. */
export async function binnedBefore(db: Db, limit: string): Promise<{ profiles: Binned[]; jobs: Binned[] }> {
  const jobs = await db.selectFrom('job').select(['id', 'teamId']).where('binnedAt', '<', limit).limit(1000).execute()
  const profiles = await db
    .selectFrom('profile')
    .innerJoin('job', 'job.id', 'profile.jobId')
    .select(['profile.id', 'profile.teamId'])
    .where((eb) => eb.or([eb('profile.binnedAt', '<', limit), eb('job.binnedAt', '<', limit)]))
    .limit(1000)
    .execute()
  return { profiles, jobs }
}

/** Deletes a profile with its revisions and the files that nothing else uses. Their chunks are left to the sweep of blobs. */
export async function purgeProfile(trx: Trx, { id, teamId }: Binned): Promise<void> {
  const revisions = trx.selectFrom('revision').select('id').where('teamId', '=', teamId).where('profileId', '=', id)
  await trx.deleteFrom('intake').where('teamId', '=', teamId).where('profileId', '=', id).execute()
  await trx.deleteFrom('section').where('teamId', '=', teamId).where('revisionId', 'in', revisions).execute()
  await trx.deleteFrom('revision').where('teamId', '=', teamId).where('profileId', '=', id).execute()
  await trx
    .deleteFrom('sourceFile')
    .where('teamId', '=', teamId)
    .where('id', 'not in', trx.selectFrom('revision').select('sourceFileId').where('teamId', '=', teamId))
    .execute()
  await trx.deleteFrom('profile').where('teamId', '=', teamId).where('id', '=', id).execute()
  await record(trx, { teamId, userId: null, requestId: null }, 'profile.purged', 'profile', id)
}

/** Deletes a job without profiles. */
export async function purgeJob(trx: Trx, { id, teamId }: Binned): Promise<void> {
  const profile = await trx
    .selectFrom('profile')
    .select('id')
    .where('teamId', '=', teamId)
    .where('jobId', '=', id)
    .executeTakeFirst()
  if (profile) return
  await trx.deleteFrom('job').where('teamId', '=', teamId).where('id', '=', id).execute()
  await record(trx, { teamId, userId: null, requestId: null }, 'job.purged', 'job', id)
}
