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

/** A drawing of rectangles, each [x, y, width, height], as closed polylines in mm. */
export function rectanglesDxf(...rectangles: [number, number, number, number][]): string {
  const lines = ['0', 'SECTION', '2', 'HEADER', '9', '$ACADVER', '1', 'AC1015', '9', '$INSUNITS', '70', '4', '0', 'ENDSEC']
  lines.push('0', 'SECTION', '2', 'ENTITIES')
  for (const [x, y, w, h] of rectangles) {
    lines.push('0', 'LWPOLYLINE', '8', '0', '90', '4', '70', '1')
    for (const [px, py] of [
      [x, y],
      [x + w, y],
      [x + w, y + h],
      [x, y + h],
    ])
      lines.push('10', String(px), '20', String(py))
  }
  return `${[...lines, '0', 'ENDSEC', '0', 'EOF'].join('\n')}\n`
}
