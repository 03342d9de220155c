import type { Event, EventQuery, Verb } from '@/lib/api/schemas/event'
import { SubjectType, VERBS } from '@/lib/api/schemas/event'
import type { Writer } from './actor'
import type { Db, Trx } from './client'
import { newId, type TeamId } from './id'
import { parseRecord } from './json'
import { type Keyset, pageOf } from './list'
import { now } from './now'

type Fields = object | null

/** Writes what happened. Given before and after, only the fields that differ are kept. */
export async function record(
  trx: Trx,
  { teamId, userId, requestId }: Writer,
  verb: Verb,
  subjectType: SubjectType,
  subjectId: string,
  { before = null, after = null }: { before?: Fields; after?: Fields } = {},
): Promise<void> {
  const differing = differences(before, after)
  await trx
    .insertInto('event')
    .values({ id: newId(), teamId, at: now(), actorId: userId, verb, subjectType, subjectId, requestId, ...differing })
    .execute()
}

function differences(before: Fields, after: Fields): { before: string | null; after: string | null } {
  if (!before || !after) return { before: before && JSON.stringify(before), after: after && JSON.stringify(after) }
  const old = new Map(Object.entries(before))
  const kept = Object.entries(after).filter(([key, value]) => JSON.stringify(value) !== JSON.stringify(old.get(key)))
  return {
    before: JSON.stringify(Object.fromEntries(kept.map(([key]) => [key, old.get(key) ?? null]))),
    after: JSON.stringify(Object.fromEntries(kept)),
  }
}

const KEYSET: Keyset<{ at: string }> = { at: { column: 'event.at', id: 'event.id', of: (row) => row.at } }

const isVerb = (text: string): text is Verb => text in VERBS

export async function listEvents(db: Db, teamId: TeamId, query: EventQuery) {
  let found = db.selectFrom('event').leftJoin('user', 'user.id', 'event.actorId').where('event.teamId', '=', teamId)
  const subject = query.subjectId
  if (subject)
    found = found.where((where) => {
      const own = where.selectFrom('revision').select('revision.id')
      const revisions = own.where('revision.teamId', '=', teamId).where('revision.profileId', '=', subject)
      return where.or([where('event.subjectId', '=', subject), where('event.subjectId', 'in', revisions)])
    })
  const rows = found.select([
    'event.id',
    'event.at',
    'event.verb',
    'event.subjectType',
    'event.subjectId',
    'event.before',
    'event.after',
    'user.id as actorId',
    'user.name as actorName',
  ])
  return pageOf(
    rows,
    KEYSET,
    { ...query, sort: 'at', dir: 'desc', filter: [query.subjectId] },
    (row): Event => ({
      id: row.id,
      at: row.at,
      actor: row.actorId && row.actorName ? { id: row.actorId, name: row.actorName } : null,
      verb: row.verb,
      sentence: isVerb(row.verb) ? VERBS[row.verb] : row.verb,
      subjectType: SubjectType.parse(row.subjectType),
      subjectId: row.subjectId,
      before: row.before === null ? null : parseRecord(row.before),
      after: row.after === null ? null : parseRecord(row.after),
    }),
  )
}
