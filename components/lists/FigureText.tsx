'use client'
import { useMe } from '@/components/shell/Me'
import { UnitText } from '@/components/ui/UnitText'
import { format } from '@/lib/units/format'
import type { Quantity } from '@/lib/units/quantity'

/** A figure in the team's units and digits, its unit beside it. */
export function FigureText({ value, quantity }: { value: number | null; quantity: Quantity }) {
  const { settings } = useMe().team
  if (value === null) return <span className="text-soft">–</span>
  const { text, unit } = format(value, quantity, settings)
  return (
    <>
      {text}{' '}
      <span className="font-sans text-small text-soft">
        <UnitText unit={unit} />
      </span>
    </>
  )
}
