import { afterEach, expect, test } from 'vitest'
import { setClock } from '@/db/now'
import { takeToken } from '@/db/rateLimit'
import { freshDatabase } from '@/tests/support/database'

afterEach(() => setClock())

test('a bucket of 3 gives 3 tokens, then one a minute', async () => {
  const { write } = await freshDatabase()
  let at = Date.parse('2026-01-01T00:00:00Z')
  setClock(() => new Date(at))
  const take = () => write.transaction().execute((trx) => takeToken(trx, 'account:a', { size: 3, secondsPerToken: 60 }))
  expect([await take(), await take(), await take(), await take()]).toEqual([0, 0, 0, 60])
  at += 59_000
  expect(await take()).toBe(1)
  at += 1_000
  expect([await take(), await take()]).toEqual([0, 60])
  at += 3_600_000
  expect([await take(), await take(), await take(), await take()]).toEqual([0, 0, 0, 60])
})
