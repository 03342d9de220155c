import type { Metadata } from 'next'
import { Fallback } from '@/components/lists/Fallback'
import { JobUploadPage } from '@/components/upload/JobUploadPage'
import { database } from '@/db/instance'
import { getJob } from '@/db/jobs'
import { listMaterials } from '@/db/materials'
import { keys } from '@/lib/api/keys'
import { requireActor } from '@/lib/auth/actor'
import { orNotFound } from '../../../orNotFound'

export const metadata: Metadata = { title: 'New profiles from drawings' }

export default async function Page({ params }: PageProps<'/jobs/[id]/upload'>) {
  const { teamId } = await requireActor('revision.add')
  const { read } = database()
  const job = await orNotFound(getJob(read, teamId, (await params).id))
  const fallback = { [keys.materials]: await listMaterials(read, teamId) }
  return (
    <Fallback of={fallback}>
      <JobUploadPage job={job} />
    </Fallback>
  )
}
