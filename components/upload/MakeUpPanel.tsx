'use client'
import { useEffect, useRef } from 'react'
import type { HoverStore } from '@/components/board/hover'
import { useHover } from '@/components/board/useHover'
import { Button } from '@/components/ui/Button'
import { classes } from '@/components/ui/classes'
import { Notice } from '@/components/ui/Notice'
import type { Does, MakeUpStep } from '@/lib/geometry/recipe'
import { mmPerUnit } from '@/lib/geometry/recipe'
import type { PreviewResult } from '@/lib/jobs/browser-pool'
import type { OutlineView } from '@/lib/section/types'
import { FigureText } from '../lists/FigureText'
import type { FlowAction } from './flow/flow'
import { outlineOf, stepsOf } from './flow/makeUp'
import { Panel } from './Panel'

const ROLES: { does: Does; word: string }[] = [
  { does: 'add', word: 'adds' },
  { does: 'cut', word: 'cuts' },
  { does: 'common', word: 'common' },
  { does: 'out', word: 'left out' },
]
/** More rows than this are not a make-up but a sheet: what is left out is only counted. */
const LISTED = 40

/** What each outline does, in order. Pick an outline on the board and its row lights up. */
export function MakeUpPanel({
  result,
  hover,
  picked,
  dispatch,
}: {
  result: PreviewResult
  hover: HoverStore
  picked: string | null
  dispatch: (action: FlowAction) => void
}) {
  const { answer, roles } = result
  const { outlines, recipe } = answer
  const unsaid = roles.filter((role) => role === null).length
  const roleOf = (outline: OutlineView | undefined) => (outline ? roles[Number(outline.id.slice(1)) - 1] : 'out')
  // what belongs to another detail of the sheet is no question here
  const part = recipe.part && new Set(recipe.part.map((at) => at.join(' ')))
  const all = stepsOf(recipe.makeUp, outlines)
    .map((step) => ({ step, outline: outlineOf(step, outlines) }))
    .filter(({ outline }) => !part || (outline !== undefined && part.has(outline.at.join(' '))))
  const counted = all.filter(({ outline }) => roleOf(outline) !== 'out' || outline?.id === picked)
  const listed = counted.filter(({ outline }, i) => i < LISTED || outline?.id === picked)
  const shown = all.length > LISTED ? listed : all
  const silent = recipe.part ? 0 : outlines.filter((outline) => outline.depth === null && roleOf(outline) === 'out').length
  const adds = roles.filter((role) => role === 'add').length
  const cuts = roles.filter((role) => role === 'cut').length
  return (
    <Panel
      title="What each outline does"
      state={
        unsaid > 0 ? (
          <b className="text-brick">{unsaid} to be said</b>
        ) : (
          `${adds} add, ${cuts} cut${recipe.makeUp ? '' : ', by nesting'}`
        )
      }
    >
      {unsaid > 0 && (
        <Notice tone="warning">
          <b>{unsaid === 1 ? 'An outline crosses' : `${unsaid} outlines cross`} another one,</b> so nesting cannot tell metal from
          void. Say what each does; the order counts, from top to bottom.
        </Notice>
      )}
      {silent > 0 && (
        <Notice tone="warning">
          <b>{silent === 1 ? 'An outline that crosses' : `${silent} outlines that cross`} another one</b>{' '}
          {silent === 1 ? 'is' : 'are'} left out. Say so on purpose, or give {silent === 1 ? 'it' : 'them'} a part.
        </Notice>
      )}
      <ol>
        {shown.map(({ step, outline }, i) => (
          <Row
            key={step.at.join(' ')}
            {...{ step, outline, hover, dispatch, outlines, picked }}
            role={roleOf(outline) ?? null}
            areaFactor={mmPerUnit(recipe) ** 2}
            first={i === 0}
            last={i === shown.length - 1}
          />
        ))}
      </ol>
      {shown.length < all.length && (
        <p className="text-small text-soft">
          {counted.length > shown.length && `${counted.length - shown.length} further outlines count. `}
          {all.length > counted.length && `${all.length - counted.length} outlines are left out. `}
          Pick one on the board to see its row.
        </p>
      )}
      {recipe.makeUp && (
        <Button look="quiet" onClick={() => dispatch({ type: 'nesting' })}>
          Back to nesting
        </Button>
      )}
    </Panel>
  )
}

function Row({
  step,
  outline,
  outlines,
  role,
  hover,
  picked,
  areaFactor,
  first,
  last,
  dispatch,
}: {
  step: MakeUpStep
  outline: OutlineView | undefined
  outlines: readonly OutlineView[]
  role: Does | null
  hover: HoverStore
  picked: string | null
  areaFactor: number
  first: boolean
  last: boolean
  dispatch: (action: FlowAction) => void
}) {
  const id = outline?.id ?? ''
  const hot = useHover(hover, (hovered) => hovered?.kind === 'outline' && hovered.id === id)
  const select = useRef<HTMLSelectElement>(null)
  useEffect(() => {
    if (picked !== id || !id) return
    select.current?.scrollIntoView({ block: 'nearest' })
    select.current?.focus({ preventScroll: true })
  }, [picked, id])
  const light = () => outline && hover.set({ kind: 'outline', id })
  const dark = () => hover.set(null)
  const name = `outline ${id.slice(1)}`
  return (
    <li
      onMouseEnter={light}
      onMouseLeave={dark}
      onFocus={light}
      onBlur={dark}
      className={classes('flex items-center gap-x-1 border-b border-line py-0.5', hot && 'bg-wash')}
    >
      <span className={classes('w-6 shrink-0 font-mono text-small', hot ? 'text-accent' : 'text-soft')}>{id.slice(1)}</span>
      <span className="min-w-8 flex-1 truncate text-small" title={outline?.layer}>
        {outline?.layer}
      </span>
      <span className="whitespace-nowrap font-mono text-small">
        <FigureText value={outline ? outline.area * areaFactor : null} quantity="area" />
      </span>
      <span className="flex shrink-0 items-center">
        <select
          ref={select}
          aria-label={`What ${name} does`}
          value={role ?? ''}
          onChange={(event) => {
            const chosen = ROLES.find(({ does }) => does === event.target.value)
            if (chosen) dispatch({ type: 'does', at: step.at, does: chosen.does, outlines })
          }}
          className={classes('target w-24 rounded border bg-field px-1', role === null ? 'border-brick' : 'border-edge')}
        >
          {role === null && <option value="">say it</option>}
          {ROLES.map(({ does, word }) => (
            <option key={does} value={does}>
              {word}
            </option>
          ))}
        </select>
        <Button
          look="quiet"
          className="min-w-8 px-1"
          disabled={first}
          aria-label={`Move ${name} up`}
          onClick={() => dispatch({ type: 'move', at: step.at, by: -1, outlines })}
        >
          ↑
        </Button>
        <Button
          look="quiet"
          className="min-w-8 px-1"
          disabled={last}
          aria-label={`Move ${name} down`}
          onClick={() => dispatch({ type: 'move', at: step.at, by: 1, outlines })}
        >
          ↓
        </Button>
      </span>
    </li>
  )
}
