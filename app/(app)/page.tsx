import type { Metadata } from 'next'
import { Waiting } from '@/components/jobs/Waiting'
import { Fallback } from '@/components/lists/Fallback'
import { database } from '@/db/instance'
import { listProfiles } from '@/db/profiles'
import { keys } from '@/lib/api/keys'
import { ProfileQuery } from '@/lib/api/schemas/profile'
import { requireActor } from '@/lib/auth/actor'

export const metadata: Metadata = { title: 'Waiting for me' }

export default async function Page() {
  const { teamId } = await requireActor('profile.read')
  const recent = await listProfiles(database().read, teamId, ProfileQuery.parse({ limit: 200 }))
  return (
    <Fallback of={{ [keys.profiles({ limit: 200 })]: recent }}>
      <Waiting />
    </Fallback>
  )
}
