import type { Writer } from './actor'
import { dropBlob } from './blobs'
import type { Db, Trx } from './client'
import { profileNumber } from './counter'
import { newId, type TeamId } from './id'
import { letterOf } from './letter'
import { now } from './now'

export const findFile = (db: Db, teamId: TeamId, sha256: string) =>
  db
    .selectFrom('sourceFile')
    .select(['id', 'bytes', 'blobId'])
    .where('teamId', '=', teamId)
    .where('sha256', '=', sha256)
    .executeTakeFirst()

interface NewFile {
  sha256: string
  bytes: number
  /** chunks written before, for the case that the team has not got the file yet */
  blobId: string
}

/** The row of a file in the team. Where the team has it already, the chunks just written are dropped. */
export async function linkFile(trx: Trx, { teamId }: Writer, { sha256, bytes, blobId }: NewFile): Promise<string> {
  const known = await findFile(trx, teamId, sha256)
  if (known) {
    if (known.blobId !== blobId) await dropBlob(trx, blobId)
    return known.id
  }
  const id = newId()
  await trx.insertInto('sourceFile').values({ id, teamId, sha256, bytes, blobId, createdAt: now() }).execute()
  return id
}

/** The revisions made of a file, newest first. */
export async function usesOfFile(db: Db, teamId: TeamId, sha256: string) {
  const rows = await db
    .selectFrom('revision')
    .innerJoin('sourceFile', 'sourceFile.id', 'revision.sourceFileId')
    .innerJoin('profile', 'profile.id', 'revision.profileId')
    .where('revision.teamId', '=', teamId)
    .where('sourceFile.sha256', '=', sha256)
    .select(['revision.id', 'revision.profileId', 'profile.number', 'profile.title', 'revision.position'])
    .orderBy('revision.createdAt', 'desc')
    .limit(100)
    .execute()
  return rows.map(({ id, profileId, number, title, position }) => ({
    revisionId: id,
    profileId,
    number: profileNumber(number),
    title,
    letter: letterOf(position),
  }))
}
