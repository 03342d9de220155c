const HEADERS: Record<string, string> = {
  'x-content-type-options': 'nosniff',
  'referrer-policy': 'same-origin',
  'cross-origin-resource-policy': 'same-origin',
  'content-security-policy': "default-src 'none'; sandbox; frame-ancestors 'none'",
  'cache-control': 'private, no-store',
}

/** Every answer of the API: never sniffed, framed, run or kept by a shared cache. What the route set itself stands. */
export function secure(response: Response, requestId: string): Response {
  for (const [name, value] of Object.entries(HEADERS)) if (!response.headers.has(name)) response.headers.set(name, value)
  response.headers.set('x-request-id', requestId)
  return response
}
