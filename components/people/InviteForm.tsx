'use client'
import { useState } from 'react'
import { Button } from '@/components/ui/Button'
import { Choices } from '@/components/ui/Check'
import { CopyField } from '@/components/ui/CopyField'
import { Field } from '@/components/ui/Field'
import { Notice } from '@/components/ui/Notice'
import { ProblemNotice } from '@/components/ui/ProblemNotice'
import { useForm } from '@/components/ui/useForm'
import type { Invitation } from '@/lib/api/schemas/people'
import type { Role } from '@/lib/auth/permissions'
import { invite } from './data'
import { RoleChecks } from './RoleChecks'

/** Makes an invitation; its link is shown once, to be copied into a message. */
export function InviteForm({ onClose }: { onClose: () => void }) {
  const [made, setMade] = useState<Invitation | null>(null)
  const { form, values, set, text, submit, busy, problem } = useForm<{ email: string; roles: Role[]; administrator: boolean }>({
    email: '',
    roles: ['designer'],
    administrator: false,
  })
  if (made?.url) {
    return (
      <div className="grid gap-4">
        <p>
          Send this link to <b>{made.email}</b>. It is shown only now; whoever opens it first joins the team.
        </p>
        <CopyField label="Link" value={made.url} />
        <div>
          <Button look="main" onClick={onClose}>
            Done
          </Button>
        </div>
      </div>
    )
  }
  return (
    <form ref={form} className="grid gap-4" onSubmit={submit(async (fields) => setMade(await invite(fields)))}>
      <Field {...text('email')} type="email" label="E-mail" required autoFocus autoComplete="off" />
      <Choices legend="Roles">
        <RoleChecks
          roles={values.roles}
          administrator={values.administrator}
          onRoles={(roles) => set({ roles })}
          onAdministrator={(administrator) => set({ administrator })}
        />
      </Choices>
      {values.roles.length === 0 && <Notice tone="asked">Choose at least one role.</Notice>}
      <ProblemNotice problem={problem} />
      <div>
        <Button type="submit" look="main" disabled={busy || values.roles.length === 0}>
          Make the link
        </Button>
      </div>
    </form>
  )
}
