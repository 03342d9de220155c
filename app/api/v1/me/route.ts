import { database, inTransaction } from '@/db/instance'
import { changeMe, getMe, teamsOf } from '@/db/people'
import { switchTeam } from '@/db/sessions'
import { AppError } from '@/lib/api/errors'
import { route } from '@/lib/api/route'
import { MeChange } from '@/lib/api/schemas/people'
import { actorOf } from '@/lib/auth/actor'
import { tokenIn } from '@/lib/auth/cookie'

export const GET = route({ permission: 'signed in' }, ({ actor }) => getMe(database().read, actor))

export const PATCH = route({ permission: 'signed in', body: MeChange }, async ({ actor, body, request, requestId }) => {
  const { teamId, ...change } = body
  const token = tokenIn(request.headers.get('cookie'))
  await inTransaction(async (trx) => {
    await changeMe(trx, actor, change)
    if (!teamId || !token) return
    const team = (await teamsOf(trx, actor.userId)).find(({ id }) => id === teamId)
    if (!team) throw new AppError('not_found')
    await switchTeam(trx, token, actor.userId, team.id)
  })
  return getMe(database().read, (await actorOf(request.headers, requestId)) ?? actor)
})
