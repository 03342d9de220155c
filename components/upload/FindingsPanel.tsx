'use client'
import type { HoverStore } from '@/components/board/hover'
import { Button } from '@/components/ui/Button'
import { classes } from '@/components/ui/classes'
import type { Finding } from '@/lib/geometry/finding'
import type { PreviewResult } from '@/lib/jobs/browser-pool'
import type { FlowAction } from './flow/flow'
import { remediesOf } from './flow/remedies'
import { Panel } from './Panel'

const WORDS = { error: 'Stops', warning: 'Look', note: 'Note' }
const TONES = { error: 'text-brick', warning: 'text-ochre', note: 'text-soft' }
const ORDER = { error: 0, warning: 1, note: 2 }
const LISTED = 50

/** What the reader wants a person to know: worst first, each with its place and what can be done. */
export function FindingsPanel({
  result,
  hover,
  zoneOf,
  dispatch,
  onShow,
}: {
  result: PreviewResult
  hover: HoverStore
  /** the zone of the sheet where a finding lies: B2 */
  zoneOf: (at: [number, number]) => string
  dispatch: (action: FlowAction) => void
  onShow: (at: [number, number], size: number) => void
}) {
  const { findings, findingsTotal } = result.answer
  const sorted = findings
    .map((finding, index) => ({ finding, index }))
    .sort((a, b) => ORDER[a.finding.severity] - ORDER[b.finding.severity])
  const count = (severity: Finding['severity']) => findings.filter((finding) => finding.severity === severity).length
  const [errors, warnings] = [count('error'), count('warning')]
  const state =
    errors > 0 ? (
      <b className="text-brick">{errors} to be solved</b>
    ) : warnings > 0 ? (
      <b className="text-ochre">{warnings} to look at</b>
    ) : (
      'nothing to look at'
    )
  return (
    <Panel title="Findings" open={errors + warnings > 0} state={state}>
      <ul>
        {sorted.slice(0, LISTED).map(({ finding, index }) => (
          <li
            key={`${finding.code} ${index}`}
            onMouseEnter={() => hover.set({ kind: 'finding', index })}
            onMouseLeave={() => hover.set(null)}
            className="border-b border-line py-1.5"
          >
            <p>
              <b className={classes('mr-2 text-small', TONES[finding.severity])}>
                {WORDS[finding.severity]}
                {finding.at && ` ${zoneOf(finding.at)}`}
              </b>
              {finding.message}
            </p>
            <div className="flex flex-wrap gap-1">
              {finding.at && <Show at={finding.at} size={finding.size ?? 0} onShow={onShow} />}
              {remediesOf(finding, result).map(({ word, action }) => (
                <Button key={word} look="link" onClick={() => dispatch(action)}>
                  {word}
                </Button>
              ))}
            </div>
          </li>
        ))}
      </ul>
      {findingsTotal > LISTED && (
        <p className="text-small text-soft">{findingsTotal - Math.min(LISTED, findings.length)} more.</p>
      )}
    </Panel>
  )
}

function Show({
  at,
  size,
  onShow,
}: {
  at: [number, number]
  size: number
  onShow: (at: [number, number], size: number) => void
}) {
  return (
    <Button look="link" onClick={() => onShow(at, size)}>
      Show
    </Button>
  )
}
