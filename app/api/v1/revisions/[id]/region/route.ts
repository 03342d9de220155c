import { readBlob } from '@/db/blobs'
import { database } from '@/db/instance'
import { getStored } from '@/db/revisions'
import { streamOf } from '@/lib/api/download'
import { route } from '@/lib/api/route'
import { ById } from '@/lib/api/schemas/common'

/** A revision is never computed anew, so its region may be kept by the browser. */
const KEPT = { 'content-type': 'application/octet-stream', 'cache-control': 'private, max-age=31536000, immutable' }

export const GET = route({ permission: 'profile.read', params: ById }, async ({ actor, params }) => {
  const { read } = database()
  const { regionBlobId } = await getStored(read, actor.teamId, params.id)
  return new Response(streamOf(readBlob(read, regionBlobId)), { headers: KEPT })
})
