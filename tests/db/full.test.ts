import { expect, test } from 'vitest'
import { writeBlob } from '@/db/blobs'
import { setDatabase } from '@/db/instance'
import { openJob } from '@/db/jobs'
import { knownError } from '@/lib/api/problem'
import { freshDatabase } from '@/tests/support/database'
import { givenTeam } from '@/tests/support/team'

test('a full disk is told as such, even where SQLite has ended the transaction itself', async () => {
  const database = await freshDatabase()
  setDatabase(database)
  const { actor } = await givenTeam(database)
  const pages = Number(database.writer.pragma('page_count', { simple: true }))
  database.writer.pragma(`max_page_count = ${pages + 50}`)
  const failure = await writeBlob('a', [new Uint8Array(4 * 1024 * 1024)]).catch((error: unknown) => knownError(error)?.code)
  expect(failure).toBe('storage_full')
  const job = await database.write.transaction().execute((trx) => openJob(trx, actor, { title: 'Still works', client: '' }))
  expect(job.number).toBe('J-0001')
})
