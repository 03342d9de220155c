'use client'
import { useRouter } from 'next/navigation'
import { PageHead } from '@/components/shell/PageHead'
import { ProfileForm } from './ProfileForm'

/** A new profile goes straight on to its drawing. */
export function NewProfile({ jobId }: { jobId?: string }) {
  const router = useRouter()
  return (
    <div className="max-w-xl">
      <PageHead title="New profile" />
      <ProfileForm jobId={jobId} onDone={(profile) => router.push(`/profiles/${profile.id}/upload`)} />
    </div>
  )
}
