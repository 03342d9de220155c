import { database } from '@/db/instance'
import { listPeople } from '@/db/people'
import { route } from '@/lib/api/route'

export const GET = route({ permission: 'team.read' }, async ({ actor }) => ({
  items: await listPeople(database().read, actor.teamId),
}))
