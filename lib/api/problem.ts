import { AppError, ERRORS, isAppError } from './errors'

const isStorageFull = (error: unknown) =>
  typeof error === 'object' && error !== null && 'code' in error && (error.code === 'SQLITE_FULL' || error.code === 'ENOSPC')

/** What failed, as an error of the closed list; null for a fault that nobody expected. */
export function knownError(error: unknown): AppError | null {
  if (isAppError(error)) return error
  return isStorageFull(error) ? new AppError('storage_full') : null
}

/** An error as problem+json (RFC 9457). */
export function problemResponse({ code, detail, extra }: AppError, requestId: string): Response {
  const { status, title } = ERRORS[code]
  const headers = new Headers({ 'content-type': 'application/problem+json' })
  if (typeof extra.retryAfter === 'number') headers.set('retry-after', String(extra.retryAfter))
  const body = { type: `urn:sectionwright:${code}`, title, status, ...(detail ? { detail } : {}), code, requestId, ...extra }
  return new Response(JSON.stringify(body), { status, headers })
}
