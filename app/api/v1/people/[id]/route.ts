import { inTransaction } from '@/db/instance'
import { changePerson } from '@/db/people'
import { route } from '@/lib/api/route'
import { ById } from '@/lib/api/schemas/common'
import { PersonChange } from '@/lib/api/schemas/people'

export const PATCH = route(
  { permission: 'people.manage', params: ById, ifMatch: true, body: PersonChange },
  ({ actor, params, version, body }) => inTransaction((trx) => changePerson(trx, actor, params.id, version, body)),
)
