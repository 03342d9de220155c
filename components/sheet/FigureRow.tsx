'use client'
import { type KeyboardEvent, useId, useState } from 'react'
import type { HoverStore } from '@/components/board/hover'
import { useHover } from '@/components/board/useHover'
import { classes } from '@/components/ui/classes'
import { toast } from '@/components/ui/toastStore'
import { UnitText } from '@/components/ui/UnitText'
import type { TeamSettings } from '@/lib/api/schemas/people'
import type { Bounds, Figure } from '@/lib/section/figures/figure'
import { figureSymbol, figureWord } from '@/lib/section/naming'
import type { Origin } from '@/lib/section/types'
import { format, plain } from '@/lib/units/format'
import { copyText } from './copyText'
import { FigureDetail } from './FigureDetail'
import { OriginMark } from './OriginMark'
import { totalPlusMinus } from './plusMinus'
import { SymbolText } from './SymbolText'

interface Props {
  figure: Figure
  value: number
  /** between which it lies for certain */
  bounds?: Bounds
  origin: Origin | undefined
  display: TeamSettings
  hover: HoverStore
}

/** One figure: symbol, word, value, unit, origin. Pointing at it draws it on the board; pressing it shows its ± and all its digits. */
export function FigureRow({ figure, value, bounds, origin, display, hover }: Props) {
  const [open, setOpen] = useState(false)
  const id = useId()
  const { key } = figure
  const hot = useHover(hover, (hovered) => hovered?.kind === 'figure' && hovered.key === key)
  const { text, unit } = format(value, figure.dimension, display, totalPlusMinus(origin?.plusMinus))
  const kind = origin?.kind ?? figure.origin
  const show = () => hover.set({ kind: 'figure', key })
  const hide = () => hover.set(null)
  const copyByKey = async (event: KeyboardEvent) => {
    if (event.key.toLowerCase() !== 'c' || event.ctrlKey || event.metaKey) return
    const digits = plain(value, figure.dimension, display)
    if (await copyText(digits)) toast(`Copied ${digits}`)
  }
  return (
    <>
      <tr
        onMouseEnter={show}
        onMouseLeave={hide}
        className={classes('relative', hot && 'bg-wash shadow-[-0.5rem_0_0_var(--wash),0.5rem_0_0_var(--wash)]')}
      >
        <th scope="row" className="py-1 pr-2 text-left align-baseline font-normal text-soft max-md:py-2">
          <span className="grid grid-cols-[4.6rem_1fr] items-baseline max-md:grid-cols-[3.9rem_1fr]">
            <b className={classes('font-semibold', hot ? 'text-accent' : 'text-ink')}>
              <SymbolText symbol={figureSymbol(figure, display)} />
            </b>
            <span className="text-small leading-snug">{figureWord(figure, display)}</span>
          </span>
        </th>
        <td className="whitespace-nowrap text-right align-baseline font-medium font-mono">
          <button
            type="button"
            aria-expanded={open}
            aria-controls={open ? id : undefined}
            title="Its ± and all digits; C copies it"
            aria-keyshortcuts="C"
            onKeyDown={copyByKey}
            onClick={() => setOpen(!open)}
            onFocus={show}
            onBlur={hide}
            className="min-h-7 after:absolute after:inset-0 max-md:min-h-9"
          >
            {text}
          </button>
        </td>
        <td className="w-16 whitespace-nowrap pl-1.5 align-baseline text-small text-soft">
          <UnitText unit={unit} />
        </td>
        <td className="w-4 text-right align-baseline">
          <OriginMark kind={kind} estimate={origin?.estimate} />
        </td>
      </tr>
      {open && (
        <tr id={id}>
          <td colSpan={4} className="pb-2">
            <FigureDetail figure={figure} value={value} bounds={bounds} origin={origin} display={display} />
          </td>
        </tr>
      )}
    </>
  )
}
