import { Fragment } from 'react'
import type { UnitPart } from '@/lib/units/quantity'

/** A unit with its powers raised: the faces have no ⁴ and ⁶. */
export function UnitText({ unit }: { unit: readonly UnitPart[] }) {
  return (
    <>
      {unit.map(({ base, power, under }, i) => (
        <Fragment key={base}>
          {under && i > 0 ? '/' : i > 0 ? '·' : ''}
          {base}
          {power !== 1 && <sup>{power}</sup>}
        </Fragment>
      ))}
    </>
  )
}
