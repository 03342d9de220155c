import { afterAll, afterEach, beforeAll, expect, test } from 'vitest'
import { invite } from '@/db/invitations'
import { listMaterials } from '@/db/materials'
import type { Handler } from '@/lib/api/route'
import { can, PERMISSIONS, type Permission, ROLES } from '@/lib/auth/permissions'
import { opinionsSettled } from '@/lib/jobs/saveRevision'
import type { SectionPool } from '@/lib/jobs/server-pool'
import { call, givenDatabase } from '@/tests/support/call'
import { givenMember, givenTeam, type Member } from '@/tests/support/team'
import { givenJob, givenProfile, givenRevision } from '@/tests/support/things'
import { givenPool } from '@/tests/support/upload'
import { allRoutes, type Found } from './routes'

const NOBODY = 'a'.repeat(26)

/** A body that passes the schema, so that only the permission or the team can refuse. */
const BODIES: Record<string, unknown> = {
  'POST /setup': { team: 'T', name: 'N', email: 'n@example.org', password: 'long enough' },
  'PATCH /me': {},
  'PATCH /team': {},
  'PATCH /people/[id]': {},
  'POST /invitations': { email: 'guest@example.org', roles: ['viewer'] },
  'POST /invitations/accept': { token: 'none', name: 'N', password: 'long enough' },
  'POST /materials': { name: 'Brass', density: 8500, source: 'common practice' },
  'PATCH /materials/[id]': {},
  'POST /jobs': { title: 'J' },
  'PATCH /jobs/[id]': {},
  'POST /profiles': { jobId: NOBODY, title: 'P' },
  'PATCH /profiles/[id]': {},
  'POST /profiles/[id]/revisions': new FormData(),
}
const QUERIES: Record<string, string> = { 'GET /files': `?sha256=${'0'.repeat(64)}`, 'GET /invitations/lookup': '?token=none' }

let routes: Found[] = []
let pool: SectionPool
beforeAll(async () => {
  routes = await allRoutes()
  pool = await givenPool()
})
afterEach(() => opinionsSettled())
afterAll(() => pool.close())

const isHandler = (handler: Found['handler']): handler is Handler => handler.permission !== undefined
const isPermission = (name: string): name is Permission => name in PERMISSIONS
const ask = ({ path, method, handler }: Found, member: Member | null, id = NOBODY) => {
  if (!isHandler(handler)) throw new Error(`${method} ${path} is made without the wrapper`)
  const name = `${method} ${path}`
  const [body, query] = [BODIES[name], QUERIES[name]]
  return call(handler, { method, cookie: member?.cookie, params: path.includes('[id]') ? { id } : {}, body, query, version: 1 })
}

test('every route is made by the wrapper and names a permission of the table', () => {
  expect(routes.length).toBeGreaterThan(35)
  for (const { path, method, handler } of routes) {
    const { permission } = handler
    const known = permission === 'anyone' || permission === 'signed in' || isPermission(permission ?? '')
    expect(known, `${method} ${path} asks for ${permission}`).toBe(true)
  }
})

test('a stranger gets 401 from every route that is not for anyone', async () => {
  await givenDatabase()
  for (const route of routes) {
    const { status } = await ask(route, null)
    if (route.handler.permission === 'anyone') expect(status, route.path).not.toBe(401)
    else expect(status, `${route.method} ${route.path}`).toBe(401)
  }
})

test('each role gets 403 where the table refuses it, and only there', async () => {
  for (const right of [...ROLES.map((role) => ({ roles: [role], administrator: false })), { roles: [], administrator: true }]) {
    const database = await givenDatabase()
    const { actor } = await givenTeam(database)
    const member = await givenMember(database, actor.teamId, right)
    for (const route of routes) {
      const permission = route.handler.permission ?? ''
      const { status } = await ask(route, member)
      const allowed = !isPermission(permission) || can(right, permission)
      expect(status === 403, `${right.roles} ${right.administrator} ${route.method} ${route.path} answered ${status}`).toBe(
        !allowed,
      )
      expect(status).not.toBe(500)
    }
  }
})

test('a person of another team gets 404 for every id of ours, and no list of theirs names one', async () => {
  const database = await givenDatabase()
  const [ours, theirs] = [await givenTeam(database), await givenTeam(database, 'Others')]
  const job = await givenJob(database, ours.actor)
  const profile = await givenProfile(database, ours.actor, job.id)
  const revision = await givenRevision(database, ours.actor, profile.id)
  const [material] = await listMaterials(database.read, ours.actor.teamId)
  const invitation = await database.write
    .transaction()
    .execute((trx) => invite(trx, ours.actor, { email: 'x@example.org', roles: ['viewer'], administrator: false }))
  const ids: Record<string, string> = {
    jobs: job.id,
    profiles: profile.id,
    revisions: revision,
    materials: material.id,
    invitations: invitation.id,
    people: ours.actor.userId,
  }
  for (const route of routes) {
    const noun = route.path.split('/')[1]
    if (route.path.includes('[id]')) {
      const { status } = await ask(route, theirs, ids[noun])
      expect(status, `${route.method} ${route.path}`).toBe(404)
    } else if (route.method === 'GET') {
      const { text } = await ask(route, theirs)
      for (const id of [...Object.values(ids), ours.actor.teamId]) expect(text, route.path).not.toContain(id)
    }
  }
  for (const route of routes.filter(({ path, method }) => method === 'GET' && path.includes('[id]'))) {
    expect((await ask(route, ours, ids[route.path.split('/')[1]])).status, route.path).toBe(200)
  }
})

test('an answer of any route is never sniffed, framed, run or cached by others', async () => {
  const database = await givenDatabase()
  const member = await givenTeam(database)
  for (const route of routes.filter(({ method }) => method === 'GET')) {
    const { headers } = await ask(route, member)
    expect(headers.get('x-content-type-options'), route.path).toBe('nosniff')
    expect(headers.get('content-security-policy'), route.path).toContain('sandbox')
    expect(headers.get('cache-control'), route.path).toContain('private')
    expect(headers.get('x-request-id')).toHaveLength(26)
  }
})
