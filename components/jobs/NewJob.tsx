'use client'
import { useRouter } from 'next/navigation'
import { PageHead } from '@/components/shell/PageHead'
import { JobForm } from './JobForm'

export function NewJob() {
  const router = useRouter()
  return (
    <div className="max-w-xl">
      <PageHead title="New job" />
      <JobForm onDone={(job) => router.push(`/jobs/${job.id}`)} />
    </div>
  )
}
