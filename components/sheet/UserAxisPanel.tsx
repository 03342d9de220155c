'use client'
import { type Dispatch, type KeyboardEvent, useEffect, useMemo, useState } from 'react'
import type { Axis } from '@/components/board/axesOf'
import type { BoardAction, BoardState } from '@/components/board/boardState'
import { Button } from '@/components/ui/Button'
import { Field } from '@/components/ui/Field'
import { UnitText } from '@/components/ui/UnitText'
import type { TeamSettings } from '@/lib/api/schemas/people'
import { aboutAxis } from '@/lib/section/axis'
import type { Bundles } from '@/lib/section/bundles'
import { axisNames } from '@/lib/section/naming'
import type { Section } from '@/lib/section/types'
import { format, plain } from '@/lib/units/format'
import { parseLength } from '@/lib/units/parseLength'
import { parseNumber } from '@/lib/units/parseNumber'
import type { Quantity } from '@/lib/units/quantity'
import { axisRows } from './axisRows'
import { CopyButton } from './CopyButton'

interface Props {
  bundles: Bundles
  section: Section
  display: TeamSettings
  state: BoardState
  dispatch: Dispatch<BoardAction>
}

type Typed = { x: string; y: string; angle: string }

const lengthUnit = (display: TeamSettings) => (display.lengthUnit === 'in' ? 'in' : 'mm')
const short = (value: number) => String(Number(value.toPrecision(7)))

function typedOf({ through, angle }: Axis, display: TeamSettings): Typed {
  const size = lengthUnit(display) === 'in' ? 25.4 : 1
  return { x: short(through.x / size), y: short(through.y / size), angle: short((angle * 180) / Math.PI) }
}

/** Figures about an axis that the person types or drags on the board. */
export function UserAxisPanel({ bundles, section, display, state, dispatch }: Props) {
  const names = axisNames(display.axes)
  const { axis } = state
  const [typed, setTyped] = useState<Typed>({ x: '', y: '', angle: '' })
  useEffect(() => {
    if (axis) setTyped(typedOf(axis, display))
  }, [axis, display])
  const figures = useMemo(
    () => axis && aboutAxis(bundles, { x: axis.through.x, y: axis.through.y, angle: (axis.angle * 180) / Math.PI }),
    [bundles, axis],
  )
  const read = {
    x: parseLength(typed.x, lengthUnit(display)),
    y: parseLength(typed.y, lengthUnit(display)),
    angle: parseNumber(typed.angle),
  }
  const apply = () => {
    const unchanged = axis && JSON.stringify(typed) === JSON.stringify(typedOf(axis, display))
    if (unchanged || !read.x.ok || !read.y.ok || !read.angle.ok) return
    const next = { through: { x: read.x.value, y: read.y.value }, angle: (read.angle.value * Math.PI) / 180 }
    dispatch({ do: 'axis', axis: next, step: true })
  }
  const field = (key: keyof Typed, label: string, unit: string) => {
    const result = read[key]
    return (
      <Field
        label={label}
        unit={unit}
        inputMode="decimal"
        autoComplete="off"
        value={typed[key]}
        error={typed[key] !== '' && !result.ok ? result.message : undefined}
        hint={result.ok ? result.echo : undefined}
        onChange={(event) => setTyped({ ...typed, [key]: event.target.value })}
        onKeyDown={(event: KeyboardEvent) => event.key === 'Enter' && apply()}
        onBlur={apply}
      />
    )
  }
  const place = () => dispatch({ do: 'axis', axis: { through: section.centroid, angle: 0 }, step: true })
  return (
    <section className="border-hair border-t py-2" aria-labelledby="own-axis-heading">
      <h3 id="own-axis-heading" className="font-semibold text-small text-soft">
        About an axis of your own
      </h3>
      {!axis && (
        <p className="flex flex-wrap items-center gap-2 text-small text-soft">
          Any point and any turn: place it here and drag it on the board, or type it.
          <Button look="quiet" onClick={place}>
            Place it at the centroid
          </Button>
        </p>
      )}
      {axis && (
        <>
          <div className="grid grid-cols-3 gap-2 py-1">
            {field('x', `Through ${names.x}`, lengthUnit(display))}
            {field('y', `and ${names.y}`, lengthUnit(display))}
            {field('angle', 'turned by', '°')}
          </div>
          {figures && (
            <table className="w-full border-collapse">
              <tbody>
                {axisRows(figures).map(({ symbol, sub, word, value, quantity }) => (
                  <Row key={word} {...{ symbol, sub, word, value, quantity, display }} />
                ))}
              </tbody>
            </table>
          )}
          <Button look="quiet" onClick={() => dispatch({ do: 'axis', axis: null, step: true })}>
            Remove the axis
          </Button>
        </>
      )}
    </section>
  )
}

interface RowProps {
  symbol: string
  sub: string
  word: string
  value: number
  quantity: Quantity
  display: TeamSettings
}

function Row({ symbol, sub, word, value, quantity, display }: RowProps) {
  const { text, unit } = format(value, quantity, display)
  const digits = plain(value, quantity, display)
  return (
    <tr>
      <th scope="row" className="py-1 pr-2 text-left align-baseline font-normal text-soft">
        <span className="grid grid-cols-[4.6rem_1fr] items-baseline">
          <b className="font-semibold text-ink">
            {symbol}
            <sub>{sub}</sub>
          </b>
          <span className="text-small leading-snug">{word}</span>
        </span>
      </th>
      <td className="whitespace-nowrap text-right align-baseline font-medium font-mono">{text}</td>
      <td className="w-11 whitespace-nowrap pl-1.5 align-baseline text-small text-soft">
        <UnitText unit={unit} />
      </td>
      <td className="w-12 text-right">
        <CopyButton text={digits} name={`Copy ${digits} with all digits`} />
      </td>
    </tr>
  )
}
