import { changeMe } from '@/components/people/data'
import { getJson, parsed } from '@/lib/api/client'
import { ERRORS, type ErrorCode } from '@/lib/api/errors'
import { keys } from '@/lib/api/keys'

/** next-auth's own routes, asked directly: its client would cost every page 11 kB. */
async function ask(action: 'callback/credentials' | 'signout', fields: Record<string, string> = {}): Promise<URL> {
  const { csrfToken } = await getJson(({ Csrf }) => Csrf)('/api/auth/csrf')
  const body = new URLSearchParams({ ...fields, csrfToken, json: 'true', callbackUrl: window.location.origin })
  const response = await fetch(`/api/auth/${action}`, { method: 'POST', body })
  const { url } = await parsed(({ SignedIn }) => SignedIn, await response.json())
  return new URL(url, window.location.origin)
}

const isCode = (text: string): text is ErrorCode => text in ERRORS

/** Signs in; the sentence of what was wrong, or null. */
export async function signIn(email: string, password: string): Promise<string | null> {
  const code = (await ask('callback/credentials', { email, password })).searchParams.get('error')
  return code === null ? null : ERRORS[isCode(code) ? code : 'wrong_password'].title
}

export async function signOut(): Promise<void> {
  await ask('signout')
  window.location.assign('/sign-in')
}

/** Dates are shown in the zone stored with the person: the browser's, at the first sign-in. */
export async function adoptZone(): Promise<void> {
  const zone = Intl.DateTimeFormat().resolvedOptions().timeZone
  const me = await getJson(({ Me }) => Me)(keys.me)
  if (me.zone === 'UTC' && zone && zone !== 'UTC') await changeMe({ zone })
}
