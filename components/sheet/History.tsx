'use client'
import { useMe } from '@/components/shell/Me'
import { formatMoment } from '@/components/ui/dates'
import type { Event } from '@/lib/api/schemas/event'
import type { RevisionSummary } from '@/lib/api/schemas/revision'
import { eventSentence } from './eventSentence'

/** What happened to the profile and its revisions, newest first, in sentences. */
export function History({ events, total, revisions }: { events: Event[]; total: number; revisions: RevisionSummary[] }) {
  const { zone } = useMe()
  const letterOf = (id: string) => revisions.find((revision) => revision.id === id)?.letter ?? null
  return (
    <>
      <ol className="text-small">
        {events.map((event) => (
          <li key={event.id} className="border-line border-b py-1.5">
            {eventSentence(event, letterOf)} <span className="whitespace-nowrap text-soft">{formatMoment(event.at, zone)}</span>
          </li>
        ))}
      </ol>
      {total > events.length && <p className="text-small text-soft">{total - events.length} older events are kept.</p>}
    </>
  )
}
