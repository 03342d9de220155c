import { database, inTransaction } from '@/db/instance'
import { acceptInvitation, lookUpInvitation } from '@/db/invitations'
import { openSession } from '@/db/sessions'
import { route } from '@/lib/api/route'
import { AcceptInvitation } from '@/lib/api/schemas/people'
import { addressOf } from '@/lib/auth/address'
import { sessionCookie } from '@/lib/auth/cookie'
import { hashPassword } from '@/lib/auth/password'
import { checkPassword } from '@/lib/auth/signIn'

export const POST = route({ permission: 'anyone', body: AcceptInvitation }, async ({ body, request, requestId }) => {
  const { email, known, teamId } = await lookUpInvitation(database().read, body.token)
  if (known) await checkPassword({ email, password: body.password, address: addressOf(request.headers) })
  const passwordHash = await hashPassword(body.password)
  const token = await inTransaction(async (trx) => {
    const userId = await acceptInvitation(trx, { token: body.token, name: body.name, passwordHash, requestId })
    return openSession(trx, userId, teamId)
  })
  return Response.json({}, { status: 201, headers: token ? { 'set-cookie': sessionCookie(token) } : {} })
})
