import type { Metadata } from 'next'
import { ALL_JOBS } from '@/components/jobs/lists'
import { NewProfile } from '@/components/jobs/NewProfile'
import { Fallback } from '@/components/lists/Fallback'
import { database } from '@/db/instance'
import { listJobs } from '@/db/jobs'
import { listMaterials } from '@/db/materials'
import { listPeople } from '@/db/people'
import { keys } from '@/lib/api/keys'
import { JobQuery } from '@/lib/api/schemas/job'
import { requireActor } from '@/lib/auth/actor'

export const metadata: Metadata = { title: 'New profile' }

export default async function NewProfilePage({ searchParams }: PageProps<'/profiles/new'>) {
  const { teamId } = await requireActor('profile.edit')
  const { job } = await searchParams
  const { read } = database()
  const fallback = {
    [keys.jobs(ALL_JOBS)]: await listJobs(read, teamId, JobQuery.parse(ALL_JOBS)),
    [keys.materials]: await listMaterials(read, teamId),
    [keys.people]: await listPeople(read, teamId),
  }
  return (
    <Fallback of={fallback}>
      <NewProfile jobId={typeof job === 'string' ? job : undefined} />
    </Fallback>
  )
}
