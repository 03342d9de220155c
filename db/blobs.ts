import { sql } from 'kysely'
import type { Db, Trx } from './client'
import { inTransaction } from './instance'

export const CHUNK_BYTES = 1024 * 1024

/**
 * Bytes in pieces of 1 MiB, each in a short transaction of its own, so that nobody waits long. Not yet linked to anything.
 * Writing the same bytes again, after a stop half-way, changes nothing.
 */
export async function writeBlob(blobId: string, source: AsyncIterable<Uint8Array> | Iterable<Uint8Array>): Promise<void> {
  let n = 0
  for await (const data of inChunks(source)) {
    await inTransaction((trx) => putChunk(trx, blobId, n, data))
    n++
  }
}

const putChunk = (trx: Trx, blobId: string, n: number, data: Uint8Array) =>
  trx
    .insertInto('chunk')
    .values({ blobId, n, data })
    .onConflict((conflict) => conflict.columns(['blobId', 'n']).doNothing())
    .execute()

async function* inChunks(source: AsyncIterable<Uint8Array> | Iterable<Uint8Array>): AsyncGenerator<Uint8Array> {
  let rest = Buffer.alloc(0)
  for await (const part of source) {
    rest = Buffer.concat([rest, part])
    for (; rest.length >= CHUNK_BYTES; rest = rest.subarray(CHUNK_BYTES)) yield rest.subarray(0, CHUNK_BYTES)
  }
  if (rest.length > 0) yield rest
}

/** The bytes of a blob, chunk by chunk. The caller has found the blob by a row of its own team. */
export async function* readBlob(db: Db, blobId: string): AsyncGenerator<Uint8Array<ArrayBuffer>> {
  for (let n = 0; ; n++) {
    const row = await db.selectFrom('chunk').select('data').where('blobId', '=', blobId).where('n', '=', n).executeTakeFirst()
    if (!row) return
    yield new Uint8Array(row.data)
  }
}

export async function dropBlob(trx: Trx, blobId: string): Promise<void> {
  await trx.deleteFrom('chunk').where('blobId', '=', blobId).execute()
}

/** Blobs that neither a row nor an upload under way refers to. Not of one team: the server itself asks. */
export async function unlinkedBlobs(db: Db): Promise<string[]> {
  const rows = await db
    .selectFrom('chunk')
    .select('blobId')
    .where('n', '=', 0)
    .where('blobId', 'not in', db.selectFrom('sourceFile').select('blobId'))
    .where('blobId', 'not in', db.selectFrom('section').select('regionBlobId'))
    .where(sql<string>`substr(blob_id, 1, 26)`, 'not in', db.selectFrom('intake').select('id'))
    .execute()
  return rows.map(({ blobId }) => blobId)
}
