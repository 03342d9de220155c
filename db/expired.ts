import type { Trx } from './client'
import { fromNow, now } from './now'

const DAY = 86_400_000

/** Forgets what has run out: answers of keys after 24 h, sessions, buckets that are full again. */
export async function forgetExpired(trx: Trx): Promise<void> {
  await trx.deleteFrom('idempotency').where('status', 'is not', null).where('createdAt', '<', fromNow(-DAY)).execute()
  await trx.deleteFrom('session').where('expiresAt', '<', now()).execute()
  await trx.deleteFrom('rateLimit').where('at', '<', fromNow(-DAY)).execute()
}
