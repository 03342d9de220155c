import { AppError } from '@/lib/api/errors'
import type { Actor } from './actor'
import type { Trx } from './client'
import { now } from './now'

export type Earlier = { status: number; resultId: string | null; body: string | null }

/**
 * Claims a key for a request. Null: it is new and now in progress. Otherwise what the first one answered;
 * throws `key_reused` for another body and `in_progress` while the first is still at work.
 */
export async function claimKey(trx: Trx, { userId, teamId }: Actor, key: string, bodyHash: string): Promise<Earlier | null> {
  const row = await trx
    .selectFrom('idempotency')
    .select(['bodyHash', 'status', 'resultId', 'body'])
    .where('userId', '=', userId)
    .where('key', '=', key)
    .executeTakeFirst()
  if (row) {
    if (row.bodyHash !== bodyHash) throw new AppError('key_reused')
    if (row.status === null) throw new AppError('in_progress', undefined, { retryAfter: 1 })
    return { status: row.status, resultId: row.resultId, body: row.body }
  }
  await trx.insertInto('idempotency').values({ userId, key, teamId, bodyHash, createdAt: now() }).execute()
  return null
}

interface Answered {
  status: number
  resultId?: string
  body?: object
}
/** Keeps what was answered, in the transaction that made it true. */
export async function answerKey(trx: Trx, userId: string, key: string, { status, resultId, body }: Answered): Promise<void> {
  await trx
    .updateTable('idempotency')
    .set({ status, resultId: resultId ?? null, body: body ? JSON.stringify(body) : null })
    .where('userId', '=', userId)
    .where('key', '=', key)
    .execute()
}

/** Gives a key free whose request came to nothing, so that a retry starts anew. */
export async function releaseKey(trx: Trx, userId: string, key: string): Promise<void> {
  await trx.deleteFrom('idempotency').where('userId', '=', userId).where('key', '=', key).where('status', 'is', null).execute()
}
