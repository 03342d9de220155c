import type { Metadata } from 'next'
import { Fallback } from '@/components/lists/Fallback'
import { UploadPage } from '@/components/upload/UploadPage'
import { database } from '@/db/instance'
import { listMaterials } from '@/db/materials'
import { getProfile } from '@/db/profiles'
import { keys } from '@/lib/api/keys'
import { requireActor } from '@/lib/auth/actor'
import { orNotFound } from '../../../orNotFound'

export const metadata: Metadata = { title: 'Upload a drawing' }

export default async function Page({ params }: PageProps<'/profiles/[id]/upload'>) {
  const { teamId } = await requireActor('revision.add')
  const { read } = database()
  const profile = await orNotFound(getProfile(read, teamId, (await params).id))
  const fallback = { [keys.materials]: await listMaterials(read, teamId) }
  return (
    <Fallback of={fallback}>
      <UploadPage profile={profile} />
    </Fallback>
  )
}
