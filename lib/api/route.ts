import type { z } from 'zod'
import type { Actor } from '@/db/actor'
import { newId } from '@/db/id'
import { actorOf } from '@/lib/auth/actor'
import { can, type Permission } from '@/lib/auth/permissions'
import { log } from '@/lib/log'
import { AppError } from './errors'
import { jsonIn, parse, parseParams, versionIn } from './input'
import { refuseForeignOrigin } from './origin'
import { knownError, problemResponse } from './problem'
import { secure } from './securityHeaders'

/** `permission: 'anyone'` is for strangers too, `'signed in'` for every person of the team. */
interface Spec<Who, P, Q, B> {
  permission: Who
  params?: z.ZodType<P>
  query?: z.ZodType<Q>
  body?: z.ZodType<B>
  /** the write carries If-Match with the version that was seen */
  ifMatch?: boolean
  status?: number
}
interface Given<A, P, Q, B> {
  actor: A
  params: P
  query: Q
  body: B
  /** the version in If-Match; 0 where the route asks for none */
  version: number
  request: Request
  requestId: string
}
type Who = Permission | 'anyone' | 'signed in'
type ActorFor<W extends Who> = W extends 'anyone' ? Actor | null : Actor
interface Context {
  params: Promise<Record<string, string | string[] | undefined> | undefined>
}
export interface Handler {
  (request: Request, context: Context): Promise<Response>
  /** who may call it: the mark by which the walk over all routes knows the wrapper */
  permission: Who
}

/** The one way a route is made: actor, permission, input, run, answer or problem, headers, log line. */
export function route<W extends Who, P = null, Q = null, B = null>(
  spec: Spec<W, P, Q, B>,
  run: (given: Given<ActorFor<W>, P, Q, B>) => Promise<unknown>,
): Handler {
  const handle = async (request: Request, context: Context): Promise<Response> => {
    const requestId = newId()
    const started = performance.now()
    let actorId: string | null = null
    const answer = async () => {
      refuseForeignOrigin(request)
      const actor = await actorOf(request.headers, requestId)
      actorId = actor?.userId ?? null
      requirePermission(spec.permission, actor)
      const params = spec.params ? parseParams(spec.params, await context.params) : null
      const query = spec.query ? parse(spec.query, Object.fromEntries(new URL(request.url).searchParams)) : null
      const version = spec.ifMatch ? versionIn(request) : 0
      const body = spec.body ? parse(spec.body, await jsonIn(request)) : null
      // the schemas above made each of these what its type says; null where there is no schema, which is its type then
      const given = { actor, params, query, body, version, request, requestId } as Given<ActorFor<W>, P, Q, B>
      return toResponse(await run(given), spec.status ?? 200)
    }
    const response = await answer().catch((error: unknown) => toProblem(error, requestId))
    const ms = Math.round(performance.now() - started)
    log().info({
      requestId,
      route: await patternOf(request, context),
      method: request.method,
      actorId,
      status: response.status,
      ms,
    })
    return secure(response, requestId)
  }
  return Object.assign(handle, { permission: spec.permission })
}

function requirePermission(permission: Who, actor: Actor | null): void {
  if (permission === 'anyone') return
  if (!actor) throw new AppError('signed_out')
  if (permission !== 'signed in' && !can(actor, permission)) throw new AppError('forbidden')
}

function toResponse(result: unknown, status: number): Response {
  if (result instanceof Response) return result
  return result === undefined ? new Response(null, { status: 204 }) : Response.json(result, { status })
}

function toProblem(error: unknown, requestId: string): Response {
  const known = knownError(error)
  if (!known) log().error({ requestId, error: error instanceof Error ? error.stack : String(error) }, 'unexpected fault')
  return problemResponse(known ?? new AppError('internal'), requestId)
}

async function patternOf({ url }: Request, { params }: Context): Promise<string> {
  const values = new Map(Object.entries((await params) ?? {}).map(([name, value]) => [String(value), `{${name}}`]))
  return new URL(url).pathname
    .split('/')
    .map((part) => values.get(part) ?? part)
    .join('/')
}
