'use client'
import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { useMay, useMe } from '@/components/shell/Me'
import { Button } from '@/components/ui/Button'
import { Check, Choices } from '@/components/ui/Check'
import { Field, Select } from '@/components/ui/Field'
import { ProblemNotice } from '@/components/ui/ProblemNotice'
import { toast } from '@/components/ui/toastStore'
import { useCurrent } from '@/components/ui/useCurrent'
import { useForm } from '@/components/ui/useForm'
import type { Choice } from '@/lib/api/client'
import type { Team } from '@/lib/api/schemas/people'
import { changeTeam } from './data'

const choice: Choice<Team> = ({ Team }) => Team

const UNITS = [
  { value: 'mm', label: 'mm, mm², mm⁴' },
  { value: 'cm', label: 'mm, cm², cm⁴ (areas and moments in centimetres)' },
  { value: 'in', label: 'in, in², in⁴' },
] as const
const SYMBOLS = [
  {
    value: 'en',
    label: (
      <>
        European: W<sub>el</sub>, W<sub>pl</sub>, I<sub>t</sub>, I<sub>w</sub>
      </>
    ),
  },
  {
    value: 'us',
    label: (
      <>
        American: S, Z, J, C<sub>w</sub>
      </>
    ),
  },
] as const
const AXES = [
  { value: 'xy', label: 'x–y, principal axes 1–2' },
  { value: 'yz', label: 'y–z, principal axes u–v (x runs along the member)' },
] as const

/** How the team's screens and packs show figures. What is stored never changes with it. */
export function TeamSettings() {
  const { team } = useMe()
  const may = useMay('team.settings')
  const router = useRouter()
  const [seen, setSeen] = useState(team)
  const { form, values, set, text, submit, busy, problem, setProblem } = useForm({
    name: team.name,
    digits: String(team.settings.digits),
    lengthUnit: team.settings.lengthUnit,
    symbols: team.settings.symbols,
    axes: team.settings.axes,
  })
  const current = useCurrent(problem, choice)
  const save = submit(async ({ name, digits, ...settings }) => {
    setSeen(await changeTeam(seen, { name, settings: { ...settings, digits: Number(digits) } }))
    router.refresh()
    toast('The team’s settings are saved.')
  })
  return (
    <section aria-labelledby="settings" className="border-t border-hair py-4">
      <h2 id="settings" className="font-semibold text-lg">
        How figures are shown
      </h2>
      <form ref={form} onSubmit={save} className="mt-2 grid gap-4">
        <fieldset disabled={!may} className="grid gap-4 md:grid-cols-2">
          <Field {...text('name')} label="Team" required maxLength={120} />
          <Select {...text('digits')} label="Significant digits" hint="Only digits that the drawing bears out are printed.">
            {[3, 4, 5, 6, 7, 8, 9, 10, 11, 12].map((digits) => (
              <option key={digits}>{digits}</option>
            ))}
          </Select>
          <Choices legend="Units">
            {UNITS.map(({ value, label }) => (
              <Check
                key={value}
                type="radio"
                name="lengthUnit"
                label={label}
                checked={values.lengthUnit === value}
                onChange={() => set({ lengthUnit: value })}
              />
            ))}
          </Choices>
          <Choices legend="Symbols">
            {SYMBOLS.map(({ value, label }) => (
              <Check
                key={value}
                type="radio"
                name="symbols"
                label={label}
                checked={values.symbols === value}
                onChange={() => set({ symbols: value })}
              />
            ))}
          </Choices>
          <Choices legend="Axis names">
            {AXES.map(({ value, label }) => (
              <Check
                key={value}
                type="radio"
                name="axes"
                label={label}
                checked={values.axes === value}
                onChange={() => set({ axes: value })}
              />
            ))}
            <p className="text-small text-soft">API, CSV and JSON are always x–y.</p>
          </Choices>
        </fieldset>
        <ProblemNotice problem={problem}>
          {current && (
            <Button
              onClick={() => {
                setSeen(current)
                setProblem(null)
              }}
            >
              Keep mine and save again
            </Button>
          )}
        </ProblemNotice>
        {may && (
          <div>
            <Button type="submit" look="main" disabled={busy}>
              Save settings
            </Button>
          </div>
        )}
      </form>
    </section>
  )
}
