import type { z } from 'zod'
import { AppError } from './errors'

const MAX_JSON_BYTES = 1024 * 1024

/** The value as the schema makes it, or `invalid` with every issue and its place. */
export function parse<T>(schema: z.ZodType<T>, value: unknown): T {
  const parsed = schema.safeParse(value)
  if (parsed.success) return parsed.data
  const issues = parsed.error.issues.slice(0, 50).map(({ path, message }) => ({ path: path.join('.'), message }))
  throw new AppError('invalid', issues.map(({ path, message }) => (path ? `${path}: ${message}` : message)).join('; '), {
    issues,
  })
}

/** An id of the wrong form names nothing. */
export function parseParams<T>(schema: z.ZodType<T>, value: unknown): T {
  const parsed = schema.safeParse(value)
  if (!parsed.success) throw new AppError('not_found')
  return parsed.data
}

export async function jsonIn(request: Request): Promise<unknown> {
  const text = await textIn(request)
  try {
    return JSON.parse(text)
  } catch {
    throw new AppError('invalid', 'The body is not JSON.')
  }
}

async function textIn({ body }: Request): Promise<string> {
  const parts: Uint8Array[] = []
  let bytes = 0
  const reader = body?.getReader()
  for (let part = await reader?.read(); part && !part.done; part = await reader?.read()) {
    bytes += part.value.byteLength
    if (bytes > MAX_JSON_BYTES) throw new AppError('too_large', 'The body is larger than 1 MiB.')
    parts.push(part.value)
  }
  return Buffer.concat(parts).toString('utf8')
}

/** The version in If-Match, quoted or not. */
export function versionIn({ headers }: Request): number {
  const given = headers.get('if-match')
  if (given === null) throw new AppError('missing_version')
  const version = Number(given.replace(/^(?:W\/)?"?|"$/g, ''))
  if (!Number.isInteger(version)) throw new AppError('invalid', 'If-Match is no version.')
  return version
}
