import { database } from '@/db/instance'
import { intakesOf } from '@/db/intakes'
import { route } from '@/lib/api/route'

export const GET = route({ permission: 'revision.add' }, async ({ actor }) => ({
  items: await intakesOf(database().read, actor),
}))
