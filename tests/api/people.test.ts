import { beforeEach, expect, test } from 'vitest'
import { DELETE as withdraw } from '@/app/api/v1/invitations/[id]/route'
import { POST as accept } from '@/app/api/v1/invitations/accept/route'
import { GET as lookUp } from '@/app/api/v1/invitations/lookup/route'
import { POST as invite } from '@/app/api/v1/invitations/route'
import { PATCH as changeMe, GET as me } from '@/app/api/v1/me/route'
import { PATCH as change } from '@/app/api/v1/people/[id]/route'
import type { Database } from '@/db/client'
import { setClock } from '@/db/now'
import { Invitation, Me } from '@/lib/api/schemas/people'
import { call, givenDatabase } from '@/tests/support/call'
import { givenMember, givenTeam, type Member } from '@/tests/support/team'

let database: Database
let admin: Member
beforeEach(async () => {
  setClock()
  database = await givenDatabase()
  admin = await givenTeam(database)
})
const inviting = async (email: string) => {
  const { json } = await call(invite, { method: 'POST', cookie: admin.cookie, body: { email, roles: ['fabricator'] } })
  const invitation = Invitation.parse(json)
  return { ...invitation, token: invitation.url?.split('/').at(-1) ?? '' }
}
const accepting = (token: string, password = 'long enough') =>
  call(accept, { method: 'POST', body: { token, name: 'Guest', password } })
const patch = (id: string, body: object, version = 1) =>
  call(change, { method: 'PATCH', cookie: admin.cookie, params: { id }, body, version })

test('an invited person looks at the link, accepts, is signed in with the roles given, once', async () => {
  const { token, id } = await inviting('Guest@Example.org')
  expect((await call(lookUp, { query: `?token=${token}` })).json).toMatchObject({
    email: 'guest@example.org',
    known: false,
    team: 'Team',
  })
  const accepted = await accepting(token)
  expect(accepted.status).toBe(201)
  const cookie = accepted.headers.get('set-cookie')?.split(';')[0]
  expect(accepted.headers.get('set-cookie')).toMatch(/HttpOnly; SameSite=Lax/)
  expect((await call(me, { cookie })).json).toMatchObject({ name: 'Guest', roles: ['fabricator'], administrator: false })
  expect((await accepting(token)).json).toMatchObject({ status: 410, code: 'link_spent' })
  expect((await call(withdraw, { method: 'DELETE', cookie: admin.cookie, params: { id } })).status).toBe(404)
})

test('a withdrawn link and one older than 14 days open nothing', async () => {
  const one = await inviting('one@example.org')
  expect((await call(withdraw, { method: 'DELETE', cookie: admin.cookie, params: { id: one.id } })).status).toBe(204)
  expect((await accepting(one.token)).status).toBe(410)
  const two = await inviting('two@example.org')
  setClock(() => new Date(Date.now() + 15 * 86_400_000))
  expect((await accepting(two.token)).status).toBe(410)
})

test('somebody known by another team joins with their own password only, and changes between both', async () => {
  const first = await inviting('both@example.org')
  await accepting(first.token, 'their password')
  const other = await givenTeam(database, 'Others')
  const { json } = await call(invite, {
    method: 'POST',
    cookie: other.cookie,
    body: { email: 'both@example.org', roles: ['viewer'] },
  })
  const token = Invitation.parse(json).url?.split('/').at(-1) ?? ''
  expect((await accepting(token, 'a wrong password')).status).toBe(401)
  const accepted = await accepting(token, 'their password')
  const cookie = accepted.headers.get('set-cookie')?.split(';')[0]
  const now = Me.parse((await call(me, { cookie })).json)
  expect([now.team.name, now.teams.length, now.roles]).toEqual(['Others', 2, ['viewer']])
  const back = await call(changeMe, { method: 'PATCH', cookie, body: { teamId: admin.actor.teamId } })
  expect(back.json).toMatchObject({ team: { name: 'Team' }, roles: ['fabricator'] })
  expect((await call(changeMe, { method: 'PATCH', cookie, body: { teamId: 'c'.repeat(26) } })).status).toBe(404)
})

test('a disabled person is out at once, in this team only', async () => {
  const member = await givenMember(database, admin.actor.teamId, { roles: ['designer'] })
  expect((await call(me, { cookie: member.cookie })).status).toBe(200)
  expect((await patch(member.actor.userId, { disabled: true })).json).toMatchObject({ disabled: true, version: 2 })
  expect((await call(me, { cookie: member.cookie })).status).toBe(401)
})

test('a changed role counts with the next request', async () => {
  const member = await givenMember(database, admin.actor.teamId, { roles: ['viewer'] })
  await patch(member.actor.userId, { roles: ['engineer', 'designer'] })
  expect((await call(me, { cookie: member.cookie })).json).toMatchObject({ roles: ['engineer', 'designer'] })
})

test('the last administrator can neither be disabled nor lose the right', async () => {
  const { userId } = admin.actor
  expect((await patch(userId, { administrator: false })).json).toMatchObject({ status: 409, code: 'last_administrator' })
  expect((await patch(userId, { disabled: true })).status).toBe(409)
  expect((await call(me, { cookie: admin.cookie })).json).toMatchObject({ administrator: true })
})

test('who is in the team already cannot be invited again', async () => {
  const { token } = await inviting('guest@example.org')
  await accepting(token)
  const again = await call(invite, {
    method: 'POST',
    cookie: admin.cookie,
    body: { email: 'GUEST@example.org', roles: ['viewer'] },
  })
  expect(again.json).toMatchObject({ status: 409, code: 'taken' })
})
