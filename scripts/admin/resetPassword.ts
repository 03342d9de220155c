import { randomBytes } from 'node:crypto'
import { findUserByEmail, setPassword } from '@/db/people'
import { hashPassword } from '@/lib/auth/password'
import { withDatabase } from './open'

const help = `usage: npm run -s reset-password -- EMAIL

Gives the person a new password, prints it, and ends their sessions. The server may be running.`

/** 15 characters, 90 bits. */
export const newPassword = () => randomBytes(12).toString('base64url').slice(0, 15)

const run = ([email]: string[]) => {
  if (!email) throw new Error(help)
  return withDatabase(async ({ read, write }) => {
    const user = await findUserByEmail(read, email)
    if (!user) throw new Error(`Nobody here has the e-mail ${email}.`)
    const password = newPassword()
    const passwordHash = await hashPassword(password)
    await write.transaction().execute((trx) => setPassword(trx, user.id, passwordHash))
    return `The new password of ${user.name} is ${password}`
  })
}

export const resetPassword = { help, run: async (args: string[]) => run(args) }
