import { database, inTransaction } from '@/db/instance'
import { addUser, joinTeam } from '@/db/people'
import { openSession } from '@/db/sessions'
import { createTeam, isSetUp } from '@/db/teams'
import { AppError } from '@/lib/api/errors'
import { route } from '@/lib/api/route'
import { SetUp } from '@/lib/api/schemas/people'
import { sessionCookie } from '@/lib/auth/cookie'
import { hashPassword } from '@/lib/auth/password'
import { ROLES } from '@/lib/auth/permissions'
import { checkSetupCode, forgetSetupCode, isCodeAsked } from '@/lib/auth/setupCode'

export const GET = route({ permission: 'anyone' }, async () => ({
  needed: !(await isSetUp(database().read)),
  code: isCodeAsked(),
}))

export const POST = route({ permission: 'anyone', body: SetUp }, async ({ body, requestId }) => {
  if (await isSetUp(database().read)) throw new AppError('set_up')
  checkSetupCode(body.code)
  const passwordHash = await hashPassword(body.password)
  const token = await inTransaction(async (trx) => {
    if (await isSetUp(trx)) throw new AppError('set_up')
    const writer = await createTeam(trx, body.team)
    const userId = await addUser(trx, { name: body.name, email: body.email, passwordHash })
    await joinTeam(trx, { ...writer, requestId }, userId, { roles: [...ROLES], administrator: true })
    return openSession(trx, userId)
  })
  forgetSetupCode()
  return Response.json({}, { status: 201, headers: token ? { 'set-cookie': sessionCookie(token) } : {} })
})
