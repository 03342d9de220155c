'use client'
import { changeMe } from '@/components/people/data'
import { Button } from '@/components/ui/Button'
import { Select } from '@/components/ui/Field'
import { ProblemNotice } from '@/components/ui/ProblemNotice'
import { useForm } from '@/components/ui/useForm'

export function ZoneForm({ zone, onDone }: { zone: string; onDone: () => void }) {
  const zones = [...new Set([zone, 'UTC', ...Intl.supportedValuesOf('timeZone')])].sort()
  const { form, text, submit, busy, problem } = useForm({ zone })
  const save = submit(async (change) => {
    await changeMe(change)
    onDone()
  })
  return (
    <form ref={form} onSubmit={save} className="grid gap-4">
      <Select {...text('zone')} label="Dates and times are shown in">
        {zones.map((name) => (
          <option key={name}>{name}</option>
        ))}
      </Select>
      <ProblemNotice problem={problem} />
      <div>
        <Button type="submit" look="main" disabled={busy}>
          Save
        </Button>
      </div>
    </form>
  )
}
