import { mkdtempSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { z } from 'zod'
import { setDatabase } from '@/db/instance'
import type { Handler } from '@/lib/api/route'
import { freshDatabase } from './database'

process.env.LOG_LEVEL ??= 'silent'
process.env.DATA_DIR ??= mkdtempSync(path.join(os.tmpdir(), 'sectionwright-test-'))

const ORIGIN = 'http://localhost:3000'

/** A fresh database that the routes use. */
export async function givenDatabase() {
  const database = await freshDatabase()
  setDatabase(database)
  return database
}

interface Call {
  method?: string
  cookie?: string
  params?: Record<string, string>
  query?: string
  /** JSON, or FormData as it is */
  body?: unknown
  headers?: Record<string, string>
  version?: number
}
const Body = z.record(z.string(), z.unknown())

/** Calls a route as a browser of our own pages would. */
export async function call(
  handler: Handler,
  { method = 'GET', cookie, params = {}, query = '', body, headers = {}, version }: Call = {},
) {
  const all = new Headers({ host: 'localhost:3000', origin: ORIGIN, ...headers })
  if (cookie) all.set('cookie', cookie)
  if (version !== undefined) all.set('if-match', `"${version}"`)
  const sent = body === undefined || body instanceof FormData ? body : JSON.stringify(body)
  const request = new Request(`${ORIGIN}/api/v1/called${query}`, { method, headers: all, body: sent })
  const response = await handler(request, { params: Promise.resolve(params) })
  const text = await response.clone().text()
  const json = response.headers.get('content-type')?.includes('json') ? Body.parse(JSON.parse(text)) : {}
  return { status: response.status, json, text, headers: response.headers, response }
}
