import { sql } from 'kysely'
import { AppError } from '@/lib/api/errors'
import type { Me, Person, PersonChange } from '@/lib/api/schemas/people'
import type { Role } from '@/lib/auth/permissions'
import type { Actor, Writer } from './actor'
import type { Db, Trx } from './client'
import { record } from './events'
import { newId, type TeamId } from './id'
import { parseJson } from './json'
import { now } from './now'
import { closeSessionsOf, Roles } from './sessions'
import { getTeam } from './teams'

const people = (db: Db, teamId: TeamId) =>
  db
    .selectFrom('membership')
    .innerJoin('user', 'user.id', 'membership.userId')
    .where('membership.teamId', '=', teamId)
    .select([
      'user.id',
      'user.name',
      'user.email',
      'membership.roles',
      'membership.administrator',
      'membership.disabled',
      'membership.version',
    ])

interface Row {
  id: string
  name: string
  email: string
  roles: string
  administrator: number
  disabled: number
  version: number
}
const toView = (row: Row): Person => ({
  ...row,
  roles: parseJson(row.roles, Roles),
  administrator: row.administrator === 1,
  disabled: row.disabled === 1,
})

export async function listPeople(db: Db, teamId: TeamId): Promise<Person[]> {
  return (await people(db, teamId).orderBy('user.name').orderBy('user.id').limit(1000).execute()).map(toView)
}

export async function getPerson(db: Db, teamId: TeamId, id: string): Promise<Person> {
  const row = await people(db, teamId).where('user.id', '=', id).executeTakeFirst()
  if (!row) throw new AppError('not_found')
  return toView(row)
}

export async function requireMember(db: Db, teamId: TeamId, id: string): Promise<void> {
  const person = await getPerson(db, teamId, id)
  if (person.disabled) throw new AppError('invalid', `${person.name} is disabled in this team.`)
}

/** With the hash of their password, for signing in; undefined for an unknown address. */
export const findUserByEmail = (db: Db, email: string) =>
  db
    .selectFrom('user')
    .select(['id', 'name', 'email', 'passwordHash'])
    .where('email', '=', email.toLowerCase())
    .executeTakeFirst()

interface NewUser {
  id?: string
  name: string
  email: string
  passwordHash: string
}
export async function addUser(trx: Trx, { id = newId(), name, email, passwordHash }: NewUser): Promise<string> {
  await trx
    .insertInto('user')
    .values({ id, name, email: email.toLowerCase(), passwordHash, zone: 'UTC', createdAt: now() })
    .execute()
  return id
}

interface Right {
  roles: readonly Role[]
  administrator: boolean
}
export async function joinTeam(
  trx: Trx,
  { teamId, requestId }: Writer,
  userId: string,
  { roles, administrator }: Right,
): Promise<void> {
  await trx
    .insertInto('membership')
    .values({
      teamId,
      userId,
      roles: JSON.stringify(roles),
      administrator: administrator ? 1 : 0,
      disabled: 0,
      version: 1,
      createdAt: now(),
    })
    .execute()
  await record(trx, { teamId, userId, requestId }, 'person.joined', 'person', userId, { after: { roles, administrator } })
}

/** Roles, right or standing of a person in this team. Disabling ends their sessions here at once. */
export async function changePerson(trx: Trx, actor: Actor, id: string, version: number, change: PersonChange): Promise<Person> {
  const before = await getPerson(trx, actor.teamId, id)
  if (before.version !== version) throw new AppError('stale', undefined, { current: before })
  const after: Person = { ...before, ...change, version: version + 1 }
  await trx
    .updateTable('membership')
    .set({
      roles: JSON.stringify(after.roles),
      administrator: after.administrator ? 1 : 0,
      disabled: after.disabled ? 1 : 0,
      version: after.version,
    })
    .where('teamId', '=', actor.teamId)
    .where('userId', '=', id)
    .execute()
  if (!(await hasAdministrator(trx, actor.teamId))) throw new AppError('last_administrator')
  if (after.disabled) await closeSessionsOf(trx, id, actor.teamId)
  await record(trx, actor, 'person.changed', 'person', id, { before, after })
  return after
}

async function hasAdministrator(trx: Trx, teamId: TeamId): Promise<boolean> {
  const found = await trx
    .selectFrom('membership')
    .select(sql<number>`1`.as('one'))
    .where('teamId', '=', teamId)
    .where('administrator', '=', 1)
    .where('disabled', '=', 0)
    .limit(1)
    .executeTakeFirst()
  return found !== undefined
}

export async function getMe(db: Db, { userId, teamId, roles, administrator }: Actor): Promise<Me> {
  const columns = ['id', 'name', 'email', 'zone'] as const
  const user = await db.selectFrom('user').select(columns).where('id', '=', userId).executeTakeFirstOrThrow()
  const teams = await teamsOf(db, userId)
  return { ...user, roles: [...roles], administrator, team: await getTeam(db, teamId), teams }
}

export const teamsOf = (db: Db, userId: string) =>
  db
    .selectFrom('membership')
    .innerJoin('team', 'team.id', 'membership.teamId')
    .select(['team.id', 'team.name'])
    .where('membership.userId', '=', userId)
    .where('membership.disabled', '=', 0)
    .orderBy('team.name')
    .execute()

export async function changeMe(trx: Trx, actor: Actor, change: { name?: string; zone?: string }): Promise<void> {
  if (change.name === undefined && change.zone === undefined) return
  const columns = ['name', 'zone'] as const
  const before = await trx.selectFrom('user').select(columns).where('id', '=', actor.userId).executeTakeFirstOrThrow()
  await trx.updateTable('user').set(change).where('id', '=', actor.userId).execute()
  await record(trx, actor, 'person.changed', 'person', actor.userId, { before, after: { ...before, ...change } })
}

/** A new password ends every session of the person; written in each of their teams' history. */
export async function setPassword(trx: Trx, userId: string, passwordHash: string): Promise<void> {
  await trx.updateTable('user').set({ passwordHash }).where('id', '=', userId).execute()
  await closeSessionsOf(trx, userId)
  for (const { id } of await teamsOf(trx, userId)) {
    await record(trx, { teamId: id, userId: null, requestId: null }, 'password.reset', 'person', userId)
  }
}
