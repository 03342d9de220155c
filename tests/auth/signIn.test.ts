import { afterEach, expect, test } from 'vitest'
import { setClock } from '@/db/now'
import { findActor, hashToken } from '@/db/sessions'
import { hashPassword } from '@/lib/auth/password'
import { checkPassword } from '@/lib/auth/signIn'
import { givenDatabase } from '@/tests/support/call'
import { givenMember, givenTeam } from '@/tests/support/team'

afterEach(() => setClock())
const quick = { N: 1024, r: 8, p: 1 }

async function given() {
  const database = await givenDatabase()
  const { actor } = await givenTeam(database)
  const passwordHash = await hashPassword('right password', quick)
  const member = await givenMember(database, actor.teamId, { roles: ['viewer'], passwordHash })
  const user = await database.read
    .selectFrom('user')
    .select('email')
    .where('id', '=', member.actor.userId)
    .executeTakeFirstOrThrow()
  return { database, member, email: user.email }
}

test('the right password gives the person, in any case of the address', async () => {
  const { member, email } = await given()
  expect(await checkPassword({ email: email.toUpperCase(), password: 'right password', address: '1.1.1.1' })).toBe(
    member.actor.userId,
  )
})

test('an unknown address and a wrong password are told alike', async () => {
  const { email } = await given()
  const wrong = checkPassword({ email, password: 'wrong', address: '1.1.1.1' })
  await expect(wrong).rejects.toMatchObject({ code: 'wrong_password' })
  const unknown = checkPassword({ email: 'nobody@example.org', password: 'wrong', address: '1.1.1.1' })
  await expect(unknown).rejects.toMatchObject({ code: 'wrong_password' })
})

test('the 11th attempt on an account waits 60 s even with the right password, another account does not', async () => {
  const { email } = await given()
  setClock(() => new Date('2026-01-01T00:00:00Z'))
  const attempt = (password: string, to = email) => checkPassword({ email: to, password, address: '1.1.1.1' })
  for (let k = 0; k < 10; k++) await expect(attempt('wrong')).rejects.toMatchObject({ code: 'wrong_password' })
  await expect(attempt('right password')).rejects.toMatchObject({ code: 'too_many', extra: { retryAfter: 60 } })
  await expect(attempt('wrong', 'other@example.org')).rejects.toMatchObject({ code: 'wrong_password' })
  setClock(() => new Date('2026-01-01T00:01:00Z'))
  await expect(attempt('right password')).resolves.toBeTypeOf('string')
})

test('only the hash of a session is stored, and a session ends after 30 days', async () => {
  const { database, member } = await given()
  const rows = await database.read.selectFrom('session').select('idHash').execute()
  expect(rows.map(({ idHash }) => idHash)).toContain(hashToken(member.token))
  expect(JSON.stringify(rows)).not.toContain(member.token)
  expect(await findActor(database.read, member.token, null)).toMatchObject({ userId: member.actor.userId, roles: ['viewer'] })
  setClock(() => new Date(Date.now() + 31 * 86_400_000))
  expect(await findActor(database.read, member.token, null)).toBeNull()
})
