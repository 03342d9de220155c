import type { Trx } from './client'
import { now } from './now'

interface Bucket {
  /** tokens of a full bucket */
  size: number
  /** seconds until one token is back */
  secondsPerToken: number
}

/** s; a wait of 1.0000000001 s is one of 1 s */
const ROUNDING = 1e-6

/** Takes a token. Returns 0, or the seconds to wait until there is one. Rows survive a restart and hold for all processes. */
export async function takeToken(trx: Trx, bucket: string, { size, secondsPerToken }: Bucket): Promise<number> {
  const at = now()
  const row = await trx.selectFrom('rateLimit').select(['tokens', 'at']).where('bucket', '=', bucket).executeTakeFirst()
  const passed = row ? Math.max(0, (Date.parse(at) - Date.parse(row.at)) / 1000) : 0
  const tokens = row ? Math.min(size, row.tokens + passed / secondsPerToken) : size
  if (tokens < 1) return Math.ceil((1 - tokens) * secondsPerToken - ROUNDING)
  await trx
    .insertInto('rateLimit')
    .values({ bucket, tokens: tokens - 1, at })
    .onConflict((conflict) => conflict.column('bucket').doUpdateSet({ tokens: tokens - 1, at }))
    .execute()
  return 0
}

export async function refillBucket(trx: Trx, bucket: string): Promise<void> {
  await trx.deleteFrom('rateLimit').where('bucket', '=', bucket).execute()
}
