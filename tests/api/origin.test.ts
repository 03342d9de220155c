import { expect, test } from 'vitest'
import { GET as list, POST as open } from '@/app/api/v1/jobs/route'
import { POST as setUp } from '@/app/api/v1/setup/route'
import { call, givenDatabase } from '@/tests/support/call'
import { givenTeam } from '@/tests/support/team'

test('a change with our cookie from another site, from a file or without an origin is refused', async () => {
  const { cookie } = await givenTeam(await givenDatabase())
  const post = (origin: string) => call(open, { method: 'POST', cookie, body: { title: 'J' }, headers: { origin } })
  for (const origin of ['https://evil.example', 'null', 'http://localhost:3001', '']) {
    expect((await post(origin)).json, origin).toMatchObject({ status: 403, code: 'bad_origin' })
  }
  expect((await post('http://localhost:3000')).status).toBe(201)
  expect((await call(list, { cookie, headers: { origin: 'https://evil.example' } })).status).toBe(200)
})

test('another site cannot set a fresh server up through a browser, nor under a foreign name that points here', async () => {
  await givenDatabase()
  const body = { team: 'T', name: 'N', email: 'n@example.org', password: 'long enough' }
  const post = (headers: Record<string, string>) => call(setUp, { method: 'POST', body, headers })
  expect((await post({ origin: 'https://evil.example' })).json).toMatchObject({ status: 403, code: 'bad_origin' })
  expect((await post({ origin: 'http://evil.example:3000', host: 'evil.example:3000' })).status).toBe(403)
  expect((await post({ origin: 'http://127.0.0.1:3000', host: '127.0.0.1:3000' })).status).toBe(201)
})

test('a body over 1 MiB of JSON is 413', async () => {
  const { cookie } = await givenTeam(await givenDatabase())
  const { status } = await call(open, { method: 'POST', cookie, body: { title: 'x'.repeat(1024 * 1024) } })
  expect(status).toBe(413)
})
