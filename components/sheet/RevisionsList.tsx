'use client'
import Link from 'next/link'
import { useMe } from '@/components/shell/Me'
import { classes } from '@/components/ui/classes'
import { formatMoment } from '@/components/ui/dates'
import { StateBadge } from '@/components/ui/StateBadge'
import type { RevisionSummary } from '@/lib/api/schemas/revision'

/** Every revision of the profile, newest first, each with its own page. */
export function RevisionsList({
  profileId,
  revisions,
  shown,
}: {
  profileId: string
  revisions: RevisionSummary[]
  shown: string
}) {
  const { zone } = useMe()
  return (
    <ol>
      {revisions.map(({ id, letter, state, createdAt, createdBy, drawingRevision, note, file }) => (
        <li
          key={id}
          className={classes('flex flex-wrap items-baseline gap-x-3 border-line border-b py-2', id === shown && 'bg-wash')}
        >
          <Link
            href={`/profiles/${profileId}?revision=${letter}`}
            aria-current={id === shown ? 'page' : undefined}
            className="target inline-flex items-center underline underline-offset-2"
          >
            Revision {letter}
          </Link>
          <StateBadge state={state} />
          <span className="text-small text-soft">
            {createdBy.name}, {formatMoment(createdAt, zone)}
          </span>
          {drawingRevision && <span className="text-small text-soft">drawing revision {drawingRevision}</span>}
          <span className="w-full truncate text-small text-soft">{file.name}</span>
          {note && <p className="w-full text-small">{note}</p>}
        </li>
      ))}
    </ol>
  )
}
