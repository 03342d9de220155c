import type { Metadata } from 'next'
import { Fallback } from '@/components/lists/Fallback'
import { TeamPage } from '@/components/people/TeamPage'
import { database } from '@/db/instance'
import { listMaterials } from '@/db/materials'
import { listPeople } from '@/db/people'
import { keys } from '@/lib/api/keys'
import { requireActor } from '@/lib/auth/actor'

export const metadata: Metadata = { title: 'Team' }

export default async function Page() {
  const { teamId } = await requireActor('team.read')
  const { read } = database()
  const fallback = { [keys.people]: await listPeople(read, teamId), [keys.materials]: await listMaterials(read, teamId) }
  return (
    <Fallback of={fallback}>
      <TeamPage />
    </Fallback>
  )
}
