import { inTransaction } from '@/db/instance'
import { withdrawInvitation } from '@/db/invitations'
import { route } from '@/lib/api/route'
import { ById } from '@/lib/api/schemas/common'

export const DELETE = route({ permission: 'people.manage', params: ById }, ({ actor, params }) =>
  inTransaction((trx) => withdrawInvitation(trx, actor, params.id)),
)
