'use client'
import { useMe } from '@/components/shell/Me'
import { formatMoment } from '@/components/ui/dates'
import type { Event } from '@/lib/api/schemas/event'

const FIELDS: Record<string, string> = {
  title: 'title',
  drawingNumber: 'drawing number',
  jobId: 'job',
  materialId: 'material',
  ownerId: 'owner',
  letter: 'revision',
  state: 'state',
}

const shown = (value: unknown): string | null =>
  typeof value === 'string' && !/^[a-z2-7]{26}$/.test(value) ? value : typeof value === 'number' ? String(value) : null

/** What changed, as far as a person can read it: "title from “A” to “B”". */
function changes({ before, after }: Event): string {
  if (!before || !after) return ''
  const parts = Object.keys(after).flatMap((key) => {
    const name = FIELDS[key]
    if (!name) return []
    const from = shown(before[key])
    const to = shown(after[key])
    return [from && to ? `${name} from “${from}” to “${to}”` : name]
  })
  return parts.length === 0 ? '' : `: ${parts.join(', ')}`
}

/** What happened to the profile, newest first, in sentences. */
export function History({ events, total }: { events: Event[]; total: number }) {
  const { zone } = useMe()
  return (
    <>
      <ol className="text-small">
        {events.map((event) => (
          <li key={event.id} className="border-line border-b py-1.5">
            <span>
              {event.actor?.name ?? 'The server'} {event.sentence}
              {changes(event)}.
            </span>{' '}
            <span className="whitespace-nowrap text-soft">{formatMoment(event.at, zone)}</span>
          </li>
        ))}
      </ol>
      {total > events.length && <p className="text-small text-soft">{total - events.length} older events are kept.</p>}
    </>
  )
}
