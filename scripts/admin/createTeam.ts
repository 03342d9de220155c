import { addUser, findUserByEmail, joinTeam } from '@/db/people'
import { createTeam } from '@/db/teams'
import { hashPassword } from '@/lib/auth/password'
import { ROLES } from '@/lib/auth/permissions'
import { withDatabase } from './open'
import { newPassword } from './resetPassword'

const help = `usage: npm run -s team:create -- "TEAM" EMAIL ["NAME"]

Makes a further team with EMAIL as its administrator. Somebody new gets a password, which is printed.
The server may be running. Nothing is shared between teams.`

async function run([team, email, name = email]: string[]): Promise<string> {
  if (!team || !email) throw new Error(help)
  return withDatabase(async ({ read, write }) => {
    const known = await findUserByEmail(read, email)
    const password = newPassword()
    const passwordHash = await hashPassword(password)
    await write.transaction().execute(async (trx) => {
      const writer = await createTeam(trx, team)
      const userId = known?.id ?? (await addUser(trx, { name, email, passwordHash }))
      await joinTeam(trx, writer, userId, { roles: [...ROLES], administrator: true })
    })
    const how = known ? `${known.name} changes to it after signing in.` : `Sign in as ${email} with the password ${password}`
    return `Made the team “${team}”. ${how}`
  })
}

export const createTeamCommand = { help, run }
