import { config } from '@/lib/config'
import { AppError } from './errors'

const LOOPBACK = /^(localhost|127\.0\.0\.1|\[::1\])(:\d+)?$/

/** Names under which our own pages are served. On a server for this machine only, a foreign name that was pointed here is none. */
function ownHosts(headers: Headers): string[] {
  const { appUrl, local } = config()
  const host = headers.get('host') ?? ''
  return [new URL(appUrl).host, ...(local && !LOOPBACK.test(host) ? [] : [host])]
}

/**
 * A browser sends a cookie along from any site, and can be made to post from one without: a change is taken only from
 * our own pages. Programs send neither cookie nor origin.
 */
export function refuseForeignOrigin({ method, headers }: Request): void {
  const origin = headers.get('origin')
  if (method === 'GET' || method === 'HEAD' || (origin === null && !headers.has('cookie'))) return
  if (!origin || !URL.canParse(origin) || !ownHosts(headers).includes(new URL(origin).host)) throw new AppError('bad_origin')
}
