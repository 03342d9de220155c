import { randomBytes } from 'node:crypto'
import { type NextRequest, NextResponse } from 'next/server'
import { PAGE_HEADER } from './lib/auth/pageHeader'

const developing = process.env.NODE_ENV !== 'production'

function policyWith(nonce: string): string {
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${developing ? " 'unsafe-eval'" : ''}`,
    `style-src 'self' ${developing ? "'unsafe-inline'" : `'nonce-${nonce}'`}`,
    "worker-src 'self'",
    "img-src 'self' blob: data:",
    "font-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ')
}

/** A content security policy with a nonce of its own for every page, and the page's name for whoever has to sign in first. */
export function proxy(request: NextRequest): NextResponse {
  const nonce = randomBytes(16).toString('base64')
  const policy = policyWith(nonce)
  const headers = new Headers(request.headers)
  headers.set('x-nonce', nonce)
  headers.set(PAGE_HEADER, request.nextUrl.pathname + request.nextUrl.search)
  headers.set('content-security-policy', policy)
  const response = NextResponse.next({ request: { headers } })
  response.headers.set('content-security-policy', policy)
  response.headers.set('x-content-type-options', 'nosniff')
  response.headers.set('referrer-policy', 'same-origin')
  return response
}

// a route matched here has its body cut at 10 MB, so uploads stay out
export const config = { matcher: ['/((?!api/|_next/static|_next/image|favicon.ico).*)'] }
