'use client'
import { Button } from '@/components/ui/Button'
import { Check } from '@/components/ui/Check'
import { Field } from '@/components/ui/Field'
import { ProblemNotice } from '@/components/ui/ProblemNotice'
import { useForm } from '@/components/ui/useForm'
import { sendJson } from '@/lib/api/client'
import { keys } from '@/lib/api/keys'
import { adoptZone } from './session'

/** The first visit: the team, its administrator, and the demo data where wanted. */
export function SetUpForm({ codeAsked }: { codeAsked: boolean }) {
  const { form, text, check, submit, busy, problem } = useForm({
    team: '',
    name: '',
    email: '',
    password: '',
    code: '',
    demo: true,
  })
  const setUp = submit(async ({ code, demo, ...fields }) => {
    await sendJson('POST', keys.setup, ({ Anything }) => Anything, { body: { ...fields, ...(codeAsked ? { code } : {}) } })
    await adoptZone().catch(() => undefined)
    if (demo) await sendJson('POST', keys.demo, ({ Anything }) => Anything)
    window.location.assign('/')
  })
  return (
    <form ref={form} onSubmit={setUp} className="grid gap-4">
      <Field
        {...text('team')}
        label="Team"
        required
        maxLength={120}
        autoFocus
        hint="The office or workshop that shares everything."
      />
      <Field {...text('name')} label="Your name" required maxLength={120} autoComplete="name" />
      <Field {...text('email')} type="email" label="E-mail" required autoComplete="username" />
      <Field
        {...text('password')}
        type="password"
        label="Password"
        required
        minLength={10}
        autoComplete="new-password"
        hint="At least 10 characters."
      />
      {codeAsked && (
        <Field
          {...text('code')}
          label="One-time code"
          required
          autoComplete="off"
          className="font-mono"
          hint="It is printed where the server was started."
        />
      )}
      <Check
        {...check('demo')}
        label="Load the demo data"
        hint="A small façade and machine-frame workshop with a dozen profiles; it can be moved to the bin."
      />
      <ProblemNotice problem={problem} />
      <Button type="submit" look="main" disabled={busy}>
        {busy ? 'Setting up …' : 'Set up the team'}
      </Button>
    </form>
  )
}
