import { z } from 'zod'
import { RecipeInput } from '@/lib/api/schemas/recipe'
import { type OpenIntake, RevisionFields } from '@/lib/api/schemas/revision'
import type { Actor } from './actor'
import type { Db, Trx } from './client'
import { profileNumber } from './counter'
import { record } from './events'
import type { TeamId } from './id'
import { releaseKey } from './idempotency'
import { parseJson } from './json'
import { now } from './now'

const Form = z.object({ recipe: RecipeInput, fields: RevisionFields })

/** An upload that was taken in and is not yet a revision. Its bytes lie in the incoming folder under its id. */
export interface Intake {
  id: string
  teamId: TeamId
  userId: string
  profileId: string
  key: string | null
  fileName: string
  sha256: string
  bytes: number
  form: z.infer<typeof Form>
  attempts: number
}

export async function addIntake(
  trx: Trx,
  { teamId, userId }: Actor,
  intake: Omit<Intake, 'teamId' | 'userId' | 'attempts'>,
): Promise<Intake> {
  await trx
    .insertInto('intake')
    .values({ ...intake, teamId, userId, form: JSON.stringify(intake.form), attempts: 1, createdAt: now() })
    .execute()
  return { ...intake, teamId, userId, attempts: 1 }
}

/** The person's own uploads in this team that are not yet revisions, oldest first. */
export async function intakesOf(db: Db, { teamId, userId }: Actor): Promise<OpenIntake[]> {
  const rows = await db
    .selectFrom('intake')
    .innerJoin('profile', (join) =>
      join.onRef('profile.id', '=', 'intake.profileId').onRef('profile.teamId', '=', 'intake.teamId'),
    )
    .select([
      'intake.id',
      'intake.profileId',
      'profile.number',
      'profile.title',
      'intake.fileName',
      'intake.bytes',
      'intake.createdAt',
    ])
    .where('intake.teamId', '=', teamId)
    .where('intake.userId', '=', userId)
    .orderBy('intake.createdAt')
    .execute()
  return rows.map(({ number, ...row }) => ({ ...row, number: profileNumber(number) }))
}

/** Every upload that was under way when the server stopped. Not of one team: the server itself asks. */
export async function openIntakes(db: Db): Promise<Intake[]> {
  const rows = await db.selectFrom('intake').selectAll().orderBy('createdAt').execute()
  return rows.map(({ createdAt: _, form, ...row }) => ({ ...row, form: parseJson(form, Form) }))
}

/** Counts one more attempt. False where another process has taken it up. */
export async function countIntake(trx: Trx, { id, attempts }: Intake): Promise<boolean> {
  const { numUpdatedRows } = await trx
    .updateTable('intake')
    .set({ attempts: attempts + 1 })
    .where('id', '=', id)
    .where('attempts', '=', attempts)
    .executeTakeFirst()
  return numUpdatedRows > 0n
}

/** Ends an intake. False where somebody else has ended it before. */
export async function closeIntake(trx: Trx, { id, teamId }: Intake): Promise<boolean> {
  const { numDeletedRows } = await trx.deleteFrom('intake').where('id', '=', id).where('teamId', '=', teamId).executeTakeFirst()
  return numDeletedRows > 0n
}

/** Forgets an intake that comes to nothing, and gives its key free. */
export async function dropIntake(trx: Trx, intake: Intake): Promise<void> {
  if ((await closeIntake(trx, intake)) && intake.key) await releaseKey(trx, intake.userId, intake.key)
}

/** Forgets an intake that cannot be finished, and says so in the history of its profile. */
export async function giveUpIntake(trx: Trx, intake: Intake, why: string): Promise<void> {
  await dropIntake(trx, intake)
  const system = { teamId: intake.teamId, userId: null, requestId: null }
  await record(trx, system, 'upload.given_up', 'profile', intake.profileId, { after: { fileName: intake.fileName, why } })
}
