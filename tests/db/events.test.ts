import { expect, test } from 'vitest'
import { listEvents, record } from '@/db/events'
import { changeJob, openJob } from '@/db/jobs'
import { freshDatabase } from '@/tests/support/database'
import { givenTeam } from '@/tests/support/team'
import { givenJob } from '@/tests/support/things'

test('nobody can change or delete an event, not even with SQL', async () => {
  const { writer, ...database } = await freshDatabase()
  await givenTeam({ writer, ...database })
  expect(() => writer.exec("update event set verb = 'nothing'")).toThrow('events are never changed')
  expect(() => writer.exec('delete from event')).toThrow('events are never deleted')
})

test('a change and its event stand or fall together', async () => {
  const database = await freshDatabase()
  const { actor } = await givenTeam(database)
  const work = database.write.transaction().execute(async (trx) => {
    await openJob(trx, actor, { title: 'Never there', client: '' })
    throw new Error('stop')
  })
  await expect(work).rejects.toThrow('stop')
  const { items } = await listEvents(database.read, actor.teamId, { limit: 200 })
  expect(items.some(({ verb }) => verb === 'job.opened')).toBe(false)
})

test('an event of a change keeps only the fields that differ', async () => {
  const database = await freshDatabase()
  const { actor } = await givenTeam(database)
  const job = await givenJob(database, actor, 'North')
  await database.write.transaction().execute((trx) => changeJob(trx, actor, job.id, 1, { title: 'South' }))
  const { items } = await listEvents(database.read, actor.teamId, { subjectId: job.id, limit: 200 })
  expect(items.map(({ verb }) => verb)).toEqual(['job.changed', 'job.opened'])
  expect(items[0]).toMatchObject({ before: { title: 'North' }, after: { title: 'South' }, actor: { id: actor.userId } })
})

test('the history of one team shows nothing of another', async () => {
  const database = await freshDatabase()
  const [one, two] = [await givenTeam(database), await givenTeam(database)]
  await database.write.transaction().execute((trx) => record(trx, one.actor, 'job.opened', 'job', 'a'.repeat(26)))
  const { items } = await listEvents(database.read, two.actor.teamId, { limit: 200 })
  expect(items.some(({ verb }) => verb === 'job.opened')).toBe(false)
})
