'use client'
import { Button } from '@/components/ui/Button'
import { Notice } from '@/components/ui/Notice'
import type { XY } from '@/lib/geometry/recipe'
import type { PreviewResult } from '@/lib/jobs/browser-pool'
import { FigureText } from '../lists/FigureText'
import type { FlowAction } from './flow/flow'
import { type Detail, likelyFrame, partInWindow } from './flow/groups'
import { NumberChoice } from './NumberChoice'
import { Panel } from './Panel'

const LISTED = 60

/** Which detail of the sheet is the profile, and how it stands. */
export function PartPanel({
  result,
  details,
  window,
  saved,
  dispatch,
  onShow,
}: {
  result: PreviewResult
  details: Detail[]
  /** two corners measured on the board, drawing units */
  window: [XY, XY] | null
  /** what was saved from this sheet, by the detail's number */
  saved: ReadonlyMap<number, string>
  dispatch: (action: FlowAction) => void
  onShow: (at: XY, size: number) => void
}) {
  const { part, turn } = result.answer.recipe
  const inWindow = window ? partInWindow(result, window[0], window[1]) : []
  const take = (next: XY[] | null) => dispatch({ type: 'set', change: { part: next } })
  const turnBy = (degrees: number) => dispatch({ type: 'set', change: { turn: ((((turn + degrees) % 360) + 540) % 360) - 180 } })
  const frame = likelyFrame(result)
  const chosen = details.filter(({ taken }) => taken)
  const state =
    details.length < 2
      ? `turned ${turn}°`
      : part
        ? `${chosen.length} of ${details.length} details`
        : `all ${details.length} details`
  return (
    <Panel
      title={details.length > 1 ? 'Which detail of the sheet' : 'How it stands'}
      open={details.length > 1 || frame !== null}
      state={state}
    >
      {frame && (
        <Notice tone="asked">
          <b>One outline lies round all others,</b> and without it they fall apart into details. Is it the frame of the sheet?
          <div>
            <Button onClick={() => dispatch({ type: 'frame', ...frame })}>It is a frame: leave it out</Button>
          </div>
        </Notice>
      )}
      {details.length > 1 && (
        <>
          {chosen.length !== 1 && (
            <Notice tone="asked">
              <b>{details.length} details lie apart.</b> Click one on the board, choose it here, or keep all as one section of
              several pieces.
            </Notice>
          )}
          <ol className="max-h-72 overflow-y-auto">
            {details.slice(0, LISTED).map((detail, i) => (
              <li key={detail.number} className="flex items-center gap-2 border-b border-line">
                <Button
                  look="quiet"
                  className="px-2"
                  aria-label={`Show detail ${i + 1}`}
                  onClick={() => onShow(detail.at, detail.size)}
                >
                  {i + 1}
                </Button>
                <span className="flex-1 font-mono text-small">
                  <FigureText value={detail.width} quantity="length" /> × <FigureText value={detail.height} quantity="length" />
                </span>
                <span className="text-small text-soft">
                  {saved.get(detail.number) ?? `${detail.members.length} ${detail.members.length === 1 ? 'outline' : 'outlines'}`}
                </span>
                <Button
                  look="quiet"
                  aria-pressed={detail.taken && chosen.length < details.length}
                  aria-label={`Take detail ${i + 1}`}
                  onClick={() => take(detail.part)}
                >
                  {detail.taken && chosen.length < details.length ? 'Taken' : 'Take'}
                </Button>
              </li>
            ))}
          </ol>
          {details.length > LISTED && (
            <p className="text-small text-soft">{details.length - LISTED} smaller ones: click them on the board.</p>
          )}
          <div className="mt-2 flex flex-wrap items-center gap-2">
            {chosen.length > 0 && chosen.length < details.length && (
              <Button onClick={() => take(details.flatMap((detail) => detail.part))}>Take all</Button>
            )}
            <Button
              disabled={inWindow.length === 0}
              title="Measure on the board from corner to corner of a window first"
              onClick={() => take(inWindow)}
            >
              Take what lies in the measured window{inWindow.length > 0 && ` (${inWindow.length})`}
            </Button>
          </div>
        </>
      )}
      <div className="mt-2 flex flex-wrap items-end gap-2">
        <div className="w-28">
          <NumberChoice
            label="Turned by"
            unit="°"
            value={turn}
            allow={(degrees) => Math.abs(degrees) <= 360}
            onChoose={(degrees) => dispatch({ type: 'set', change: { turn: degrees } })}
          />
        </div>
        <Button onClick={() => turnBy(90)} title="A quarter to the left">
          ↶ 90°
        </Button>
        <Button onClick={() => turnBy(-90)} title="A quarter to the right">
          ↷ 90°
        </Button>
      </div>
    </Panel>
  )
}
