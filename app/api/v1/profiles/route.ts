import { database, inTransaction } from '@/db/instance'
import { addProfile, listProfiles } from '@/db/profiles'
import { route } from '@/lib/api/route'
import { ProfileFields, ProfileQuery } from '@/lib/api/schemas/profile'

export const GET = route({ permission: 'profile.read', query: ProfileQuery }, ({ actor, query }) =>
  listProfiles(database().read, actor.teamId, query),
)

export const POST = route({ permission: 'profile.edit', body: ProfileFields, status: 201 }, ({ actor, body }) =>
  inTransaction((trx) => addProfile(trx, actor, body)),
)
