import { database, inTransaction } from '@/db/instance'
import { invite, listInvitations } from '@/db/invitations'
import { route } from '@/lib/api/route'
import { Invite } from '@/lib/api/schemas/people'
import { config } from '@/lib/config'

export const GET = route({ permission: 'people.manage' }, async ({ actor }) => ({
  items: await listInvitations(database().read, actor.teamId),
}))

export const POST = route({ permission: 'people.manage', body: Invite, status: 201 }, async ({ actor, body }) => {
  const { token, ...invitation } = await inTransaction((trx) => invite(trx, actor, body))
  return { ...invitation, url: `${config().appUrl}/invite/${token}` }
})
