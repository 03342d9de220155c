import { database, inTransaction } from '@/db/instance'
import { addMaterial, listMaterials } from '@/db/materials'
import { route } from '@/lib/api/route'
import { MaterialFields } from '@/lib/api/schemas/people'

export const GET = route({ permission: 'material.read' }, async ({ actor }) => ({
  items: await listMaterials(database().read, actor.teamId),
}))

export const POST = route({ permission: 'material.edit', body: MaterialFields, status: 201 }, ({ actor, body }) =>
  inTransaction((trx) => addMaterial(trx, actor, body)),
)
