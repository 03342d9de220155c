'use client'
import type { HoverStore } from '@/components/board/hover'
import { useHover } from '@/components/board/useHover'
import { classes } from '@/components/ui/classes'
import type { Finding, Severity } from '@/lib/geometry/finding'

const TONES: Record<Severity, string> = { note: 'border-hair', warning: 'border-ochre', error: 'border-brick' }
const WORDS: Record<Severity, { word: string; className: string }> = {
  note: { word: 'Note', className: 'text-soft' },
  warning: { word: 'Look', className: 'text-ochre' },
  error: { word: 'Stop', className: 'text-brick' },
}
const WEIGHT: Record<Severity, number> = { error: 0, warning: 1, note: 2 }
/** More than this many of what must be seen are folded away. */
const SEEN = 6

interface Props {
  findings: Finding[]
  total: number
  /** the zone of the sheet where the finding lies, by its index; null where it has no place */
  zone: (index: number) => string | null
  show: (index: number) => void
  hover: HoverStore
}

function Row({ finding, index, zone, show, hover }: Omit<Props, 'findings' | 'total'> & { finding: Finding; index: number }) {
  const hot = useHover(hover, (hovered) => hovered?.kind === 'finding' && hovered.index === index)
  const place = zone(index)
  const point = () => hover.set({ kind: 'finding', index })
  const leave = () => hover.set(null)
  const { word, className } = WORDS[finding.severity]
  return (
    <li
      onMouseEnter={point}
      onMouseLeave={leave}
      className={classes('my-1 border-l-[3px] py-0.5 pl-3 text-small', TONES[finding.severity], hot && 'bg-wash')}
    >
      <b className={className}>
        {word}
        {place && ` at ${place}`}:
      </b>{' '}
      {finding.message}{' '}
      {place && (
        <button
          type="button"
          onClick={() => show(index)}
          onFocus={point}
          onBlur={leave}
          className="min-h-6 text-accent underline underline-offset-2"
        >
          Show it
        </button>
      )}
    </li>
  )
}

/** What the reader wants a person to know: what must be seen first, notes folded, each leading to its place. */
export function FindingsList({ findings, total, ...rest }: Props) {
  const sorted = findings
    .map((finding, index) => ({ finding, index }))
    .sort((a, b) => WEIGHT[a.finding.severity] - WEIGHT[b.finding.severity])
  const urgent = sorted.filter(({ finding }) => finding.severity !== 'note')
  const seen = urgent.slice(0, SEEN)
  const folded = sorted.filter((row) => !seen.includes(row))
  const row = ({ finding, index }: (typeof sorted)[number]) => <Row key={index} finding={finding} index={index} {...rest} />
  if (findings.length === 0) return null
  const more = total - findings.length
  const noun = folded.every(({ finding }) => finding.severity === 'note') ? 'note' : 'more finding'
  return (
    <div>
      <ul>{seen.map(row)}</ul>
      {folded.length > 0 && (
        <details>
          <summary className="min-h-7 text-small text-soft">{`${folded.length} ${noun}${folded.length === 1 ? '' : 's'}`}</summary>
          <ul>{folded.map(row)}</ul>
        </details>
      )}
      {more > 0 && <p className="text-small text-soft">{more} further findings of the same kinds are counted, not listed.</p>}
    </div>
  )
}
