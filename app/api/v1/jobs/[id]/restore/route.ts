import { inTransaction } from '@/db/instance'
import { restoreJob } from '@/db/jobs'
import { route } from '@/lib/api/route'
import { ById } from '@/lib/api/schemas/common'

export const POST = route({ permission: 'job.edit', params: ById }, ({ actor, params }) =>
  inTransaction((trx) => restoreJob(trx, actor, params.id)),
)
