import { checkReadable } from '@/db/health'
import { database } from '@/db/instance'
import { route } from '@/lib/api/route'
import { ENGINE_VERSION } from '@/lib/section/engineVersion'

export const GET = route({ permission: 'anyone' }, async () => {
  await checkReadable(database())
  return { status: 'ok', engineVersion: ENGINE_VERSION }
})
