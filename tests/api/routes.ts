import { readdirSync } from 'node:fs'
import path from 'node:path'
import type { Handler } from '@/lib/api/route'

const root = path.resolve(import.meta.dirname, '../../app/api/v1')
const METHODS = ['GET', 'HEAD', 'POST', 'PUT', 'PATCH', 'DELETE'] as const

export interface Found {
  /** `/profiles/[id]/revisions` */
  path: string
  method: (typeof METHODS)[number]
  handler: Partial<Handler> & ((request: Request, context: { params: Promise<Record<string, string>> }) => Promise<Response>)
}

/** Every exported method of every route file. */
export async function allRoutes(): Promise<Found[]> {
  const files = readdirSync(root, { recursive: true, encoding: 'utf8' }).filter((file) => path.basename(file) === 'route.ts')
  const found: Found[] = []
  for (const file of files.sort()) {
    const module: Record<string, Found['handler']> = await import(path.join(root, file))
    for (const method of METHODS) {
      if (method in module) found.push({ path: `/${path.dirname(file)}`, method, handler: module[method] })
    }
  }
  return found
}
