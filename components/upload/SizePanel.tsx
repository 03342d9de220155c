'use client'
import { type FormEvent, useState } from 'react'
import { Button } from '@/components/ui/Button'
import { Field, Select } from '@/components/ui/Field'
import { Notice } from '@/components/ui/Notice'
import { mmPerUnit } from '@/lib/geometry/recipe'
import type { PreviewResult } from '@/lib/jobs/browser-pool'
import { parseLength } from '@/lib/units/parseLength'
import { Finished } from './Finished'
import { type Choices as Chosen, type FlowAction, isConfirmed } from './flow/flow'
import { type Reference, referencesOf } from './flow/references'
import { type Cure, compare, cures, UNITS } from './flow/size'
import { NumberChoice } from './NumberChoice'
import { Panel } from './Panel'
import { Readings } from './Readings'

const short = (mm: number) => String(Number(mm.toPrecision(6))).replace('-', '−')

/** Unit, scale and size, confirmed by a dimension known from elsewhere. */
export function SizePanel({
  result,
  choices,
  measured,
  dispatch,
  onShow,
}: {
  result: PreviewResult
  choices: Chosen
  /** the distance measured on the board, mm */
  measured: number | null
  dispatch: (action: FlowAction) => void
  onShow: (at: [number, number], size: number) => void
}) {
  const { recipe, claim, finished } = choices
  const { declared, measurement } = result.drawing
  const confirmed = isConfirmed(choices)
  const hint =
    declared === 'none'
      ? measurement
        ? `The file names no unit, but is ${measurement}.`
        : 'The file names no unit.'
      : `The file says ${declared}.`
  return (
    <Panel
      title="Size"
      state={
        confirmed ? (
          <b className="text-moss">
            confirmed: {claim?.what}, {short(claim?.value ?? 0)} mm
          </b>
        ) : (
          <b className="text-ochre">not confirmed yet</b>
        )
      }
    >
      <div className="grid grid-cols-2 gap-3">
        <Select
          label="Drawing unit"
          hint={hint}
          value={typeof recipe.unit === 'number' ? '' : recipe.unit}
          onChange={(event) => {
            const unit = UNITS.find((name) => name === event.target.value)
            if (unit) dispatch({ type: 'set', change: { unit } })
          }}
        >
          {typeof recipe.unit === 'number' && <option value="">{recipe.unit} mm</option>}
          {UNITS.map((unit) => (
            <option key={unit}>{unit}</option>
          ))}
        </Select>
        <NumberChoice
          label="Scale"
          hint="1 where drawn at full size; 10 for 1:10."
          value={recipe.scale}
          allow={(scale) => scale > 0}
          onChoose={(scale) => dispatch({ type: 'set', change: { scale } })}
        />
      </div>
      <Readings result={result} />
      <Confirm {...{ result, choices, measured, dispatch, onShow }} />
      <Finished {...{ finished, shrinkage: recipe.shrinkage, dispatch }} />
    </Panel>
  )
}

function Confirm({
  result,
  choices,
  measured,
  dispatch,
  onShow,
}: {
  result: PreviewResult
  choices: Chosen
  measured: number | null
  dispatch: (action: FlowAction) => void
  onShow: (at: [number, number], size: number) => void
}) {
  const { claim, recipe } = choices
  const references = referencesOf(result, measured)
  const [key, setKey] = useState('width')
  const [typed, setTyped] = useState('')
  const [wrong, setWrong] = useState<string | null>(null)
  const reference = references.find((row) => row.key === key) ?? references[0]
  if (!reference) return null
  const choose = (next: Reference) => {
    setKey(next.key)
    setWrong(null)
    if (next.by === 'drawn') setTyped(short(next.says ?? next.drawn * mmPerUnit(recipe)))
    if (next.at) onShow(next.at, next.drawn)
  }
  const parsed = parseLength(typed, 'mm')
  const confirm = (event: FormEvent) => {
    event.preventDefault()
    if (!parsed.ok || parsed.value <= 0) return setWrong(parsed.ok ? 'A dimension is greater than 0.' : parsed.message)
    setWrong(null)
    dispatch({ type: 'claim', claim: { by: reference.by, what: reference.name, value: parsed.value, drawn: reference.drawn } })
  }
  const comparison = claim && compare(claim, recipe)
  return (
    <form onSubmit={confirm} className="mt-3 grid gap-2">
      <div className="grid grid-cols-2 gap-3">
        <Select
          label="A dimension you know"
          hint="From the order, or a drawn one that agrees with it."
          value={reference.key}
          onChange={(event) => {
            const next = references.find((row) => row.key === event.target.value)
            if (next) choose(next)
          }}
        >
          {references.map((row) => (
            <option key={row.key} value={row.key}>
              {row.name}
            </option>
          ))}
        </Select>
        <Field
          label="Known to be"
          unit="mm"
          inputMode="decimal"
          value={typed}
          onChange={(event) => setTyped(event.target.value)}
          error={wrong}
          hint={parsed.ok && parsed.echo ? parsed.echo : 'Also “2 3/8 in”.'}
        />
      </div>
      <div>
        <Button type="submit" look={claim ? 'plain' : 'main'}>
          Compare and confirm
        </Button>
      </div>
      {claim && comparison && (
        <Notice tone={comparison.agrees ? 'good' : 'error'} live>
          {comparison.agrees ? (
            <p>
              <b>It agrees.</b> {claim.what}: known {short(claim.value)} mm, drawn {short(comparison.measured)} mm.
            </p>
          ) : (
            <>
              <p>
                <b>It does not agree.</b> {claim.what}: known {short(claim.value)} mm, but the drawing gives{' '}
                {short(comparison.measured)} mm ({short(comparison.measured / claim.value)} times as much).
              </p>
              <div className="mt-1 flex flex-wrap gap-2">
                {cures(claim, recipe).map((cure) => (
                  <Button key={sentence(cure)} onClick={() => dispatch(actionOf(cure))}>
                    {sentence(cure)}
                  </Button>
                ))}
              </div>
            </>
          )}
        </Notice>
      )}
    </form>
  )
}

function sentence(cure: Cure): string {
  if (cure.kind === 'unit') return `It is drawn in ${cure.unit}`
  if (cure.kind === 'scale') return cure.scale > 1 ? `It is drawn 1 : ${cure.scale}` : `It is drawn ${1 / cure.scale} : 1`
  return `It is a die, shrinkage ${short((cure.shrinkage - 1) * 100)} %`
}

function actionOf(cure: Cure): FlowAction {
  if (cure.kind === 'unit') return { type: 'set', change: { unit: cure.unit } }
  if (cure.kind === 'scale') return { type: 'set', change: { scale: cure.scale } }
  return { type: 'finished', finished: 'die', shrinkage: cure.shrinkage }
}
