'use client'
import { type Dispatch, useMemo } from 'react'
import type { AxisId } from '@/components/board/axesOf'
import type { BoardAction, BoardState } from '@/components/board/boardState'
import { Button } from '@/components/ui/Button'
import type { TeamSettings } from '@/lib/api/schemas/people'
import type { Bundles } from '@/lib/section/bundles'
import { axisNames } from '@/lib/section/naming'
import type { Section } from '@/lib/section/types'
import { shareSummary } from './shareWords'
import { writingOf } from './writing'

interface Props {
  bundles: Bundles
  section: Section
  display: TeamSettings
  state: BoardState
  dispatch: Dispatch<BoardAction>
}

const percent = (part: number) => `${Math.round(100 * part)}\u2009%`

/** Which metal makes the second moment: bars on the board, and the same in words. */
export function SharePanel({ bundles, section, display, state, dispatch }: Props) {
  const names = axisNames(display.axes)
  const { share } = state
  const ids: AxisId[] = section.theta === null ? ['x', 'y'] : ['x', 'y', 'axis1', 'axis2']
  const summary = useMemo(() => share && shareSummary(bundles, section.theta, share), [bundles, section.theta, share])
  return (
    <section className="mt-3 border-hair border-t py-2" aria-labelledby="share-heading">
      <h3 id="share-heading" className="font-semibold text-small text-soft">
        Which metal makes it
      </h3>
      <div className="flex flex-wrap gap-1 text-small">
        {ids.map((id) => (
          <Button
            key={id}
            look="quiet"
            aria-pressed={share === id}
            title={`Bars on the board: which metal makes the second moment about ${names[id]}`}
            onClick={() => dispatch({ do: 'share', axis: id })}
          >
            <span>
              I<sub>{names[id]}</sub>
            </span>
          </Button>
        ))}
      </div>
      <p className="min-h-10 text-small text-soft" aria-live="polite">
        {summary && share ? (
          <>
            Half of I<sub>{names[share]}</sub> comes from <b className="text-ink">{percent(summary.half.metal)} of the metal</b>,
            beyond {writingOf(display).length(summary.half.distance)} from the axis. The half of the metal nearest to the axis
            gives <b className="text-ink">{percent(summary.nearHalf)}</b>.
          </>
        ) : (
          'Choose a second moment: bars beside the metal show how much each band of it gives.'
        )}
      </p>
    </section>
  )
}
