'use client'
import { useMay, useMe } from '@/components/shell/Me'
import { PageHead } from '@/components/shell/PageHead'
import { LinkButton } from '@/components/ui/Button'
import { Empty } from '@/components/ui/Empty'
import { Menu } from '@/components/ui/Menu'
import { Notice } from '@/components/ui/Notice'
import { StateBadge } from '@/components/ui/StateBadge'
import Link from 'next/link'
import { useState } from 'react'
import { useProfile, useRegion, useRevision, useRevisions } from './data'
import { exportsOf } from './exports'
import { RevisionView } from './RevisionView'

interface Props {
  profileId: string
  /** the revision the address names, or the newest; null before there is one */
  revisionId: string | null
  /** its metal in base64, where it is small enough to come with the page */
  packed: string | null
}

/** The page of a profile: its head, and the revision that is looked at. */
export function ProfileView({ profileId, revisionId, packed }: Props) {
  const { settings } = useMe().team
  const [display, setDisplay] = useState(settings)
  const mayAdd = useMay('revision.add')
  const { data: profile } = useProfile(profileId)
  const { data: revision } = useRevision(revisionId)
  const { data: revisions } = useRevisions(profileId)
  const { data: region, error: regionFault } = useRegion(revisionId, packed)
  if (!profile) return null
  const stem = `${profile.number}-${revision?.letter ?? ''}`
  const newest = revisions?.items[0]
  return (
    <>
      <PageHead
        number={profile.number}
        title={profile.title}
        beside={
          <>
            {revision && <StateBadge state={revision.state} letter={revision.letter} />}
            <Link href={`/jobs/${profile.job.id}`} className="text-soft hover:underline">
              {profile.job.number} {profile.job.title}
            </Link>
            {profile.drawingNumber && <span className="text-soft">Drawing {profile.drawingNumber}</span>}
          </>
        }
        actions={
          <>
            {revision && (
              <Menu label="Export ▾" name="Export this revision" items={exportsOf(revision.id, stem, revision.file.name)} />
            )}
            {mayAdd && (
              <LinkButton look={revision ? 'plain' : 'main'} href={`/profiles/${profileId}/upload`}>
                {revision ? 'New revision' : 'Drop a drawing'}
              </LinkButton>
            )}
          </>
        }
      />
      {profile.binnedAt && (
        <Notice tone="warning">
          <b>This profile is in the bin.</b> It can be restored from the list of profiles.
        </Notice>
      )}
      {revision && newest && newest.id !== revision.id && (
        <Notice tone="warning">
          <b>This is not the newest revision.</b>{' '}
          <Link href={`/profiles/${profileId}`} className="text-accent underline underline-offset-2">
            Revision {newest.letter} is.
          </Link>
        </Notice>
      )}
      {revision ? (
        <RevisionView
          key={revision.id}
          {...{ profile, revision, display, region }}
          revisions={revisions?.items ?? []}
          regionFault={regionFault}
          onDisplay={setDisplay}
        />
      ) : (
        <Empty
          title="No drawing yet"
          action={
            mayAdd && (
              <LinkButton look="main" href={`/profiles/${profileId}/upload`}>
                Drop a drawing
              </LinkButton>
            )
          }
        >
          The section sheet starts with a DXF of the profile. What was read is shown before anything is saved.
        </Empty>
      )}
    </>
  )
}
