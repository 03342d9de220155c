import type { Metadata } from 'next'
import { NewProfile } from '@/components/jobs/NewProfile'
import { requireActor } from '@/lib/auth/actor'

export const metadata: Metadata = { title: 'New profile' }

export default async function NewProfilePage({ searchParams }: PageProps<'/profiles/new'>) {
  await requireActor('profile.edit')
  const { job } = await searchParams
  return <NewProfile jobId={typeof job === 'string' ? job : undefined} />
}
