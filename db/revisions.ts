import { sql } from 'kysely'
import { z } from 'zod'
import { AppError } from '@/lib/api/errors'
import {
  Opinion,
  type Revision,
  type RevisionFields,
  type RevisionSummary,
  SizeConfirmation,
  UsedMaterial,
} from '@/lib/api/schemas/revision'
import { SectionAnswer } from '@/lib/api/schemas/section'
import type { Recipe } from '@/lib/geometry/recipe'
import type { SectionAnswer as Answer, Section } from '@/lib/section/types'
import type { Writer } from './actor'
import type { Db, Trx } from './client'
import { record } from './events'
import { usesOfFile } from './files'
import type { TeamId } from './id'
import { parseJson } from './json'
import { letterOf } from './letter'
import { now } from './now'
import { figureColumns } from './sectionColumns'

const Opinions = z.array(Opinion)

const revisions = (db: Db, teamId: TeamId) =>
  db
    .selectFrom('revision')
    .innerJoin('section', 'section.revisionId', 'revision.id')
    .innerJoin('sourceFile', 'sourceFile.id', 'revision.sourceFileId')
    .innerJoin('user', 'user.id', 'revision.createdBy')
    .where('revision.teamId', '=', teamId)
    .select([
      'revision.id',
      'revision.profileId',
      'revision.position',
      'revision.state',
      'revision.drawingRevision',
      'revision.note',
      'revision.fileName',
      'revision.createdAt',
      'revision.version',
      'sourceFile.bytes',
      'sourceFile.sha256',
      'user.id as creatorId',
      'user.name as creatorName',
      'section.engineVersion',
    ])

const State = z.enum(['draft', 'in review', 'released', 'superseded', 'withdrawn'])

interface Common {
  id: string
  profileId: string
  position: number
  state: string
  drawingRevision: string
  note: string
  createdAt: string
  creatorId: string
  creatorName: string
  version: number
}
const common = (row: Common) => ({
  id: row.id,
  profileId: row.profileId,
  letter: letterOf(row.position),
  state: State.parse(row.state),
  drawingRevision: row.drawingRevision,
  note: row.note,
  createdAt: row.createdAt,
  createdBy: { id: row.creatorId, name: row.creatorName },
  version: row.version,
})

/** The revisions of a profile, newest first. */
export async function listRevisions(db: Db, teamId: TeamId, profileId: string): Promise<RevisionSummary[]> {
  const rows = await revisions(db, teamId)
    .where('revision.profileId', '=', profileId)
    .select([
      'section.area',
      'section.mass',
      'section.ix',
      'section.iy',
      'section.i1',
      'section.i2',
      'section.theta',
      'section.circle',
    ])
    .orderBy('revision.position', 'desc')
    .limit(1000)
    .execute()
  return rows.map((row) => {
    const { fileName, bytes, sha256, engineVersion, area, mass, ix, iy, i1, i2, theta, circle } = row
    const figures = { area: area ?? 0, mass, ix: ix ?? 0, iy: iy ?? 0, i1: i1 ?? 0, i2: i2 ?? 0, theta, circle: circle ?? 0 }
    return { ...common(row), file: { name: fileName, bytes, sha256 }, engineVersion, figures }
  })
}

export async function getRevision(db: Db, teamId: TeamId, id: string): Promise<Revision> {
  const row = await revisions(db, teamId)
    .select(['revision.confirmation', 'revision.material', 'revision.opinions', 'section.answer'])
    .where('revision.id', '=', id)
    .executeTakeFirst()
  if (!row) throw new AppError('not_found')
  const uses = await usesOfFile(db, teamId, row.sha256)
  const alsoIn = uses.filter(({ revisionId }) => revisionId !== id)
  return {
    ...common(row),
    confirmation: row.confirmation === null ? null : parseJson(row.confirmation, SizeConfirmation),
    file: {
      name: row.fileName,
      bytes: row.bytes,
      sha256: row.sha256,
      alsoIn: alsoIn.map(({ profileId, number, letter }) => ({ profileId, number, letter })),
    },
    answer: parseJson(row.answer, SectionAnswer),
    material: row.material === null ? null : parseJson(row.material, UsedMaterial),
    opinions: row.opinions === null ? null : parseJson(row.opinions, Opinions),
  }
}

/** The stored JSON of a section as it is: text, so that a read neither parses nor writes it again. */
export async function getAnswerText(db: Db, teamId: TeamId, id: string): Promise<string> {
  const row = await db
    .selectFrom('section')
    .select('answer')
    .where('teamId', '=', teamId)
    .where('revisionId', '=', id)
    .executeTakeFirst()
  if (!row) throw new AppError('not_found')
  return row.answer
}

/** Where the bytes of a revision lie: its source file and its packed region. */
export async function getStored(db: Db, teamId: TeamId, id: string) {
  const row = await db
    .selectFrom('revision')
    .innerJoin('section', 'section.revisionId', 'revision.id')
    .innerJoin('sourceFile', 'sourceFile.id', 'revision.sourceFileId')
    .innerJoin('profile', 'profile.id', 'revision.profileId')
    .where('revision.teamId', '=', teamId)
    .where('revision.id', '=', id)
    .select([
      'revision.fileName',
      'revision.position',
      'profile.number',
      'sourceFile.bytes',
      'sourceFile.sha256',
      'sourceFile.blobId',
      'section.regionBlobId',
    ])
    .executeTakeFirst()
  if (!row) throw new AppError('not_found')
  return row
}

export interface NewRevision {
  id: string
  profileId: string
  recipe: Recipe
  fields: RevisionFields
  sourceFileId: string
  fileName: string
  material: UsedMaterial | null
  answer: Answer
  section: Section
  regionBlobId: string
}

/** Revision, section, the profile's newest figures and the event; the bytes were written before. */
export async function addRevision(trx: Trx, writer: Writer & { userId: string }, revision: NewRevision): Promise<void> {
  const { id, profileId, recipe, fields, sourceFileId, fileName, material, answer, section, regionBlobId } = revision
  const { teamId, userId } = writer
  const profile = await trx
    .selectFrom('profile')
    .innerJoin('job', 'job.id', 'profile.jobId')
    .select(['profile.revisions', 'profile.binnedAt', 'job.binnedAt as jobBinnedAt'])
    .where('profile.teamId', '=', teamId)
    .where('profile.id', '=', profileId)
    .executeTakeFirst()
  if (!profile) throw new AppError('not_found')
  if (profile.binnedAt || profile.jobBinnedAt) throw new AppError('binned')
  const at = now()
  const figures = figureColumns(section)
  await trx
    .insertInto('revision')
    .values({
      id,
      teamId,
      profileId,
      position: profile.revisions,
      state: 'draft',
      recipe: JSON.stringify(recipe),
      confirmation: fields.confirmation && JSON.stringify(fields.confirmation),
      drawingRevision: fields.drawingRevision,
      note: fields.note,
      sourceFileId,
      fileName,
      material: material && JSON.stringify(material),
      createdAt: at,
      createdBy: userId,
      version: 1,
    })
    .execute()
  await trx
    .insertInto('section')
    .values({
      revisionId: id,
      teamId,
      engineVersion: answer.engineVersion,
      answer: JSON.stringify(answer),
      regionBlobId,
      ...figures,
    })
    .execute()
  await trx
    .updateTable('profile')
    .set({ ...figures, latestRevisionId: id, revisions: profile.revisions + 1, updatedAt: at, version: sql<number>`version + 1` })
    .where('teamId', '=', teamId)
    .where('id', '=', profileId)
    .execute()
  const after = {
    profileId,
    letter: letterOf(profile.revisions),
    sha256: answer.source.sha256,
    engineVersion: answer.engineVersion,
  }
  await record(trx, writer, 'revision.added', 'revision', id, { after })
}

/** The second opinions, which come after the section is out, and the findings they gave. */
export async function storeOpinions(trx: Trx, teamId: TeamId, id: string, opinions: Opinion[], answer: Answer): Promise<void> {
  const { numUpdatedRows } = await trx
    .updateTable('revision')
    .set({ opinions: JSON.stringify(opinions) })
    .where('teamId', '=', teamId)
    .where('id', '=', id)
    .where('opinions', 'is', null)
    .executeTakeFirst()
  if (numUpdatedRows === 0n) return
  await trx
    .updateTable('section')
    .set({ answer: JSON.stringify(answer) })
    .where('teamId', '=', teamId)
    .where('revisionId', '=', id)
    .execute()
  const system = { teamId, userId: null, requestId: null }
  await record(trx, system, 'opinions.stored', 'revision', id, {
    after: { agree: opinions.map(({ library, agrees }) => [library, agrees]) },
  })
}

/** Revisions whose second opinions were lost with a stopped server. Not of one team: the server itself asks. */
export const withoutOpinions = (db: Db) =>
  db
    .selectFrom('revision')
    .select(['id', 'teamId', 'createdBy'])
    .where('opinions', 'is', null)
    .orderBy('createdAt')
    .limit(100)
    .execute()
