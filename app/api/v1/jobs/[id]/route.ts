import { database, inTransaction } from '@/db/instance'
import { binJob, changeJob, getJob } from '@/db/jobs'
import { route } from '@/lib/api/route'
import { ById } from '@/lib/api/schemas/common'
import { JobChange } from '@/lib/api/schemas/job'

export const GET = route({ permission: 'job.read', params: ById }, ({ actor, params }) =>
  getJob(database().read, actor.teamId, params.id),
)

export const PATCH = route(
  { permission: 'job.edit', params: ById, ifMatch: true, body: JobChange },
  ({ actor, params, version, body }) => inTransaction((trx) => changeJob(trx, actor, params.id, version, body)),
)

export const DELETE = route({ permission: 'job.edit', params: ById, ifMatch: true }, ({ actor, params, version }) =>
  inTransaction((trx) => binJob(trx, actor, params.id, version)),
)
