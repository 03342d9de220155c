import { mutate } from 'swr'
import type { z } from 'zod'
import type * as Answers from './answers'
import { ERRORS } from './errors'

/** Which of the answers is awaited. */
export type Choice<T> = (answers: typeof Answers) => z.ZodType<T>

/** An answer is parsed, not cast. The schemas come with the first answer, so that no page's first load carries them. */
export const parsed = async <T>(choice: Choice<T>, answer: unknown): Promise<T> => choice(await import('./answers')).parse(answer)

type Refusal = z.infer<typeof Answers.Refusal>

/** A refusal of the server; `problem` is its problem document, by which it is told from other errors. */
export class ProblemError extends Error {
  constructor(readonly problem: Refusal) {
    super(problem.detail ?? problem.title)
  }
}

async function refusalOf(response: Response): Promise<ProblemError> {
  const unread: Refusal = {
    type: 'about:blank',
    title: ERRORS.internal.title,
    status: response.status,
    code: 'internal',
    requestId: response.headers.get('x-request-id') ?? '',
    issues: [],
    findings: [],
    current: undefined,
  }
  const document: unknown = await response.json().catch(() => null)
  return new ProblemError(await parsed(({ Refusal }) => Refusal, document).catch(() => unread))
}

/** Told by its `problem`: a class is another one after a hot reload. */
export const isProblem = (error: unknown): error is ProblemError => error instanceof Error && 'problem' in error

/** `fetch` that throws a ProblemError for a refusal and fetch's own TypeError where the server does not answer. */
export async function request(path: string, init?: RequestInit): Promise<Response> {
  const response = await fetch(path, init)
  if (!response.ok) throw await refusalOf(response)
  return response
}

/** A fetcher for SWR; the key is the API path. */
export const getJson =
  <T>(choice: Choice<T>) =>
  async (path: string): Promise<T> =>
    parsed(choice, await (await request(path)).json())

export const getBytes = async (path: string): Promise<ArrayBuffer> => (await request(path)).arrayBuffer()

interface Options {
  /** goes as JSON; FormData goes as multipart */
  body?: unknown
  /** the version that was seen; needed by every change of an existing row */
  version?: number
  /** a retry with the same key gets the first one's result */
  idempotencyKey?: string
  signal?: AbortSignal
}

/** Sends a change and gives the parsed answer (undefined where there is none). Throws ProblemError. */
export async function sendJson<T>(
  method: 'POST' | 'PATCH' | 'DELETE',
  path: string,
  choice: Choice<T>,
  { body, version, idempotencyKey, signal }: Options = {},
): Promise<T> {
  const headers = new Headers()
  const multipart = body instanceof FormData
  if (body !== undefined && !multipart) headers.set('content-type', 'application/json')
  if (version !== undefined) headers.set('if-match', `"${version}"`)
  if (idempotencyKey) headers.set('idempotency-key', idempotencyKey)
  const sent = multipart ? body : body === undefined ? undefined : JSON.stringify(body)
  const response = await request(path, { method, headers, body: sent, signal })
  return parsed(choice, response.status === 204 ? undefined : await response.json())
}

/** Reads again everything whose key begins so, after a change. */
export const refresh = (prefix: string) => mutate((key) => typeof key === 'string' && key.startsWith(prefix))

/** Puts the row that a change returned in its place, without reading it again. */
export const put = <T>(key: string, row: T) => mutate(key, row, { revalidate: false })

/** A key for one upload. Works over plain http too, where crypto.randomUUID does not. */
export const newIdempotencyKey = () =>
  Array.from(crypto.getRandomValues(new Uint8Array(16)), (byte) => byte.toString(16).padStart(2, '0')).join('')
