import { mkdtempSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { expect, test } from 'vitest'
import { GET as materials } from '@/app/api/v1/materials/route'
import { GET as me } from '@/app/api/v1/me/route'
import { POST as setUp, GET as state } from '@/app/api/v1/setup/route'
import { setupCode } from '@/lib/auth/setupCode'
import { call, givenDatabase } from '@/tests/support/call'

// beyond this machine: read with the first request of this file
process.env.HOST = '0.0.0.0'
process.env.APP_URL = 'http://localhost:3000'
process.env.DATA_DIR = mkdtempSync(path.join(os.tmpdir(), 'sectionwright-setup-'))

const body = { team: 'Workshop', name: 'Ann', email: 'Ann@Example.org', password: 'long enough' }

test('the first visit from beyond this machine needs the printed code, makes team and administrator, and works once', async () => {
  await givenDatabase()
  expect((await call(state)).json).toEqual({ needed: true, code: true })
  expect((await call(setUp, { method: 'POST', body })).json).toMatchObject({ status: 403, code: 'code_wrong' })
  expect((await call(setUp, { method: 'POST', body: { ...body, code: '123' } })).status).toBe(403)
  const code = setupCode()
  expect(code).toMatch(/^\d{12}$/)
  const done = await call(setUp, { method: 'POST', body: { ...body, code: `${code.slice(0, 6)} ${code.slice(6)}` } })
  expect(done.status).toBe(201)
  const cookie = done.headers.get('set-cookie')?.split(';')[0]
  expect((await call(me, { cookie })).json).toMatchObject({
    email: 'ann@example.org',
    administrator: true,
    team: { name: 'Workshop' },
  })
  expect((await call(materials, { cookie })).text).toContain('EN AW-6060 T66')
  expect((await call(state)).json).toEqual({ needed: false, code: true })
  expect((await call(setUp, { method: 'POST', body: { ...body, code } })).json).toMatchObject({ status: 409, code: 'set_up' })
})
