import { createHash } from 'node:crypto'
import { rm } from 'node:fs/promises'
import path from 'node:path'
import { z } from 'zod'
import type { Actor } from '@/db/actor'
import { answerKey, claimKey, type Earlier } from '@/db/idempotency'
import { database, inTransaction } from '@/db/instance'
import { addIntake, closeIntake, dropIntake, type Intake } from '@/db/intakes'
import { listMaterials } from '@/db/materials'
import { parseJson } from '@/db/json'
import { AppError, type ErrorCode, ERRORS, isAppError } from '@/lib/api/errors'
import { config } from '@/lib/config'
import { DEFAULT_RECIPE } from '@/lib/geometry/recipe'
import { disagreements } from './agreement'
import { awaitOpinions, saveRevision } from './saveRevision'
import type { JobFailure } from './sectionJob'
import { sectionPool } from './server-pool'
import { sweepBlobs } from './sweep'

export const incomingPath = (id: string) => path.join(config().incomingDir, id)

/** Commits that the bytes are here, before anything is computed. An earlier answer to the same key comes back instead. */
export async function takeIn(actor: Actor, taken: Omit<Intake, 'teamId' | 'userId' | 'attempts'>): Promise<Intake | Earlier> {
  const { key, profileId, sha256, fileName, form } = taken
  const bodyHash = createHash('sha256').update(JSON.stringify({ profileId, sha256, fileName, form })).digest('hex')
  return inTransaction(async (trx) => (key && (await claimKey(trx, actor, key, bodyHash))) || addIntake(trx, actor, taken))
}

/** Refusals that the same bytes and recipe meet again: kept with the key, so that a retry is answered alike. */
const LASTING: readonly ErrorCode[] = ['no_section', 'disagreement']

/** Computes what was taken in and saves it as a revision with the intake's id. Throws AppError where there is none. */
export async function finishIntake(intake: Intake, requestId: string | null, signal?: AbortSignal): Promise<void> {
  const file = incomingPath(intake.id)
  try {
    await compute(intake, file, requestId, signal)
  } catch (error) {
    const { key, userId } = intake
    if (isAppError(error) && key && LASTING.includes(error.code)) {
      const { code, detail, extra } = error
      await inTransaction(async (trx) => {
        await closeIntake(trx, intake)
        await answerKey(trx, userId, key, { status: ERRORS[code].status, body: { code, detail, extra } })
      })
    } else await inTransaction((trx) => dropIntake(trx, intake))
    await sweepBlobs()
    throw error
  } finally {
    await rm(file, { force: true })
  }
}

async function compute(intake: Intake, file: string, requestId: string | null, signal?: AbortSignal): Promise<void> {
  const { teamId, userId, form, fileName, bytes, sha256 } = intake
  const materials = await listMaterials(database().read, teamId)
  const recipe = { ...DEFAULT_RECIPE, ...form.recipe }
  const material = materials.find(({ id }) => id === recipe.material) ?? null
  if (recipe.material !== null && !material)
    throw new AppError('invalid', 'The recipe names a material that the team does not have.')
  const job = {
    path: file,
    source: { name: fileName, bytes, sha256 },
    recipe,
    materials: Object.fromEntries(materials.map(({ id, name, density, source }) => [id, { name, density, source }])),
    ...(form.fields.confirmation ? {} : { unconfirmedBy: 'the API' }),
  }
  const result = await sectionPool().run(job, { person: userId, signal })
  if (!result.ok) throw failure(result.why)
  const { answer, region, opinions } = result
  const { section, findings, findingsTotal } = answer
  if (!section || !region) throw new AppError('no_section', undefined, { findings, findingsTotal })
  const different = disagreements(section, form.fields.shown ?? {})
  if (different.length > 0) {
    throw new AppError('disagreement', `Browser and server do not agree on ${different.join(', ')}; nothing was saved.`, {
      different,
    })
  }
  const used = material && { id: material.id, name: material.name, density: material.density, source: material.source }
  await saveRevision(intake, file, { answer, section, region, material: used }, requestId)
  awaitOpinions(teamId, intake.id, answer, opinions)
}

function failure(why: JobFailure): AppError {
  const { computeSeconds, computeMemoryMb } = config()
  switch (why) {
    case 'queue':
      return tooManyWaiting()
    case 'aborted':
      return new AppError('invalid', 'The upload was cancelled.')
    case 'unreadable':
      return new AppError('internal')
    case 'time':
      return limit(
        `The drawing needs more than the ${computeSeconds} s that this server allows. Leave out what is no profile, or split the sheet.`,
      )
    case 'memory':
      return limit(
        `The drawing needs more than the ${computeMemoryMb} MB that this server allows. Leave out what is no profile, or split the sheet.`,
      )
    case 'died':
      return limit(
        'The computation ended without an answer. Nothing was saved. Try again, and report the drawing if it stays so.',
      )
  }
}

const limit = (message: string) =>
  new AppError('compute_limit', message, { findings: [{ code: 'compute-limit', severity: 'error', message, params: {} }] })

export const tooManyWaiting = () =>
  new AppError('too_many', 'Two of your drawings are waiting to be computed already. Send this one when they are done.', {
    retryAfter: 5,
  })

const Refusal = z.object({
  code: z.custom<ErrorCode>((code) => typeof code === 'string' && code in ERRORS),
  detail: z.string().optional(),
  extra: z.record(z.string(), z.unknown()),
})

/** What an earlier request with the same key came to: the id of its revision, or its refusal thrown again. */
export function replay({ resultId, body }: Earlier): string {
  if (resultId) return resultId
  const { code, detail, extra } = parseJson(body ?? '{}', Refusal)
  throw new AppError(code, detail, extra)
}

export const isEarlier = (taken: Intake | Earlier): taken is Earlier => 'status' in taken
