import { findFile, usesOfFile } from '@/db/files'
import { database } from '@/db/instance'
import { route } from '@/lib/api/route'
import { FileQuery } from '@/lib/api/schemas/revision'

export const GET = route({ permission: 'profile.read', query: FileQuery }, async ({ actor, query }) => {
  const { read } = database()
  const known = (await findFile(read, actor.teamId, query.sha256)) !== undefined
  return { known, uses: await usesOfFile(read, actor.teamId, query.sha256) }
})
