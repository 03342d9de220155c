'use client'
import { mmPerUnit } from '@/lib/geometry/recipe'
import type { PreviewResult } from '@/lib/jobs/browser-pool'
import { survivingDigits } from '@/lib/units/digits'
import { forScreen } from '@/lib/units/format'

const shown = (value: number) => forScreen(survivingDigits(value, 4))

/** The same drawing read in millimetres and in inches, side by side: one of the two looks wrong at once. */
export function Readings({ result }: { result: PreviewResult }) {
  const { section, recipe } = result.answer
  if (!section) return null
  const now = mmPerUnit(recipe)
  const { extents, mass } = section
  const readings = (['mm', 'in'] as const).map((unit) => {
    const factor = mmPerUnit({ ...recipe, unit }) / now
    return {
      unit,
      chosen: recipe.unit === unit,
      size: `${shown(factor * (extents.maxX - extents.minX))} × ${shown(factor * (extents.maxY - extents.minY))} mm`,
      mass: mass === undefined ? 'no material yet' : `${shown(factor ** 2 * mass)} kg/m`,
    }
  })
  return (
    <table className="mt-3 w-full text-left text-small">
      <caption className="sr-only">The drawing read in millimetres and in inches</caption>
      <thead>
        <tr className="text-soft">
          <td />
          {readings.map(({ unit, chosen }) => (
            <th key={unit} scope="col" className={chosen ? 'font-semibold text-accent' : 'font-normal'}>
              {unit === 'mm' ? 'Read in mm' : 'Read in inches'}
              {chosen && ' (chosen)'}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        <tr className="border-t border-line">
          <th scope="row" className="py-1 font-normal text-soft">
            Size
          </th>
          {readings.map(({ unit, size }) => (
            <td key={unit} className="font-mono">
              {size}
            </td>
          ))}
        </tr>
        <tr className="border-t border-line">
          <th scope="row" className="py-1 font-normal text-soft">
            Mass
          </th>
          {readings.map(({ unit, mass: shownMass }) => (
            <td key={unit} className="font-mono">
              {shownMass}
            </td>
          ))}
        </tr>
      </tbody>
    </table>
  )
}
