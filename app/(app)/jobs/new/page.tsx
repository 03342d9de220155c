import type { Metadata } from 'next'
import { NewJob } from '@/components/jobs/NewJob'
import { requireActor } from '@/lib/auth/actor'

export const metadata: Metadata = { title: 'New job' }

export default async function NewJobPage() {
  await requireActor('job.edit')
  return <NewJob />
}
