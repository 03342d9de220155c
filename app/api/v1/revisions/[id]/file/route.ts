import { readBlob } from '@/db/blobs'
import { database } from '@/db/instance'
import { getStored } from '@/db/revisions'
import { attachment, streamOf } from '@/lib/api/download'
import { route } from '@/lib/api/route'
import { ById } from '@/lib/api/schemas/common'

export const GET = route({ permission: 'file.read', params: ById }, async ({ actor, params }) => {
  const { read } = database()
  const { fileName, bytes, sha256, blobId } = await getStored(read, actor.teamId, params.id)
  const headers = { ...attachment(fileName, 'application/octet-stream'), 'content-length': String(bytes), etag: `"${sha256}"` }
  return new Response(streamOf(readBlob(read, blobId)), { headers })
})
