import { createHash } from 'node:crypto'
import { createWriteStream } from 'node:fs'
import { rm } from 'node:fs/promises'
import { Readable, Transform, type TransformCallback } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import busboy from 'busboy'
import { AppError, isAppError } from '@/lib/api/errors'

export interface ReceivedFile {
  name: string
  sha256: string
  bytes: number
}
export interface Received {
  fields: Map<string, string>
  file: ReceivedFile | null
}

const MIB = 1024 * 1024
const tooLarge = (maxBytes: number) => new AppError('too_large', `The file is larger than ${Math.floor(maxBytes / MIB)} MiB.`)

/** A name as shown and offered for download: no folder, no control characters, never empty. */
function plainName(name: string): string {
  const base = name.replace(/^.*[\\/]/, '')
  const printable = Array.from(base).filter((c) => c >= ' ' && c !== '\u007f')
  return printable.join('').trim().slice(0, 255) || 'drawing.dxf'
}

/** Streams a multipart body to `path`, hashed and counted on the way. Leaves no file behind when it fails. */
export async function receive(request: Request, path: string, maxBytes: number): Promise<Received> {
  if (Number(request.headers.get('content-length') ?? 0) > maxBytes + MIB) throw tooLarge(maxBytes)
  try {
    return await parse(request, path, maxBytes)
  } catch (error) {
    await rm(path, { force: true })
    if (isAppError(error) || isStorageError(error)) throw error
    throw new AppError('invalid', 'The upload broke off before it was complete. Send it again.')
  }
}

const isStorageError = (error: unknown) => error instanceof Error && 'code' in error && error.code === 'ENOSPC'

function parserFor(request: Request, maxBytes: number): busboy.Busboy {
  try {
    const headers = Object.fromEntries(request.headers)
    const limits = { files: 1, fields: 8, parts: 9, fileSize: maxBytes, fieldSize: MIB, fieldNameSize: 100, headerPairs: 50 }
    return busboy({ headers, limits, defParamCharset: 'utf8' })
  } catch {
    throw new AppError('not_multipart')
  }
}

async function parse(request: Request, path: string, maxBytes: number): Promise<Received> {
  const parser = parserFor(request, maxBytes)
  if (!request.body) throw new AppError('invalid', 'The upload is empty.')
  const fields = new Map<string, string>()
  let file: Promise<ReceivedFile> | null = null
  const refusals: unknown[] = []
  // the parser cannot be destroyed from within its own events
  const refuse = (error: AppError) => {
    refusals.push(error)
    setImmediate(() => parser.destroy(error))
  }
  parser.on('field', (name, value, { valueTruncated }) => {
    if (valueTruncated) refuse(new AppError('too_large', `The field “${name}” is larger than 1 MiB.`))
    fields.set(name, value)
  })
  parser.on('file', (_name, stream, { filename }) => {
    stream.on('limit', () => refuse(tooLarge(maxBytes)))
    file = store(stream, path, plainName(filename ?? ''))
    file.catch((error) => parser.destroy(error))
  })
  for (const limit of ['filesLimit', 'fieldsLimit', 'partsLimit'] as const) {
    parser.on(limit, () => refuse(new AppError('invalid', 'The upload has more parts than file, recipe and fields.')))
  }
  try {
    await pipeline(Readable.fromWeb(request.body), parser)
    if (refusals.length === 0) return { fields, file: await file }
  } catch (error) {
    refusals.push(error)
  }
  await Promise.allSettled([file])
  throw refusals[0]
}

async function store(stream: Readable, path: string, name: string): Promise<ReceivedFile> {
  const hash = createHash('sha256')
  let bytes = 0
  const counter = new Transform({
    transform(chunk: Buffer, _encoding, done: TransformCallback) {
      hash.update(chunk)
      bytes += chunk.length
      done(null, chunk)
    },
  })
  await pipeline(stream, counter, createWriteStream(path, { mode: 0o600 }))
  return { name, sha256: hash.digest('hex'), bytes }
}
