'use client'
import { Button } from '@/components/ui/Button'
import type { Recipe, XY } from '@/lib/geometry/recipe'
import { mmPerUnit } from '@/lib/geometry/recipe'
import type { PreviewResult } from '@/lib/jobs/browser-pool'
import { FigureText } from '../lists/FigureText'
import type { FlowAction } from './flow/flow'
import { Panel } from './Panel'

const LISTED = 30

/** Runs of chords that were arcs once: each offered with the difference it makes, none taken in silence. */
export function ArcsPanel({
  result,
  recipe,
  declined,
  dispatch,
  onShow,
}: {
  result: PreviewResult
  recipe: Recipe
  declined: readonly XY[]
  dispatch: (action: FlowAction) => void
  onShow: (at: XY, size: number) => void
}) {
  const isDeclined = ([x, y]: XY) => declined.some((at) => at[0] === x && at[1] === y)
  const offers = result.outlines.arcOffers.filter(({ run }) => !isDeclined(run.from))
  if (offers.length === 0 && recipe.arcs.length === 0) return null
  const mm = mmPerUnit(recipe)
  return (
    <Panel title="Arcs drawn as chords" state={`${offers.length} offered, ${recipe.arcs.length} taken`}>
      {offers.length > 1 && (
        <Button onClick={() => dispatch({ type: 'arcs', runs: offers.map(({ run }) => run) })}>
          Take all {offers.length} as arcs
        </Button>
      )}
      <ul>
        {offers.slice(0, LISTED).map(({ run, radius, chords, dArea, dIx, dIy }) => (
          <li key={run.from.join(' ')} className="flex flex-wrap items-center gap-x-3 border-b border-line">
            <Button look="quiet" className="px-2" onClick={() => onShow(run.through, radius)}>
              R {Number((radius * mm).toPrecision(4))}
            </Button>
            <span className="flex-1 text-small text-soft">
              {chords} chords; as an arc ΔA <FigureText value={dArea * mm ** 2} quantity="area" />, ΔI<sub>x</sub>{' '}
              <FigureText value={dIx * mm ** 4} quantity="secondMoment" />, ΔI<sub>y</sub>{' '}
              <FigureText value={dIy * mm ** 4} quantity="secondMoment" />
            </span>
            <Button look="quiet" onClick={() => dispatch({ type: 'arc', run, accept: true })}>
              Take as arc
            </Button>
            <Button look="quiet" onClick={() => dispatch({ type: 'arc', run, accept: false })}>
              Keep chords
            </Button>
          </li>
        ))}
      </ul>
      {recipe.arcs.map((run) => (
        <div key={run.from.join(' ')} className="flex items-center gap-3 border-b border-line text-small">
          <span className="flex-1">An arc taken for chords</span>
          <Button look="quiet" onClick={() => onShow(run.through, 0)}>
            Show
          </Button>
          <Button look="quiet" onClick={() => dispatch({ type: 'arc', run, accept: false })}>
            Take back
          </Button>
        </div>
      ))}
    </Panel>
  )
}
