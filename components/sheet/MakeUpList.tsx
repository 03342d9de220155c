'use client'
import { useEffect, useRef } from 'react'
import type { HoverStore } from '@/components/board/hover'
import { useHover } from '@/components/board/useHover'
import { classes } from '@/components/ui/classes'
import { UnitText } from '@/components/ui/UnitText'
import type { TeamSettings } from '@/lib/api/schemas/people'
import type { Does } from '@/lib/geometry/recipe'
import type { OutlineView, SectionAnswer } from '@/lib/section/types'
import { format } from '@/lib/units/format'
import { roleOf } from './makeUp'

const ROLES: Record<Does, string> = { add: 'adds metal', cut: 'cuts', common: 'kept in common', out: 'left out' }

interface Props {
  answer: SectionAnswer
  display: TeamSettings
  hover: HoverStore
  picked: string | null
}

function Row({ outline, answer, display, hover, picked }: Omit<Props, 'picked'> & { outline: OutlineView; picked: boolean }) {
  const row = useRef<HTMLTableRowElement>(null)
  const { id } = outline
  const hot = useHover(hover, (hovered) => hovered?.kind === 'outline' && hovered.id === id)
  const { text, unit } = format(outline.area * answer.unit.mmPerUnit ** 2, 'area', display)
  const role = roleOf(answer, id)
  const show = () => hover.set({ kind: 'outline', id })
  useEffect(() => {
    if (picked) row.current?.scrollIntoView({ block: 'nearest' })
  }, [picked])
  return (
    <tr
      ref={row}
      onMouseEnter={show}
      onMouseLeave={() => hover.set(null)}
      className={classes('relative border-line border-b', (hot || picked) && 'bg-wash')}
    >
      <th scope="row" className="py-1.5 pr-2 text-left font-normal max-md:py-2.5">
        <button
          type="button"
          aria-pressed={picked}
          onFocus={show}
          onBlur={() => hover.set(null)}
          className="min-h-7 font-mono after:absolute after:inset-0"
        >
          {id}
        </button>
      </th>
      <td className={role === 'out' ? 'text-soft' : ''}>{role ? ROLES[role] : 'not said'}</td>
      <td className="max-w-32 truncate text-soft" title={outline.layer}>
        {outline.layer}
      </td>
      <td className="whitespace-nowrap text-right font-mono">{text}</td>
      <td className="w-12 whitespace-nowrap pl-1.5 text-soft">
        <UnitText unit={unit} />
      </td>
    </tr>
  )
}

/** The outlines of the drawing and what each does; pointing at one lights it on the board, and the other way round. */
export function MakeUpList({ answer, display, hover, picked }: Props) {
  const by =
    answer.recipe.makeUp === null ? 'By nesting: what lies outside adds, what lies inside cuts.' : 'As a person stated it.'
  const more = answer.outlinesTotal - answer.outlines.length
  return (
    <>
      <p className="text-small text-soft">{by}</p>
      <table className="w-full border-collapse text-small">
        <thead>
          <tr className="border-hair border-b text-left text-soft">
            <th scope="col" className="font-normal">
              Outline
            </th>
            <th scope="col" className="font-normal">
              does
            </th>
            <th scope="col" className="font-normal">
              layer
            </th>
            <th scope="col" className="text-right font-normal" colSpan={2}>
              encloses
            </th>
          </tr>
        </thead>
        <tbody>
          {answer.outlines.map((outline) => (
            <Row key={outline.id} {...{ outline, answer, display, hover }} picked={picked === outline.id} />
          ))}
        </tbody>
      </table>
      {more > 0 && <p className="text-small text-soft">{more} more outlines are counted, not listed.</p>}
    </>
  )
}
