'use client'
import { signIn as nextSignIn } from 'next-auth/react'
import { changeMe } from '@/components/people/data'
import { getJson } from '@/lib/api/client'
import { ERRORS, type ErrorCode } from '@/lib/api/errors'
import { keys } from '@/lib/api/keys'
import { Me } from '@/lib/api/schemas/people'

const isCode = (text: string): text is ErrorCode => text in ERRORS

/** Signs in; the sentence of what was wrong, or null. */
export async function signIn(email: string, password: string): Promise<string | null> {
  const answer = await nextSignIn('credentials', { email, password, redirect: false })
  if (answer?.ok && !answer.error) return null
  const code = answer?.error ?? 'internal'
  return ERRORS[isCode(code) ? code : 'wrong_password'].title
}

/** Dates are shown in the zone stored with the person: the browser's, at the first sign-in. */
export async function adoptZone(): Promise<void> {
  const zone = Intl.DateTimeFormat().resolvedOptions().timeZone
  const me = await getJson(Me)(keys.me)
  if (me.zone === 'UTC' && zone && zone !== 'UTC') await changeMe({ zone })
}
