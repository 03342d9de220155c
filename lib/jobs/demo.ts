import { createHash } from 'node:crypto'
import { copyFile, readFile } from 'node:fs/promises'
import path from 'node:path'
import { z } from 'zod'
import type { Actor } from '@/db/actor'
import { record } from '@/db/events'
import { newId, type TeamId } from '@/db/id'
import { database, inTransaction } from '@/db/instance'
import { isJob, openJob } from '@/db/jobs'
import { parseJson } from '@/db/json'
import { listMaterials } from '@/db/materials'
import { withClock } from '@/db/now'
import { addProfile } from '@/db/profiles'
import { AppError } from '@/lib/api/errors'
import { RecipeInput } from '@/lib/api/schemas/recipe'
import { RevisionFields, SizeConfirmation } from '@/lib/api/schemas/revision'
import { finishIntake, incomingPath, isEarlier, takeIn } from './intake'

const Scenario = z.object({
  jobs: z.array(z.object({ key: z.string(), title: z.string(), client: z.string() })),
  profiles: z.array(
    z.object({
      job: z.string(),
      title: z.string(),
      drawingNumber: z.string(),
      material: z.string(),
      file: z.string(),
      recipe: RecipeInput,
      confirmation: SizeConfirmation,
    }),
  ),
})
const START = Date.parse('2026-03-02T08:00:00.000Z')
const HOUR = 3_600_000

/** Work at the n-th hour of the demo's story. */
const at = (n: number, work: () => Promise<void>) => withClock(() => new Date(START + n * HOUR), work)

const folder = () => path.join(/* turbopackIgnore: true */ process.cwd(), 'fixtures', 'demo')

/** The same id for the same thing of the same team, so that the demo is the same wherever it is loaded. */
const fixedId = (teamId: TeamId, thing: string) =>
  newId(createHash('sha256').update(`${teamId} ${thing}`).digest().subarray(0, 16))

/** Loads a small workshop's jobs and profiles, each drawing through the way of every upload. Gives how many. */
export async function loadDemo(actor: Actor): Promise<{ jobs: number; profiles: number }> {
  const { teamId } = actor
  const { jobs, profiles } = parseJson(await readFile(path.join(folder(), 'demo.json'), 'utf8'), Scenario)
  const materials = new Map((await listMaterials(database().read, teamId)).map(({ id, name }) => [name, id]))
  await at(0, async () => {
    const named = jobs.map(({ key, ...fields }) => ({ id: fixedId(teamId, key), ...fields }))
    await inTransaction(async (trx) => {
      if (await isJob(trx, teamId, named[0].id)) throw new AppError('taken', 'The demo data is here already.')
      for (const { id, ...fields } of named) await openJob(trx, actor, fields, id)
      await record(trx, actor, 'demo.loaded', 'team', teamId)
    })
  })
  for (const [k, profile] of profiles.entries()) {
    await at(k + 1, async () => {
      const { job, title, drawingNumber, file } = profile
      const id = fixedId(teamId, file)
      const materialId = materials.get(profile.material) ?? null
      const fields = { jobId: fixedId(teamId, job), title, drawingNumber, materialId }
      await inTransaction((trx) => addProfile(trx, actor, fields, id))
      await addDrawing(actor, id, file, {
        recipe: { ...profile.recipe, material: materialId },
        fields: RevisionFields.parse({ confirmation: profile.confirmation, drawingRevision: '1' }),
      })
    })
  }
  return { jobs: jobs.length, profiles: profiles.length }
}

type Form = { recipe: z.output<typeof RecipeInput>; fields: RevisionFields }

async function addDrawing(actor: Actor, profileId: string, fileName: string, form: Form): Promise<void> {
  const id = fixedId(actor.teamId, `${fileName} A`)
  const source = path.join(folder(), fileName)
  const bytes = await readFile(source)
  await copyFile(source, incomingPath(id))
  const sha256 = createHash('sha256').update(bytes).digest('hex')
  const taken = await takeIn(actor, { id, profileId, key: null, fileName, sha256, bytes: bytes.length, form })
  if (!isEarlier(taken)) await finishIntake(taken, actor.requestId)
}
