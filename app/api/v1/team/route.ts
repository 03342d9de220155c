import { database, inTransaction } from '@/db/instance'
import { changeTeam, getTeam } from '@/db/teams'
import { route } from '@/lib/api/route'
import { TeamChange } from '@/lib/api/schemas/people'

export const GET = route({ permission: 'team.read' }, ({ actor }) => getTeam(database().read, actor.teamId))

export const PATCH = route({ permission: 'team.settings', ifMatch: true, body: TeamChange }, ({ actor, version, body }) =>
  inTransaction((trx) => changeTeam(trx, actor, version, body)),
)
