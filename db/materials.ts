import { AppError } from '@/lib/api/errors'
import type { Material, MaterialFields } from '@/lib/api/schemas/people'
import type { Actor, Writer } from './actor'
import type { Db, Trx } from './client'
import { record } from './events'
import { newId, type TeamId } from './id'
import { now } from './now'
import { USUAL_MATERIALS } from './usualMaterials'

const COLUMNS = ['id', 'name', 'density', 'source', 'version'] as const

export const listMaterials = (db: Db, teamId: TeamId): Promise<Material[]> =>
  db.selectFrom('material').select(COLUMNS).where('teamId', '=', teamId).orderBy('name').limit(1000).execute()

export async function getMaterial(db: Db, teamId: TeamId, id: string): Promise<Material> {
  const found = await db
    .selectFrom('material')
    .select(COLUMNS)
    .where('teamId', '=', teamId)
    .where('id', '=', id)
    .executeTakeFirst()
  if (!found) throw new AppError('not_found')
  return found
}

async function refuseTakenName(trx: Trx, teamId: TeamId, name: string): Promise<void> {
  const other = await trx
    .selectFrom('material')
    .select('id')
    .where('teamId', '=', teamId)
    .where('name', '=', name)
    .executeTakeFirst()
  if (other) throw new AppError('taken', `There is a material “${name}” already. Choose another name.`)
}

export async function addMaterial(trx: Trx, writer: Writer, fields: MaterialFields, id = newId()): Promise<Material> {
  await refuseTakenName(trx, writer.teamId, fields.name)
  const material: Material = { id, ...fields, version: 1 }
  await trx
    .insertInto('material')
    .values({ ...material, teamId: writer.teamId, createdAt: now() })
    .execute()
  await record(trx, writer, 'material.added', 'material', id, { after: fields })
  return material
}

export async function addUsualMaterials(trx: Trx, writer: Writer): Promise<void> {
  for (const fields of USUAL_MATERIALS) await addMaterial(trx, writer, fields)
}

/** Changes the row; sections keep the density with which they were computed. */
export async function changeMaterial(
  trx: Trx,
  actor: Actor,
  id: string,
  version: number,
  change: Partial<MaterialFields>,
): Promise<Material> {
  const before = await getMaterial(trx, actor.teamId, id)
  if (before.version !== version) throw new AppError('stale', undefined, { current: before })
  if (change.name && change.name !== before.name) await refuseTakenName(trx, actor.teamId, change.name)
  const after: Material = { ...before, ...change, version: version + 1 }
  await trx
    .updateTable('material')
    .set({ name: after.name, density: after.density, source: after.source, version: after.version })
    .where('teamId', '=', actor.teamId)
    .where('id', '=', id)
    .execute()
  await record(trx, actor, 'material.changed', 'material', id, { before, after })
  return after
}
