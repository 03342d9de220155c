import { AppError } from '@/lib/api/errors'
import type { Invitation, Invite } from '@/lib/api/schemas/people'
import type { Actor } from './actor'
import type { Db, Trx } from './client'
import { record } from './events'
import { newId, type TeamId } from './id'
import { parseJson } from './json'
import { fromNow, now } from './now'
import { addUser, findUserByEmail, joinTeam } from './people'
import { hashToken, newToken, Roles } from './sessions'

const VALID_DAYS = 14
const COLUMNS = ['id', 'teamId', 'email', 'roles', 'administrator', 'expiresAt'] as const

interface Row {
  id: string
  email: string
  roles: string
  administrator: number
  expiresAt: string
}
const toView = ({ id, email, roles, administrator, expiresAt }: Row): Invitation => ({
  id,
  email,
  roles: parseJson(roles, Roles),
  administrator: administrator === 1,
  expiresAt,
})

const open = (db: Db) => db.selectFrom('invitation').select(COLUMNS).where('spentAt', 'is', null).where('expiresAt', '>', now())

export async function listInvitations(db: Db, teamId: TeamId): Promise<Invitation[]> {
  return (await open(db).where('teamId', '=', teamId).orderBy('createdAt', 'desc').limit(1000).execute()).map(toView)
}

/** The invitation and the token of its link, which is not stored and cannot be shown again. */
export async function invite(
  trx: Trx,
  actor: Actor,
  { email, roles, administrator }: Invite,
): Promise<Invitation & { token: string }> {
  const known = await findUserByEmail(trx, email)
  const member =
    known &&
    (await trx
      .selectFrom('membership')
      .select('userId')
      .where('teamId', '=', actor.teamId)
      .where('userId', '=', known.id)
      .executeTakeFirst())
  if (member) throw new AppError('taken', `${email} belongs to this team already.`)
  const token = newToken()
  const row = {
    id: newId(),
    email,
    roles: JSON.stringify(roles),
    administrator: administrator ? (1 as const) : (0 as const),
    expiresAt: fromNow(VALID_DAYS * 86_400_000),
  }
  await trx
    .insertInto('invitation')
    .values({ ...row, teamId: actor.teamId, tokenHash: hashToken(token), invitedBy: actor.userId, createdAt: now() })
    .execute()
  await record(trx, actor, 'person.invited', 'invitation', row.id, { after: { roles, administrator } })
  return { ...toView(row), token }
}

export async function withdrawInvitation(trx: Trx, actor: Actor, id: string): Promise<void> {
  const spent = await trx
    .updateTable('invitation')
    .set({ spentAt: now() })
    .where('teamId', '=', actor.teamId)
    .where('id', '=', id)
    .where('spentAt', 'is', null)
    .executeTakeFirst()
  if (spent.numUpdatedRows === 0n) throw new AppError('not_found')
  await record(trx, actor, 'invitation.withdrawn', 'invitation', id)
}

/** What the link's page shows; throws `link_spent` for one that is used, withdrawn, run out or unknown. */
export async function lookUpInvitation(db: Db, token: string) {
  const row = await open(db).where('tokenHash', '=', hashToken(token)).executeTakeFirst()
  if (!row) throw new AppError('link_spent')
  const team = await db.selectFrom('team').select('name').where('id', '=', row.teamId).executeTakeFirstOrThrow()
  const known = (await findUserByEmail(db, row.email)) !== undefined
  return { ...toView(row), teamId: row.teamId, team: team.name, known }
}

interface Acceptance {
  token: string
  name: string
  /** of a new person; somebody known keeps theirs */
  passwordHash: string
  requestId: string | null
}
/** Spends the link and joins the team. A person known by another team must have proved who they are before. */
export async function acceptInvitation(trx: Trx, { token, name, passwordHash, requestId }: Acceptance): Promise<string> {
  const { id, teamId, email, roles, administrator } = await lookUpInvitation(trx, token)
  const known = await findUserByEmail(trx, email)
  const userId = known?.id ?? (await addUser(trx, { name, email, passwordHash }))
  await trx.updateTable('invitation').set({ spentAt: now() }).where('teamId', '=', teamId).where('id', '=', id).execute()
  await joinTeam(trx, { teamId, userId, requestId }, userId, { roles, administrator })
  return userId
}
