import { mutate as revalidate } from 'swr'
import type { z } from 'zod'
import { type ErrorCode, ERRORS } from './errors'
import { Problem } from './schemas/common'

/** A problem document as an error: `code` tells what, `title` and `detail` say it, `extra` holds findings, current, issues. */
export class ProblemError extends Error {
  readonly kind = 'problem'
  constructor(
    readonly code: ErrorCode | 'offline',
    readonly status: number,
    readonly title: string,
    readonly detail: string | undefined,
    readonly requestId: string | undefined,
    readonly extra: Record<string, unknown>,
  ) {
    super(detail ?? title)
  }
}

export function isProblem(error: unknown): error is ProblemError {
  return typeof error === 'object' && error !== null && 'kind' in error && error.kind === 'problem'
}

const isCode = (code: string): code is ErrorCode => code in ERRORS

async function problemOf(response: Response): Promise<ProblemError> {
  const parsed = Problem.safeParse(await response.json().catch(() => null))
  if (!parsed.success) return new ProblemError('internal', response.status, ERRORS.internal.title, undefined, undefined, {})
  const { type: _, title, status, detail, code, requestId, ...extra } = parsed.data
  return new ProblemError(isCode(code) ? code : 'internal', status, title, detail, requestId, extra)
}

async function request(path: string, init?: RequestInit): Promise<Response> {
  const response = await fetch(path, init).catch(() => null)
  if (!response)
    throw new ProblemError('offline', 0, 'The server cannot be reached. Nothing is lost; try again.', undefined, undefined, {})
  if (!response.ok) throw await problemOf(response)
  return response
}

/** A fetcher for SWR: the answer is parsed, not cast. The key is the API path. */
export const getJson =
  <T>(schema: z.ZodType<T>) =>
  async (path: string): Promise<T> =>
    schema.parse(await (await request(path)).json())

export const getBytes = async (path: string): Promise<ArrayBuffer> => (await request(path)).arrayBuffer()

type Method = 'POST' | 'PATCH' | 'DELETE'
interface Options {
  /** the version that was seen; needed by every change of an existing row */
  version?: number
  idempotencyKey?: string
  signal?: AbortSignal
}

/** Sends a change; `FormData` goes as multipart, anything else as JSON. Throws `ProblemError`. */
export async function send<T>(
  method: Method,
  path: string,
  body: unknown,
  schema: z.ZodType<T>,
  options: Options = {},
): Promise<T> {
  const headers = new Headers()
  const multipart = body instanceof FormData
  if (!multipart && body !== undefined) headers.set('content-type', 'application/json')
  if (options.version !== undefined) headers.set('if-match', `"${options.version}"`)
  if (options.idempotencyKey) headers.set('idempotency-key', options.idempotencyKey)
  const sent = multipart ? body : body === undefined ? undefined : JSON.stringify(body)
  const response = await request(path, { method, headers, body: sent, signal: options.signal })
  return schema.parse(response.status === 204 ? undefined : await response.json())
}

/** Reads again everything whose key begins so, after a change. */
export const refresh = (...prefixes: string[]) =>
  revalidate((key) => typeof key === 'string' && prefixes.some((prefix) => key.startsWith(prefix)))

/** Sets the row that a change returned, without reading it again. */
export const put = <T>(key: string, row: T) => revalidate(key, row, { revalidate: false })

/** A key for one upload: its retry gets the same result. Works over plain http, where crypto.randomUUID does not. */
export const newIdempotencyKey = () =>
  Array.from(crypto.getRandomValues(new Uint8Array(16)), (byte) => byte.toString(16).padStart(2, '0')).join('')
