import { binnedBefore, purgeJob, purgeProfile } from '@/db/bin'
import { dropBlob, unlinkedBlobs } from '@/db/blobs'
import { forgetExpired } from '@/db/expired'
import { database, inTransaction } from '@/db/instance'
import { fromNow } from '@/db/now'
import { log } from '../log'

/** How long things stay in the bin. */
export const BIN_DAYS = 30
const HOUR = 3_600_000

/** Deletes chunks that nothing refers to. */
export async function sweepBlobs(): Promise<void> {
  for (const blobId of await unlinkedBlobs(database().read)) await inTransaction((trx) => dropBlob(trx, blobId))
}

/** Empties the bin of what is old, forgets what has run out, deletes what nothing refers to. */
export async function sweep(): Promise<void> {
  const { profiles, jobs } = await binnedBefore(database().read, fromNow(-BIN_DAYS * 24 * HOUR))
  for (const profile of profiles) await inTransaction((trx) => purgeProfile(trx, profile))
  for (const job of jobs) await inTransaction((trx) => purgeJob(trx, job))
  await inTransaction(forgetExpired)
  await sweepBlobs()
}

/** Sweeps every hour from now on. */
export function keepSweeping(): void {
  setInterval(() => sweep().catch((error: unknown) => log().error({ error: String(error) }, 'sweep failed')), HOUR).unref()
}
