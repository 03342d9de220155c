import type { Event } from '@/lib/api/schemas/event'

/** What a person calls the fields that an event names. */
const FIELDS: Record<string, string> = {
  title: 'title',
  drawingNumber: 'drawing number',
  jobId: 'job',
  materialId: 'material',
  ownerId: 'owner',
  state: 'state',
}

/** A value as a person reads it; ids say nothing to people. */
const shown = (value: unknown): string | null =>
  typeof value === 'string' && value !== '' && !/^[a-z2-7]{26}$/.test(value) ? `“${value}”` : null

/** What changed: "title from “A” to “B”". */
function changes({ before, after }: Event): string {
  if (!before || !after) return ''
  const parts = Object.keys(after).flatMap((key) => {
    const name = FIELDS[key]
    if (!name) return []
    const from = shown(before[key])
    const to = shown(after[key])
    return [from && to ? `${name} from ${from} to ${to}` : to ? `${name} to ${to}` : name]
  })
  return parts.length === 0 ? '' : `: ${parts.join(', ')}`
}

/** An event as one sentence. `letterOf` names the revision that an event is about. */
export function eventSentence(event: Event, letterOf: (revisionId: string) => string | null): string {
  const who = event.actor?.name ?? 'The server'
  const letter = event.subjectType === 'revision' ? letterOf(event.subjectId) : null
  const said = letter ? event.sentence.replace(/\ba revision\b/, `revision ${letter}`) : event.sentence
  return `${who} ${said}${changes(event)}.`
}
