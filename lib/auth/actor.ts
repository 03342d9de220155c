import { cookies, headers } from 'next/headers'
import { notFound, redirect } from 'next/navigation'
import type { Actor } from '@/db/actor'
import { database } from '@/db/instance'
import { findActor } from '@/db/sessions'
import { isSetUp } from '@/db/teams'
import { sessionCookieName, tokenIn } from './cookie'
import { PAGE_HEADER } from './pageHeader'
import { can, type Permission } from './permissions'

/** The person who sent a request; null for a stranger. */
export async function actorOf(requestHeaders: Headers, requestId: string | null): Promise<Actor | null> {
  const token = tokenIn(requestHeaders.get('cookie'))
  return token === null ? null : findActor(database().read, token, requestId)
}

/** The person who looks at a page; null for a stranger. */
async function currentActor(): Promise<Actor | null> {
  const token = (await cookies()).get(sessionCookieName())?.value
  return token ? findActor(database().read, token, null) : null
}

/** For pages: a stranger goes to sign in (or to set up a new server), a person who may not sees nothing here. */
export async function requireActor(permission: Permission): Promise<Actor> {
  const actor = await currentActor()
  if (!actor) redirect((await isSetUp(database().read)) ? await signInPath() : '/setup')
  if (!can(actor, permission)) notFound()
  return actor
}

/** Signing in leads back to the page that was asked for. */
async function signInPath(): Promise<string> {
  const page = (await headers()).get(PAGE_HEADER)
  return page && page !== '/' ? `/sign-in?to=${encodeURIComponent(page)}` : '/sign-in'
}
