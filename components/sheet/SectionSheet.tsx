'use client'
import { memo } from 'react'
import type { HoverStore } from '@/components/board/hover'
import type { TeamSettings } from '@/lib/api/schemas/people'
import type { Bounds, Figure, FigureGroup } from '@/lib/section/figures/figure'
import { FIGURES } from '@/lib/section/figures/index'
import { axisNames } from '@/lib/section/naming'
import type { Section } from '@/lib/section/types'
import { FigureRow } from './FigureRow'
import { OriginLegend } from './OriginMark'
import { writingOf } from './writing'

type Names = ReturnType<typeof axisNames>

/** Rows that few need stand folded under the others, with words for what they are. */
interface Fold {
  has: (key: string) => boolean
  word: string
}
const PLASTIC: Fold = { has: (key) => !/^plastic\.\w+$/.test(key), word: 'Neutral axes, shape factors, free bending' }

const GROUPS: { group: FigureGroup; title: (names: Names) => string; fold?: Fold }[] = [
  { group: 'size', title: () => 'Size' },
  { group: 'centroid', title: () => 'Centroid, as drawn' },
  { group: 'bending', title: ({ x, y }) => `Bending about ${x} and ${y}` },
  { group: 'principal', title: ({ axis1, axis2 }) => `Principal axes ${axis1} and ${axis2}` },
  { group: 'plastic', title: () => 'Plastic bending', fold: PLASTIC },
  { group: 'torsion', title: () => 'Torsion and shear' },
]

interface Row {
  figure: Figure
  value: number
  bounds?: Bounds
}

function rowsOf(section: Section, group: FigureGroup): Row[] {
  return FIGURES.filter((figure) => figure.group === group).flatMap((figure) => {
    const value = figure.value(section)
    return value === null || value === undefined ? [] : [{ figure, value, bounds: figure.bounds?.(section) }]
  })
}

interface Props {
  section: Section
  display: TeamSettings
  hover: HoverStore
}

/** Every figure of the section, from the one table of figures, in groups. */
export const SectionSheet = memo(function SectionSheet({ section, display, hover }: Props) {
  const names = axisNames(display.axes)
  const row = ({ figure, value, bounds }: Row) => (
    <FigureRow
      key={figure.key}
      figure={figure}
      value={value}
      bounds={bounds}
      origin={section.origin[figure.key]}
      display={display}
      hover={hover}
    />
  )
  return (
    <>
      {GROUPS.map(({ group, title, fold }) => {
        const rows = rowsOf(section, group)
        if (rows.length === 0) return null
        return (
          <section key={group} className="border-hair border-t py-2 first:border-t-0 first:pt-0">
            <table className="w-full border-collapse">
              <caption className="pb-1 text-left font-semibold text-small text-soft">{title(names)}</caption>
              <tbody>{rows.filter(({ figure }) => !fold?.has(figure.key)).map(row)}</tbody>
            </table>
            {fold && (
              <details>
                <summary className="min-h-7 text-small text-soft max-md:min-h-12">{fold.word}</summary>
                <table className="w-full border-collapse">
                  <caption className="sr-only">{fold.word}</caption>
                  <tbody>{rows.filter(({ figure }) => fold.has(figure.key)).map(row)}</tbody>
                </table>
              </details>
            )}
            {group === 'size' && section.mass === undefined && (
              <p className="text-small text-soft">No mass: no material was chosen for this revision.</p>
            )}
            {group === 'plastic' && <FreeAxes section={section} display={display} />}
            {group === 'principal' && section.theta === null && (
              <p className="text-small text-soft">
                Every axis through the centroid is principal: the two second moments agree within what the drawing's digits tell,
                so there is no angle, and no moduli belong to axes {names.axis1} and {names.axis2} alone.
              </p>
            )}
          </section>
        )
      })}
      <OriginLegend />
    </>
  )
})

/** Plastic neutral axes that lie in a gap: every place between two metals halves the area, and the modulus is the same. */
function FreeAxes({ section, display }: Omit<Props, 'hover'>) {
  const names = axisNames(display.axes)
  const { length } = writingOf(display)
  const ranges = Object.entries(section.plastic.atRange ?? {}) as [keyof Names, [number, number]][]
  return ranges.map(([axis, [from, to]]) => (
    <p key={axis} className="text-small text-soft">
      The plastic neutral axis parallel to {names[axis]} may lie anywhere from {length(from)} to {length(to)} from the centroid:
      no metal lies between. The modulus is the same for all.
    </p>
  ))
}
