import type { Metadata } from 'next'
import { PROFILE_LIST } from '@/components/jobs/lists'
import { ProfilesPage } from '@/components/jobs/ProfilesPage'
import { Fallback } from '@/components/lists/Fallback'
import { listPath, listQuery, pageQuery } from '@/components/lists/listPath'
import { database } from '@/db/instance'
import { listProfiles } from '@/db/profiles'
import { keys } from '@/lib/api/keys'
import { ProfileQuery } from '@/lib/api/schemas/profile'
import { requireActor } from '@/lib/auth/actor'

export const metadata: Metadata = { title: 'Profiles' }

export default async function Page({ searchParams }: PageProps<'/profiles'>) {
  const { teamId } = await requireActor('profile.read')
  const query = pageQuery(await searchParams)
  const asked = ProfileQuery.safeParse(Object.fromEntries(listQuery(query, PROFILE_LIST)))
  const fallback = asked.success
    ? { [listPath(keys.profiles(), query, PROFILE_LIST)]: await listProfiles(database().read, teamId, asked.data) }
    : {}
  return (
    <Fallback of={fallback}>
      <ProfilesPage />
    </Fallback>
  )
}
