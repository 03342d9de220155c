import { database } from '@/db/instance'
import { getAnswerText } from '@/db/revisions'
import { route } from '@/lib/api/route'
import { ById } from '@/lib/api/schemas/common'

export const GET = route({ permission: 'profile.read', params: ById }, async ({ actor, params }) => {
  const answer = await getAnswerText(database().read, actor.teamId, params.id)
  return new Response(answer, { headers: { 'content-type': 'application/json' } })
})
