/**
 * The address a request came from. The serving script writes the socket's address here;
 * with TRUST_PROXY it lets the proxy's own entry, the last one, stand.
 */
export const addressOf = (headers: Headers): string => headers.get('x-forwarded-for')?.split(',').at(-1)?.trim() ?? 'unknown'
