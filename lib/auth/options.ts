import { readFileSync } from 'node:fs'
import path from 'node:path'
import type { AuthOptions } from 'next-auth'
import CredentialsProvider from 'next-auth/providers/credentials'
import { database, inTransaction } from '@/db/instance'
import { closeSession, findActor, openSession, SESSION_DAYS } from '@/db/sessions'
import { AppError, isAppError } from '@/lib/api/errors'
import { config } from '@/lib/config'
import { log } from '@/lib/log'
import { addressOf } from './address'
import { checkPassword } from './signIn'

declare module 'next-auth' {
  interface User {
    sessionToken?: string
  }
}
declare module 'next-auth/jwt' {
  interface JWT {
    sessionToken?: string
  }
}

/** next-auth throws these for a cookie whose session is over, which is no fault. */
const EXPECTED = ['JWT_SESSION_ERROR']

/** next-auth with its JWT replaced: the cookie holds an opaque random id that is looked up at each request. */
export const authOptions = (): AuthOptions => ({
  secret: readFileSync(path.join(config().dataDir, 'secret'), 'utf8'),
  session: { strategy: 'jwt', maxAge: SESSION_DAYS * 86_400 },
  useSecureCookies: config().secure,
  pages: { signIn: '/sign-in', error: '/sign-in' },
  providers: [
    CredentialsProvider({
      credentials: { email: {}, password: {} },
      authorize: async (credentials, { headers }) => {
        const { email = '', password = '' } = credentials ?? {}
        try {
          const id = await checkPassword({ email, password, address: addressOf(new Headers({ ...headers })) })
          const sessionToken = await inTransaction((trx) => openSession(trx, id))
          if (!sessionToken) throw new AppError('forbidden')
          return { id, sessionToken }
        } catch (error) {
          if (isAppError(error)) throw new Error(error.code)
          throw error
        }
      },
    }),
  ],
  jwt: {
    encode: async ({ token }) => token?.sessionToken ?? '',
    decode: async ({ token: sessionToken }) => {
      const actor = sessionToken ? await findActor(database().read, sessionToken, null) : null
      return actor && { sub: actor.userId, sessionToken }
    },
  },
  callbacks: {
    jwt: ({ token, user }) => (user ? { sub: user.id, sessionToken: user.sessionToken } : token),
    session: ({ session }) => ({ expires: session.expires }),
  },
  events: {
    signOut: async ({ token: { sessionToken } }) => {
      if (sessionToken) await inTransaction((trx) => closeSession(trx, sessionToken))
    },
  },
  logger: {
    error: (code, detail) => {
      if (!EXPECTED.includes(code)) log().error({ code, detail: String(detail) }, 'next-auth')
    },
    warn: (code) => log().debug({ code }, 'next-auth'),
    debug: () => undefined,
  },
})
