import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { createServer, type Server } from 'node:http'
import os from 'node:os'
import path from 'node:path'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { pack, packedFiles } from '../../scripts/packed.mjs'

const dist = mkdtempSync(path.join(os.tmpdir(), 'sectionwright-packed-'))
const text = 'export const answer = 42\n'.repeat(200)
let server: Server
let url = ''

beforeAll(async () => {
  mkdirSync(path.join(dist, 'static', 'chunks'), { recursive: true })
  writeFileSync(path.join(dist, 'static', 'chunks', 'a.js'), text)
  writeFileSync(path.join(dist, 'secret.js.br'), 'not for anybody')
  pack(dist)
  const send = packedFiles(dist)
  server = createServer((request, response) => {
    if (!send(request, response)) response.writeHead(404).end()
  })
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const address = server.address()
  url = `http://127.0.0.1:${typeof address === 'object' && address ? address.port : 0}`
})
afterAll(() => {
  server.close()
  rmSync(dist, { recursive: true, force: true })
})

const get = (at: string, encodings = 'gzip, br') => fetch(`${url}${at}`, { headers: { 'accept-encoding': encodings } })

test('a script of 5000 characters comes packed, reads the same, and may be kept for a year', async () => {
  const answer = await get('/_next/static/chunks/a.js')
  expect(answer.headers.get('content-encoding')).toBe('br')
  expect(answer.headers.get('cache-control')).toBe('public, max-age=31536000, immutable')
  expect(await answer.text()).toBe(text)
})

test('who takes no br, asks for another file, or leaves the folder is left to the next handler', async () => {
  const asked = [
    get('/_next/static/chunks/a.js', 'gzip'),
    get('/_next/static/chunks/b.js'),
    get('/_next/static/%2e%2e/secret.js'),
    get('/jobs'),
  ]
  for (const answer of await Promise.all(asked)) expect(answer.status).toBe(404)
})
