import type { NextRequest } from 'next/server'
import NextAuth from 'next-auth'
import { authOptions } from '@/lib/auth/options'

interface Context {
  params: Promise<{ nextauth: string[] }>
}
const MAX_BYTES = 16 * 1024

/** next-auth reads any body whole, so only one that says it is small comes to it. */
const isSmall = ({ method, headers }: NextRequest) =>
  method === 'GET' || Number(headers.get('content-length') ?? Number.POSITIVE_INFINITY) <= MAX_BYTES

async function handler(request: NextRequest, context: Context): Promise<Response> {
  return isSmall(request) ? NextAuth(request, context, authOptions()) : new Response(null, { status: 413 })
}

export { handler as GET, handler as POST }
