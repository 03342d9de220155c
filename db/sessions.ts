import { createHash, randomBytes } from 'node:crypto'
import { z } from 'zod'
import { ROLES } from '@/lib/auth/permissions'
import type { Actor } from './actor'
import type { Db, Trx } from './client'
import type { TeamId } from './id'
import { parseJson } from './json'
import { fromNow, now } from './now'

export const SESSION_DAYS = 30

/** 256 random bits for a cookie or a link. Only the hash is stored. */
export const newToken = () => randomBytes(32).toString('base64url')
export const hashToken = (token: string) => createHash('sha256').update(token).digest('hex')

export const Roles = z.array(z.enum(ROLES))

/** Opens a session in the team asked for, or in the first one in which the person is not disabled; null where there is none. */
export async function openSession(trx: Trx, userId: string, teamId?: TeamId): Promise<string | null> {
  let memberships = trx.selectFrom('membership').select('teamId').where('userId', '=', userId).where('disabled', '=', 0)
  if (teamId) memberships = memberships.where('teamId', '=', teamId)
  const membership = await memberships.orderBy('createdAt').executeTakeFirst()
  if (!membership) return null
  const token = newToken()
  const expiresAt = fromNow(SESSION_DAYS * 86_400_000)
  await trx
    .insertInto('session')
    .values({ idHash: hashToken(token), userId, teamId: membership.teamId, createdAt: now(), expiresAt })
    .execute()
  return token
}

/** The person behind a session as they are now: disabled or signed out means nobody. */
export async function findActor(db: Db, token: string, requestId: string | null): Promise<Actor | null> {
  const row = await db
    .selectFrom('session')
    .innerJoin('membership', (join) =>
      join.onRef('membership.teamId', '=', 'session.teamId').onRef('membership.userId', '=', 'session.userId'),
    )
    .select(['session.teamId', 'session.userId', 'membership.roles', 'membership.administrator'])
    .where('session.idHash', '=', hashToken(token))
    .where('session.expiresAt', '>', now())
    .where('membership.disabled', '=', 0)
    .executeTakeFirst()
  if (!row) return null
  const { teamId, userId, roles, administrator } = row
  return { teamId, userId, requestId, roles: parseJson(roles, Roles), administrator: administrator === 1 }
}

export async function closeSession(trx: Trx, token: string): Promise<void> {
  await trx.deleteFrom('session').where('idHash', '=', hashToken(token)).execute()
}

export async function closeSessionsOf(trx: Trx, userId: string, teamId?: TeamId): Promise<void> {
  let sessions = trx.deleteFrom('session').where('userId', '=', userId)
  if (teamId) sessions = sessions.where('teamId', '=', teamId)
  await sessions.execute()
}

/** Goes on in another team of the same person. */
export async function switchTeam(trx: Trx, token: string, userId: string, teamId: TeamId): Promise<void> {
  await trx.updateTable('session').set({ teamId }).where('idHash', '=', hashToken(token)).where('userId', '=', userId).execute()
}
