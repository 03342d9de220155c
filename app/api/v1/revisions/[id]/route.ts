import { database } from '@/db/instance'
import { getRevision } from '@/db/revisions'
import { route } from '@/lib/api/route'
import { ById } from '@/lib/api/schemas/common'

export const GET = route({ permission: 'profile.read', params: ById }, ({ actor, params }) =>
  getRevision(database().read, actor.teamId, params.id),
)
