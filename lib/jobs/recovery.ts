import { createWriteStream, existsSync } from 'node:fs'
import { readdir, rm } from 'node:fs/promises'
import path from 'node:path'
import { Readable } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import { readBlob } from '@/db/blobs'
import { newId, type TeamId } from '@/db/id'
import { database, inTransaction } from '@/db/instance'
import { countIntake, giveUpIntake, type Intake, openIntakes } from '@/db/intakes'
import { getRevision, getStored, withoutOpinions } from '@/db/revisions'
import { isAppError } from '@/lib/api/errors'
import { config } from '@/lib/config'
import { DEFAULT_RECIPE } from '@/lib/geometry/recipe'
import { log } from '../log'
import { finishIntake, incomingPath } from './intake'
import { awaitOpinions } from './saveRevision'
import { sectionPool } from './server-pool'

/** After so many starts with the same upload under way it is given up: it may be what stops the server. */
const ATTEMPTS = 3

/** Takes up again what a stop interrupted, one after the other. New requests go on meanwhile. */
export async function recover(): Promise<void> {
  const intakes = await openIntakes(database().read)
  await removeStrayFiles(new Set(intakes.map(({ id }) => id)))
  for (const intake of intakes) await resume(intake)
  for (const { id, teamId, createdBy } of await withoutOpinions(database().read)) await askAgain(id, teamId, createdBy)
}

async function removeStrayFiles(known: Set<string>): Promise<void> {
  const { incomingDir } = config()
  for (const name of await readdir(incomingDir)) if (!known.has(name)) await rm(path.join(incomingDir, name), { force: true })
}

async function resume(intake: Intake): Promise<void> {
  const { id, attempts } = intake
  if (attempts >= ATTEMPTS || !existsSync(incomingPath(id))) {
    const why = attempts >= ATTEMPTS ? `not finished in ${ATTEMPTS} attempts` : 'its bytes were not complete'
    await inTransaction((trx) => giveUpIntake(trx, intake, why))
    await rm(incomingPath(id), { force: true })
    log().warn({ intake: id, why }, 'upload given up')
    return
  }
  if (!(await inTransaction((trx) => countIntake(trx, intake)))) return
  try {
    await finishIntake(intake, null)
    log().info({ intake: id }, 'upload resumed')
  } catch (error) {
    log().warn({ intake: id, code: isAppError(error) ? error.code : 'internal' }, 'resumed upload came to nothing')
  }
}

/** Second opinions that were lost: asked again of the stored bytes. The section itself stays as it is. */
async function askAgain(id: string, teamId: TeamId, person: string): Promise<void> {
  const { read } = database()
  const file = incomingPath(newId())
  try {
    const { blobId, bytes, sha256, fileName } = await getStored(read, teamId, id)
    await pipeline(Readable.from(readBlob(read, blobId)), createWriteStream(file, { mode: 0o600 }))
    const { answer } = await getRevision(read, teamId, id)
    const recipe = { ...DEFAULT_RECIPE, ...answer.recipe }
    const job = { path: file, source: { name: fileName, bytes, sha256 }, recipe, materials: {} }
    const result = await sectionPool().run(job, { person })
    if (!result.ok) return
    awaitOpinions(teamId, id, { ...answer, recipe }, result.opinions)
    await result.opinions
  } finally {
    await rm(file, { force: true })
  }
}
