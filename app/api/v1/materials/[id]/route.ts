import { inTransaction } from '@/db/instance'
import { changeMaterial } from '@/db/materials'
import { route } from '@/lib/api/route'
import { ById } from '@/lib/api/schemas/common'
import { MaterialFields } from '@/lib/api/schemas/people'

export const PATCH = route(
  { permission: 'material.edit', params: ById, ifMatch: true, body: MaterialFields.partial() },
  ({ actor, params, version, body }) => inTransaction((trx) => changeMaterial(trx, actor, params.id, version, body)),
)
