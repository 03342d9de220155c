import { SESSION_DAYS } from '@/db/sessions'
import { config } from '@/lib/config'

/** Browsers take `__Secure-` names over TLS only. */
export const sessionCookieName = () => (config().secure ? '__Secure-next-auth.session-token' : 'next-auth.session-token')

/** The Set-Cookie of a session that was opened beside next-auth (setting up, accepting an invitation). */
export function sessionCookie(token: string): string {
  const parts = [`${sessionCookieName()}=${token}`, 'Path=/', 'HttpOnly', 'SameSite=Lax', `Max-Age=${SESSION_DAYS * 86_400}`]
  return [...parts, ...(config().secure ? ['Secure'] : [])].join('; ')
}

/** The session's token in a Cookie header; null without one. */
export function tokenIn(cookies: string | null): string | null {
  const start = `${sessionCookieName()}=`
  const found = cookies?.split('; ').find((part) => part.startsWith(start))
  return found ? found.slice(start.length) : null
}
