import { readBlob } from '@/db/blobs'
import type { Db } from '@/db/client'
import { unpackRegion } from '@/lib/geometry/pack'
import type { Region } from '@/lib/geometry/region'

/** The region stored with a revision. The caller has found the blob by a row of its own team. */
export async function storedRegion(db: Db, regionBlobId: string): Promise<Region> {
  const chunks: Uint8Array[] = []
  for await (const chunk of readBlob(db, regionBlobId)) chunks.push(chunk)
  return unpackRegion(new Uint8Array(Buffer.concat(chunks)))
}
