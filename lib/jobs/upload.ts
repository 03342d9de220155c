import { createWriteStream } from 'node:fs'
import { rm } from 'node:fs/promises'
import { Readable } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import type { Actor } from '@/db/actor'
import { readBlob } from '@/db/blobs'
import { findFile } from '@/db/files'
import { newId, type TeamId } from '@/db/id'
import { database } from '@/db/instance'
import { getProfile } from '@/db/profiles'
import { AppError } from '@/lib/api/errors'
import { FileQuery } from '@/lib/api/schemas/revision'
import { config } from '@/lib/config'
import { finishIntake, incomingPath, isEarlier, replay, takeIn, tooManyWaiting } from './intake'
import { type Received, type ReceivedFile, receive } from './receive'
import { sectionPool } from './server-pool'
import { uploadForm } from './uploadForm'

/** One upload from its first byte to a saved revision, whose id it gives. */
export async function upload(actor: Actor, profileId: string, request: Request, requestId: string): Promise<string> {
  const profile = await getProfile(database().read, actor.teamId, profileId)
  if (profile.binnedAt) throw new AppError('binned')
  if (!sectionPool().hasRoomFor(actor.userId)) throw tooManyWaiting()
  const id = newId()
  const path = incomingPath(id)
  const key = keyIn(request)
  try {
    const received = await receive(request, path, config().maxFileBytes)
    const file = received.file ?? (await storedFile(actor.teamId, received, path))
    const form = uploadForm(received.fields)
    form.recipe.material ??= profile.material?.id ?? null
    const taken = await takeIn(actor, { id, profileId, key, fileName: file.name, sha256: file.sha256, bytes: file.bytes, form })
    if (isEarlier(taken)) return replay(taken)
    await finishIntake(taken, requestId, request.signal)
    return id
  } finally {
    await rm(path, { force: true })
  }
}

function keyIn({ headers }: Request): string | null {
  const key = headers.get('idempotency-key')
  if (key !== null && (key.length < 8 || key.length > 200))
    throw new AppError('invalid', 'The idempotency key has 8 to 200 characters.')
  return key
}

/** A further profile from a sheet that the team has already: its stored bytes are taken again. */
async function storedFile(teamId: TeamId, { fields }: Received, path: string): Promise<ReceivedFile> {
  const { data: asked } = FileQuery.safeParse({ sha256: fields.get('fileSha256') })
  if (!asked) throw new AppError('invalid', 'Send a file, or fileSha256 of one that the team has.')
  const { read } = database()
  const known = await findFile(read, teamId, asked.sha256)
  if (!known) throw new AppError('not_found', 'The team has no file with this hash. Send the file itself.')
  await pipeline(Readable.from(readBlob(read, known.blobId)), createWriteStream(path, { mode: 0o600 }))
  return { name: fields.get('fileName') || 'drawing.dxf', sha256: asked.sha256, bytes: known.bytes }
}
