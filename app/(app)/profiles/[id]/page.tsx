import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { Fallback } from '@/components/lists/Fallback'
import { ProfileView } from '@/components/sheet/ProfileView'
import { readBlob } from '@/db/blobs'
import type { Db } from '@/db/client'
import { listEvents } from '@/db/events'
import type { TeamId } from '@/db/id'
import { database } from '@/db/instance'
import { getProfile } from '@/db/profiles'
import { getRevision, getStored, listRevisions } from '@/db/revisions'
import { keys } from '@/lib/api/keys'
import { EventQuery } from '@/lib/api/schemas/event'
import { requireActor } from '@/lib/auth/actor'
import { orNotFound } from '../../orNotFound'

/** A region up to this size comes with the page, so that the drawing is there at once; a larger one is fetched. */
const WITH_PAGE = 48 * 1024

async function smallRegion(db: Db, teamId: TeamId, revisionId: string): Promise<string | null> {
  const { regionBlobId } = await getStored(db, teamId, revisionId)
  const chunks: Uint8Array[] = []
  let bytes = 0
  for await (const chunk of readBlob(db, regionBlobId)) {
    bytes += chunk.length
    if (bytes > WITH_PAGE) return null
    chunks.push(chunk)
  }
  return Buffer.concat(chunks).toString('base64')
}

export async function generateMetadata({ params }: PageProps<'/profiles/[id]'>): Promise<Metadata> {
  const { teamId } = await requireActor('profile.read')
  const { number, title } = await orNotFound(getProfile(database().read, teamId, (await params).id))
  return { title: `${number} ${title}` }
}

export default async function Page({ params, searchParams }: PageProps<'/profiles/[id]'>) {
  const { teamId } = await requireActor('profile.read')
  const { id } = await params
  const db = database().read
  const profile = await orNotFound(getProfile(db, teamId, id))
  const revisions = await listRevisions(db, teamId, id)
  const asked = (await searchParams).revision
  const chosen = asked === undefined ? revisions[0] : revisions.find(({ letter }) => letter === asked)
  if (asked !== undefined && !chosen) notFound()
  const events = EventQuery.parse({ subjectId: id })
  const fallback: Record<string, unknown> = {
    [keys.profile(id)]: profile,
    [keys.revisions(id)]: { items: revisions },
    [keys.events({ subjectId: id, limit: events.limit })]: await listEvents(db, teamId, events),
  }
  if (chosen) fallback[keys.revision(chosen.id)] = await getRevision(db, teamId, chosen.id)
  return (
    <Fallback of={fallback}>
      <ProfileView
        profileId={id}
        revisionId={chosen?.id ?? null}
        packed={chosen ? await smallRegion(db, teamId, chosen.id) : null}
      />
    </Fallback>
  )
}
