import { listEvents } from '@/db/events'
import { database } from '@/db/instance'
import { route } from '@/lib/api/route'
import { EventQuery } from '@/lib/api/schemas/event'

export const GET = route({ permission: 'event.read', query: EventQuery }, ({ actor, query }) =>
  listEvents(database().read, actor.teamId, query),
)
