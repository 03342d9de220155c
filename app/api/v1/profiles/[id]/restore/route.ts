import { inTransaction } from '@/db/instance'
import { restoreProfile } from '@/db/profiles'
import { route } from '@/lib/api/route'
import { ById } from '@/lib/api/schemas/common'

export const POST = route({ permission: 'profile.edit', params: ById }, ({ actor, params }) =>
  inTransaction((trx) => restoreProfile(trx, actor, params.id)),
)
