'use client'
import { Button } from '@/components/ui/Button'
import { Check, Choices } from '@/components/ui/Check'
import { ProblemNotice } from '@/components/ui/ProblemNotice'
import { toast } from '@/components/ui/toastStore'
import { useForm } from '@/components/ui/useForm'
import type { Person } from '@/lib/api/schemas/people'
import { changePerson } from './data'
import { RoleChecks } from './RoleChecks'

export function PersonForm({ person, onDone }: { person: Person; onDone: () => void }) {
  const { form, values, set, check, submit, busy, problem } = useForm({
    roles: person.roles,
    administrator: person.administrator,
    disabled: person.disabled,
  })
  const save = submit(async (change) => {
    await changePerson(person, change)
    if (change.disabled && !person.disabled) toast(`${person.name} is signed out everywhere and cannot come back in.`)
    onDone()
  })
  return (
    <form ref={form} className="grid gap-3" onSubmit={save}>
      <p className="text-soft">{person.email}</p>
      <Choices legend="Roles">
        <RoleChecks
          roles={values.roles}
          administrator={values.administrator}
          disabled={values.disabled}
          onRoles={(roles) => set({ roles })}
          onAdministrator={(administrator) => set({ administrator })}
        />
      </Choices>
      <Check {...check('disabled')} label="Disabled" hint="Out at once, on every device. What they made stays." />
      <ProblemNotice problem={problem} />
      <div>
        <Button type="submit" look="main" disabled={busy}>
          Save
        </Button>
      </div>
    </form>
  )
}
