import type { Actor } from '@/db/actor'
import { writeBlob } from '@/db/blobs'
import type { Database } from '@/db/client'
import { linkFile } from '@/db/files'
import { newId } from '@/db/id'
import { setDatabase } from '@/db/instance'
import { openJob } from '@/db/jobs'
import { addProfile } from '@/db/profiles'
import { addRevision } from '@/db/revisions'
import { createHash } from 'node:crypto'
import { packRegion } from '@/lib/geometry/pack'
import { DEFAULT_RECIPE } from '@/lib/geometry/recipe'
import { answerWith, rectangleSection } from './answer'
import { rectangle, regionOf } from './region'

export const givenJob = (database: Database, actor: Actor, title = 'Job') =>
  database.write.transaction().execute((trx) => openJob(trx, actor, { title, client: '' }))

export const givenProfile = (database: Database, actor: Actor, jobId: string, title = 'Profile') =>
  database.write.transaction().execute((trx) => addProfile(trx, actor, { jobId, title, materialId: null, drawingNumber: '' }))

/** A revision of a profile with a b × h rectangle, stored as the last step of an upload stores it. */
export async function givenRevision(
  database: Database,
  actor: Actor,
  profileId: string,
  { b = 20, h = 60, bytes = Buffer.from('dxf') } = {},
) {
  setDatabase(database)
  const id = newId()
  const sha256 = createHash('sha256').update(bytes).digest('hex')
  await writeBlob(`${id}-file`, [bytes])
  await writeBlob(`${id}-region`, [packRegion(regionOf(rectangle(0, 0, b, h)))])
  const section = rectangleSection(b, h, 2700)
  await database.write.transaction().execute(async (trx) => {
    const sourceFileId = await linkFile(trx, actor, { sha256, bytes: bytes.length, blobId: `${id}-file` })
    await addRevision(trx, actor, {
      id,
      profileId,
      recipe: DEFAULT_RECIPE,
      fields: { drawingRevision: '', note: '', confirmation: null, shown: null },
      sourceFileId,
      fileName: 'rectangle.dxf',
      material: null,
      answer: answerWith(section, sha256),
      section,
      regionBlobId: `${id}-region`,
    })
  })
  return id
}
