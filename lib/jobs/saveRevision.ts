import { createReadStream } from 'node:fs'
import { writeBlob } from '@/db/blobs'
import { linkFile } from '@/db/files'
import type { TeamId } from '@/db/id'
import { answerKey } from '@/db/idempotency'
import { inTransaction } from '@/db/instance'
import { closeIntake, type Intake } from '@/db/intakes'
import { addRevision, storeOpinions } from '@/db/revisions'
import type { UsedMaterial } from '@/lib/api/schemas/revision'
import type { Section, SectionAnswer } from '@/lib/section/types'
import { log } from '../log'
import { withFindings } from './answer'
import type { Opinions } from './sectionJob'

interface Computed {
  answer: SectionAnswer
  section: Section
  region: Uint8Array
  material: UsedMaterial | null
}

/**
 * Bytes first, chunk by chunk and seen by nobody; then one transaction that makes file, revision, section,
 * event and the key's answer visible together. A stop in between leaves chunks that the next start sweeps.
 */
export async function saveRevision(intake: Intake, path: string, computed: Computed, requestId: string | null): Promise<void> {
  const { id, teamId, userId, profileId, key, sha256, bytes, fileName, form } = intake
  const { answer, section, region, material } = computed
  const [blobId, regionBlobId] = [`${id}-file`, `${id}-region`]
  await writeBlob(blobId, createReadStream(path))
  await writeBlob(regionBlobId, [region])
  await inTransaction(async (trx) => {
    if (!(await closeIntake(trx, intake))) return
    const writer = { teamId, userId, requestId }
    const sourceFileId = await linkFile(trx, writer, { sha256, bytes, blobId })
    const { fields } = form
    const { recipe } = answer
    await addRevision(trx, writer, {
      id,
      profileId,
      recipe,
      fields,
      sourceFileId,
      fileName,
      material,
      answer,
      section,
      regionBlobId,
    })
    if (key) await answerKey(trx, userId, key, { status: 201, resultId: id })
  })
}

const pending = new Set<Promise<void>>()

/** Stores the second opinions when they come; they confirm and never hold up a save. */
export function awaitOpinions(teamId: TeamId, id: string, answer: SectionAnswer, opinions: Promise<Opinions | null>): void {
  const stored = opinions
    .then((came) =>
      inTransaction((trx) => storeOpinions(trx, teamId, id, came?.opinions ?? [], withFindings(answer, came?.findings ?? []))),
    )
    .catch((error: unknown) => log().error({ revision: id, error: String(error) }, 'second opinions not stored'))
    .finally(() => pending.delete(stored))
  pending.add(stored)
}

/** Resolves when no second opinion is awaited any more. */
export const opinionsSettled = () => Promise.all(pending)
