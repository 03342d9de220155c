import type { Metadata } from 'next'
import { JobsList } from '@/components/jobs/JobsList'
import { JOB_LIST } from '@/components/jobs/lists'
import { Fallback } from '@/components/lists/Fallback'
import { listPath, listQuery, pageQuery } from '@/components/lists/listPath'
import { database } from '@/db/instance'
import { listJobs } from '@/db/jobs'
import { keys } from '@/lib/api/keys'
import { JobQuery } from '@/lib/api/schemas/job'
import { requireActor } from '@/lib/auth/actor'

export const metadata: Metadata = { title: 'Jobs' }

export default async function JobsPage({ searchParams }: PageProps<'/jobs'>) {
  const { teamId } = await requireActor('job.read')
  const query = pageQuery(await searchParams)
  const asked = JobQuery.safeParse(Object.fromEntries(listQuery(query, JOB_LIST)))
  const fallback = asked.success
    ? { [listPath(keys.jobs(), query, JOB_LIST)]: await listJobs(database().read, teamId, asked.data) }
    : {}
  return (
    <Fallback of={fallback}>
      <JobsList />
    </Fallback>
  )
}
