import type { Actor } from '@/db/actor'
import type { Database } from '@/db/client'
import type { TeamId } from '@/db/id'
import { addUser, joinTeam } from '@/db/people'
import { openSession } from '@/db/sessions'
import { createTeam } from '@/db/teams'
import { ROLES, type Role } from '@/lib/auth/permissions'

export interface Member {
  actor: Actor
  token: string
  cookie: string
}

interface Right {
  roles?: readonly Role[]
  administrator?: boolean
  passwordHash?: string
}
let people = 0

/** A person with a session in a team. */
export async function givenMember(database: Database, teamId: TeamId, right: Right = {}): Promise<Member> {
  const { roles = [], administrator = false, passwordHash = 'none' } = right
  people++
  return database.write.transaction().execute(async (trx) => {
    const userId = await addUser(trx, { name: `Person ${people}`, email: `person${people}@example.org`, passwordHash })
    await joinTeam(trx, { teamId, userId, requestId: null }, userId, { roles, administrator })
    const token = await openSession(trx, userId)
    if (!token) throw new Error('no session')
    return { actor: { teamId, userId, requestId: null, roles, administrator }, token, cookie: `next-auth.session-token=${token}` }
  })
}

/** A team with a person who may do everything. */
export async function givenTeam(database: Database, name = 'Team'): Promise<Member> {
  const { teamId } = await database.write.transaction().execute((trx) => createTeam(trx, name))
  return givenMember(database, teamId, { roles: ROLES, administrator: true })
}
