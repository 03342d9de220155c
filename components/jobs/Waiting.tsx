'use client'
import Link from 'next/link'
import { useMay, useMe } from '@/components/shell/Me'
import { PageHead } from '@/components/shell/PageHead'
import { LinkButton } from '@/components/ui/Button'
import { formatDate } from '@/components/ui/dates'
import { Empty } from '@/components/ui/Empty'
import { keys } from '@/lib/api/keys'
import type { OpenIntake } from '@/lib/api/schemas/revision'
import type { Profile } from '@/lib/api/schemas/profile'
import { useIntakes, useProfiles } from './data'
import { ProfilesTable, useProfileColumns } from './ProfilesTable'

/** The first page: what a person is expected to do next, then what changed last. */
export function Waiting() {
  const me = useMe()
  const mayUpload = useMay('revision.add')
  const columns = useProfileColumns()
  const profiles = useProfiles(keys.profiles({ limit: 200 })).data?.items ?? []
  const intakes = useIntakes(mayUpload)
  const isTakenIn = (id: string) => intakes.some(({ profileId }) => profileId === id)
  const undrawn = profiles.filter(({ id, latest, owner }) => latest === null && owner.id === me.id && !isTakenIn(id))
  const drawn = profiles.filter(({ latest }) => latest !== null).slice(0, 12)
  if (profiles.length === 0) return <Beginning />
  return (
    <>
      <PageHead title="Waiting for me" />
      {undrawn.length + intakes.length > 0 ? (
        <ul className="border-t border-hair">
          {intakes.map((intake) => (
            <TakenIn key={intake.id} intake={intake} />
          ))}
          {undrawn.map((profile) => (
            <Undrawn key={profile.id} profile={profile} zone={me.zone} may={mayUpload} />
          ))}
        </ul>
      ) : (
        <p className="border-t border-hair py-4 text-soft">Nothing waits for you.</p>
      )}
      {drawn.length > 0 && (
        <section aria-labelledby="recent" className="mt-6 border-t border-hair pt-3">
          <h2 id="recent" className="font-semibold text-lg">
            Changed last
          </h2>
          <ProfilesTable profiles={drawn} columns={columns} />
        </section>
      )}
    </>
  )
}

function TakenIn({ intake }: { intake: OpenIntake }) {
  const { profileId, number, title, fileName } = intake
  return (
    <li className="flex flex-wrap items-center gap-x-4 border-b border-line py-2">
      <Link href={`/profiles/${profileId}`} className="font-mono text-accent hover:underline">
        {number}
      </Link>
      <span>{title}</span>
      <span className="text-small text-soft" role="status">
        <span className="break-all font-mono">{fileName}</span> is on the server and being computed; its revision appears by
        itself.
      </span>
    </li>
  )
}

function Undrawn({ profile, zone, may }: { profile: Profile; zone: string; may: boolean }) {
  return (
    <li className="flex flex-wrap items-center gap-x-4 border-b border-line py-1">
      <Link
        href={may ? `/profiles/${profile.id}/upload` : `/profiles/${profile.id}`}
        className="font-mono text-accent hover:underline"
      >
        {profile.number}
      </Link>
      <span>{profile.title}</span>
      <span className="text-small text-soft">
        waits for its drawing since {formatDate(profile.createdAt, zone)} · {profile.job.number} {profile.job.title}
      </span>
      {may && (
        <LinkButton href={`/profiles/${profile.id}/upload`} className="ml-auto max-md:ml-0 max-md:w-full">
          Upload the drawing
        </LinkButton>
      )}
    </li>
  )
}

function Beginning() {
  const mayOpen = useMay('job.edit')
  return (
    <>
      <PageHead title="Waiting for me" />
      <Empty
        title="Nothing here yet"
        action={
          mayOpen && (
            <>
              <LinkButton href="/jobs/new" look="main">
                Open the first job
              </LinkButton>
              <LinkButton href="/team">Invite people</LinkButton>
            </>
          )
        }
      >
        A job holds profiles; a profile gets its figures from the DXF that you drop on it. Uploads to be confirmed will wait here.
      </Empty>
    </>
  )
}
