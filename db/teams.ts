import { AppError } from '@/lib/api/errors'
import { type Team, type TeamChange, TeamSettings } from '@/lib/api/schemas/people'
import type { Actor, Writer } from './actor'
import type { Db, Trx } from './client'
import { record } from './events'
import { newTeamId, type TeamId } from './id'
import { parseJson } from './json'
import { addUsualMaterials } from './materials'
import { now } from './now'

const FIRST_SETTINGS: TeamSettings = { lengthUnit: 'mm', digits: 5, symbols: 'en', axes: 'xy' }

const toView = (row: { id: string; name: string; settings: string; version: number }): Team => ({
  id: row.id,
  name: row.name,
  settings: parseJson(row.settings, TeamSettings),
  version: row.version,
})

export async function isSetUp(db: Db): Promise<boolean> {
  return (await db.selectFrom('team').select('id').limit(1).executeTakeFirst()) !== undefined
}

/** A new team with its materials, still without people. */
export async function createTeam(trx: Trx, name: string, id = newTeamId()): Promise<Writer> {
  const writer: Writer = { teamId: id, userId: null, requestId: null }
  await trx
    .insertInto('team')
    .values({ id, name, settings: JSON.stringify(FIRST_SETTINGS), version: 1, createdAt: now() })
    .execute()
  await record(trx, writer, 'team.created', 'team', id, { after: { name } })
  await addUsualMaterials(trx, writer)
  return writer
}

export async function getTeam(db: Db, teamId: TeamId): Promise<Team> {
  const columns = ['id', 'name', 'settings', 'version'] as const
  return toView(await db.selectFrom('team').select(columns).where('id', '=', teamId).executeTakeFirstOrThrow())
}

export async function changeTeam(trx: Trx, actor: Actor, version: number, change: TeamChange): Promise<Team> {
  const before = await getTeam(trx, actor.teamId)
  if (before.version !== version) throw new AppError('stale', undefined, { current: before })
  const after: Team = {
    ...before,
    name: change.name ?? before.name,
    settings: { ...before.settings, ...change.settings },
    version: version + 1,
  }
  await trx
    .updateTable('team')
    .set({ name: after.name, settings: JSON.stringify(after.settings), version: after.version })
    .where('id', '=', actor.teamId)
    .execute()
  await record(trx, actor, 'team.changed', 'team', actor.teamId, { before, after })
  return after
}
