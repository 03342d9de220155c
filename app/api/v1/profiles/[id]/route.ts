import { database, inTransaction } from '@/db/instance'
import { binProfile, changeProfile, getProfile } from '@/db/profiles'
import { route } from '@/lib/api/route'
import { ById } from '@/lib/api/schemas/common'
import { ProfileChange } from '@/lib/api/schemas/profile'

export const GET = route({ permission: 'profile.read', params: ById }, ({ actor, params }) =>
  getProfile(database().read, actor.teamId, params.id),
)

export const PATCH = route(
  { permission: 'profile.edit', params: ById, ifMatch: true, body: ProfileChange },
  ({ actor, params, version, body }) => inTransaction((trx) => changeProfile(trx, actor, params.id, version, body)),
)

export const DELETE = route({ permission: 'profile.edit', params: ById, ifMatch: true }, ({ actor, params, version }) =>
  inTransaction((trx) => binProfile(trx, actor, params.id, version)),
)
