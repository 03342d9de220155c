import { cookies } from 'next/headers'
import { notFound, redirect } from 'next/navigation'
import type { Actor } from '@/db/actor'
import { database } from '@/db/instance'
import { findActor } from '@/db/sessions'
import { isSetUp } from '@/db/teams'
import { sessionCookieName, tokenIn } from './cookie'
import { can, type Permission } from './permissions'

/** The person who sent a request; null for a stranger. */
export async function actorOf(headers: Headers, requestId: string | null): Promise<Actor | null> {
  const token = tokenIn(headers.get('cookie'))
  return token === null ? null : findActor(database().read, token, requestId)
}

/** The person who looks at a page; null for a stranger. */
export async function currentActor(): Promise<Actor | null> {
  const token = (await cookies()).get(sessionCookieName())?.value
  return token ? findActor(database().read, token, null) : null
}

/** For pages: a stranger goes to sign in (or to set up a new server), a person who may not sees nothing here. */
export async function requireActor(permission: Permission): Promise<Actor> {
  const actor = await currentActor()
  if (!actor) redirect((await isSetUp(database().read)) ? '/sign-in' : '/setup')
  if (!can(actor, permission)) notFound()
  return actor
}
