import { z } from 'zod'
import { ProblemError } from '@/lib/api/client'
import { type ErrorCode, ERRORS } from '@/lib/api/errors'

const CsrfToken = z.object({ csrfToken: z.string() })
const Outcome = z.object({ url: z.string() })

async function post(path: string, fields: Record<string, string>): Promise<string> {
  const { csrfToken } = CsrfToken.parse(await (await fetch('/api/auth/csrf')).json())
  const body = new URLSearchParams({ ...fields, csrfToken, callbackUrl: '/', json: 'true' })
  return Outcome.parse(await (await fetch(`/api/auth/${path}`, { method: 'POST', body })).json()).url
}

const REFUSALS: Record<string, ErrorCode> = { too_many: 'too_many', forbidden: 'forbidden' }

/** Signs in by e-mail and password; throws a ProblemError where it is refused. */
export async function signIn(email: string, password: string): Promise<void> {
  const url = await post('callback/credentials', { email, password })
  const refusal = new URL(url, location.origin).searchParams.get('error')
  if (refusal === null) return
  const code = REFUSALS[refusal] ?? 'wrong_password'
  throw new ProblemError({ type: `urn:sectionwright:${code}`, ...ERRORS[code], code, requestId: '' })
}

export async function signOut(): Promise<void> {
  await post('signout', {})
}
