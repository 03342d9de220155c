'use client'
import { Button } from '@/components/ui/Button'
import { Select } from '@/components/ui/Field'
import { Notice } from '@/components/ui/Notice'
import type { XY } from '@/lib/geometry/recipe'
import type { PreviewResult } from '@/lib/jobs/browser-pool'
import { FigureText } from '../lists/FigureText'
import type { FlowAction } from './flow/flow'
import { blocksOf, type Detail, likelyFrame, type PlacedBlock } from './flow/groups'
import { NumberChoice } from './NumberChoice'
import { Panel } from './Panel'

const LISTED = 60

/** Which detail of the sheet is the profile, and how it stands. */
export function PartPanel({
  result,
  details,
  frames,
  windowing,
  saved,
  dispatch,
  onShow,
  onWindow,
}: {
  result: PreviewResult
  details: Detail[]
  /** outlines that a person said are the sheet's frame */
  frames: readonly XY[]
  /** the window is being drawn on the board */
  windowing: boolean
  /** what was saved from this sheet, by the detail's number */
  saved: ReadonlyMap<number, string>
  dispatch: (action: FlowAction) => void
  onShow: (at: XY, size: number) => void
  onWindow: () => void
}) {
  const { part, turn } = result.answer.recipe
  const blocks = blocksOf(result, frames)
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
              <b>{details.length} details lie apart.</b> Click one on the board, draw a window round it, choose it here, or keep
              all as one section of several pieces.
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
          {blocks.length > 0 && <BlockChoice blocks={blocks} onTake={take} />}
          <div className="mt-2 flex flex-wrap items-center gap-2">
            {chosen.length > 0 && chosen.length < details.length && (
              <Button onClick={() => take(details.flatMap((detail) => detail.part))}>Take all</Button>
            )}
            <Button aria-pressed={windowing} title="Take what lies in a window drawn on the board" onClick={onWindow}>
              Draw a window
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

/** Takes a block as it is placed first: each placement has the same outlines. */
function BlockChoice({ blocks, onTake }: { blocks: readonly PlacedBlock[]; onTake: (part: XY[]) => void }) {
  return (
    <div className="mt-2">
      <Select
        label="Or take a block"
        value=""
        onChange={(event) => {
          const block = blocks.find(({ name }) => name === event.target.value)
          if (block) onTake(block.part)
        }}
      >
        <option value="">Choose a block</option>
        {blocks.slice(0, LISTED).map(({ name, times, part }) => (
          <option key={name} value={name}>
            {`${name}: ${part.length} ${part.length === 1 ? 'outline' : 'outlines'}, placed ${times === 1 ? 'once' : `${times} times`}`}
          </option>
        ))}
      </Select>
    </div>
  )
}
