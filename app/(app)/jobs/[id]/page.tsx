import type { Metadata } from 'next'
import { JobPage } from '@/components/jobs/JobPage'
import { jobProfiles } from '@/components/jobs/lists'
import { Fallback } from '@/components/lists/Fallback'
import { listPath, listQuery, pageQuery } from '@/components/lists/listPath'
import { database } from '@/db/instance'
import { getJob } from '@/db/jobs'
import { listProfiles } from '@/db/profiles'
import { keys } from '@/lib/api/keys'
import { ProfileQuery } from '@/lib/api/schemas/profile'
import { requireActor } from '@/lib/auth/actor'
import { orNotFound } from '../../orNotFound'

export const metadata: Metadata = { title: 'Job' }

export default async function Page({ params, searchParams }: PageProps<'/jobs/[id]'>) {
  const { teamId } = await requireActor('job.read')
  const { id } = await params
  const job = await orNotFound(getJob(database().read, teamId, id))
  const query = pageQuery(await searchParams)
  const asked = ProfileQuery.safeParse(Object.fromEntries(listQuery(query, jobProfiles(id))))
  const profiles = asked.success
    ? { [listPath(keys.profiles(), query, jobProfiles(id))]: await listProfiles(database().read, teamId, asked.data) }
    : {}
  return (
    <Fallback of={{ ...profiles, [keys.job(id)]: job }}>
      <JobPage id={id} />
    </Fallback>
  )
}
