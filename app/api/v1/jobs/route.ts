import { database, inTransaction } from '@/db/instance'
import { listJobs, openJob } from '@/db/jobs'
import { route } from '@/lib/api/route'
import { JobFields, JobQuery } from '@/lib/api/schemas/job'

export const GET = route({ permission: 'job.read', query: JobQuery }, ({ actor, query }) =>
  listJobs(database().read, actor.teamId, query),
)

export const POST = route({ permission: 'job.edit', body: JobFields, status: 201 }, ({ actor, body }) =>
  inTransaction((trx) => openJob(trx, actor, body)),
)
