'use client'
import { useMe } from '@/components/shell/Me'
import type { Dimension } from '@/lib/section/figures/figure'

/** A figure in the team's units and digits, its unit beside it. */
export function FigureText({ value, dimension }: { value: number | null; dimension: Dimension }) {
  const { settings } = useMe().team
  if (value === null) return <span className="text-soft">–</span>
  return (
    <>
      {value.toPrecision(settings.digits)} <span className="font-sans text-small text-soft">{dimension}</span>
    </>
  )
}
