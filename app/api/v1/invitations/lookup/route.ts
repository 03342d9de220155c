import { database } from '@/db/instance'
import { lookUpInvitation } from '@/db/invitations'
import { route } from '@/lib/api/route'
import { InvitationToken } from '@/lib/api/schemas/people'

export const GET = route({ permission: 'anyone', query: InvitationToken }, async ({ query }) => {
  const { team, email, roles, administrator, expiresAt, known } = await lookUpInvitation(database().read, query.token)
  return { team, email, roles, administrator, expiresAt, known }
})
