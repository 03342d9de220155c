'use client'
import { UnitText } from '@/components/ui/UnitText'
import type { TeamSettings } from '@/lib/api/schemas/people'
import type { Bounds, Figure } from '@/lib/section/figures/figure'
import type { Origin } from '@/lib/section/types'
import { format, forScreen, plain } from '@/lib/units/format'
import { unitOf } from '@/lib/units/units'
import { CopyButton } from './CopyButton'
import { contributions, totalPlusMinus } from './plusMinus'

/** The ± of a figure with its largest cause first, and the figure with every digit, ready to copy. */
export function FigureDetail({
  figure,
  value,
  bounds,
  origin,
  display,
}: {
  figure: Figure
  value: number
  bounds?: Bounds
  origin: Origin | undefined
  display: TeamSettings
}) {
  const causes = contributions(origin?.plusMinus)
  const small = { ...display, digits: 2 }
  const edge = (at: number) => format(at, figure.dimension, { ...display, digits: Math.max(6, display.digits) }).text
  const { parts } = unitOf(figure.dimension, display.lengthUnit)
  const digits = plain(value, figure.dimension, display)
  return (
    <div className="border-accent border-l-2 pl-3 text-small text-soft">
      <p className="flex flex-wrap items-center justify-between gap-x-3">
        <span className="font-mono text-ink">
          {/e/.test(digits) ? digits : forScreen(digits)} <UnitText unit={parts} />
        </span>
        <CopyButton text={digits} name={`Copy ${digits} with all digits`} />
      </p>
      {origin?.kind === 'element' && (
        <p>
          {origin.estimate && 'An estimate by finite elements; its ± is the change between the last two meshes.'}
          {bounds && (
            <>
              By finite elements, from both sides: it lies between{' '}
              <span className="whitespace-nowrap font-mono text-ink">{edge(bounds.lower)}</span> and{' '}
              <span className="whitespace-nowrap font-mono text-ink">{edge(bounds.upper)}</span> for the region as drawn.
            </>
          )}
        </p>
      )}
      {causes.length === 0 ? (
        <p>No ± is known for this figure.</p>
      ) : (
        <p>
          <span className="font-mono text-ink">± {format(totalPlusMinus(origin?.plusMinus), figure.dimension, small).text}</span>,
          most of it from {causes[0].word}
          {causes.length > 1 && (
            <>
              {' ('}
              {causes.map(({ word, value: part }, k) => (
                <span key={word}>
                  {k > 0 && ', '}
                  {word} <span className="font-mono">{format(part, figure.dimension, small).text}</span>
                </span>
              ))}
              )
            </>
          )}
          .
        </p>
      )}
    </div>
  )
}
