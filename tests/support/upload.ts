import { mkdirSync } from 'node:fs'
import { POST } from '@/app/api/v1/profiles/[id]/revisions/route'
import { config } from '@/lib/config'
import { sectionPool } from '@/lib/jobs/server-pool'
import { bundle } from './bundle'
import { call } from './call'
import type { Member } from './team'

/** A pool with the child of these sources and the folder that uploads come into. */
export async function givenPool(options: { seconds?: number; memoryBytes?: number } = {}) {
  mkdirSync(config().incomingDir, { recursive: true })
  const [child] = await bundle('lib/jobs/section.child.ts', 'lib/jobs/watchdog.ts')
  return sectionPool({ bundle: child, ...options })
}

interface Upload {
  bytes?: Uint8Array<ArrayBuffer> | string
  name?: string
  recipe?: object
  fields?: object
  fileSha256?: string
  key?: string
}

/** Uploads through the real route. */
export function upload(
  { cookie }: Member,
  profileId: string,
  { bytes, name = 'a.dxf', recipe, fields, fileSha256, key }: Upload,
) {
  const body = new FormData()
  if (recipe) body.set('recipe', JSON.stringify(recipe))
  if (fields) body.set('fields', JSON.stringify(fields))
  if (fileSha256) body.set('fileSha256', fileSha256)
  if (bytes !== undefined) body.set('file', new File([bytes], name))
  const headers: Record<string, string> = key ? { 'idempotency-key': key } : {}
  return call(POST, { method: 'POST', cookie, params: { id: profileId }, body, headers })
}
