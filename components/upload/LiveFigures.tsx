'use client'
import type { HoverStore } from '@/components/board/hover'
import { totalPlusMinus } from '@/components/sheet/plusMinus'
import { SymbolText } from '@/components/sheet/SymbolText'
import { useMe } from '@/components/shell/Me'
import { UnitText } from '@/components/ui/UnitText'
import { FIGURES } from '@/lib/section/figures'
import { figureSymbol, figureWord } from '@/lib/section/naming'
import type { Section } from '@/lib/section/types'
import { format } from '@/lib/units/format'

const SHOWN = ['area', 'mass', 'ix', 'iy', 'i1', 'i2', 'theta']
const FIGURES_SHOWN = FIGURES.filter(({ key }) => SHOWN.includes(key))

/** The figures of the moment, under the picture; pointing at one draws it on the board. */
export function LiveFigures({ section, hover }: { section: Section | null; hover: HoverStore }) {
  const { settings } = useMe().team
  return (
    <ul
      aria-label="Figures as they stand"
      className="flex flex-wrap gap-x-6 gap-y-1 border border-hair border-b-0 bg-sheet px-3 py-2"
    >
      {FIGURES_SHOWN.map((figure) => {
        const value = section ? figure.value(section) : null
        const shown =
          value === null || value === undefined
            ? null
            : format(value, figure.dimension, settings, totalPlusMinus(section?.origin[figure.key]?.plusMinus))
        return (
          <li
            key={figure.key}
            title={figureWord(figure, settings)}
            onMouseEnter={() => hover.set({ kind: 'figure', key: figure.key })}
            onMouseLeave={() => hover.set(null)}
            className="min-w-24"
          >
            <span className="block text-small text-soft">
              <SymbolText symbol={figureSymbol(figure, settings)} />
            </span>
            <span className="whitespace-nowrap font-mono">
              {shown ? shown.text : '–'}{' '}
              {shown && (
                <span className="font-sans text-small text-soft">
                  <UnitText unit={shown.unit} />
                </span>
              )}
            </span>
          </li>
        )
      })}
    </ul>
  )
}
