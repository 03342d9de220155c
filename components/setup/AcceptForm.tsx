'use client'
import { Button } from '@/components/ui/Button'
import { Field } from '@/components/ui/Field'
import { ProblemNotice } from '@/components/ui/ProblemNotice'
import { useForm } from '@/components/ui/useForm'
import { sendJson } from '@/lib/api/client'
import { keys } from '@/lib/api/keys'
import { adoptZone } from './session'

/** Joins a team by a link. `known`: the address has an account here, and its password opens the door. */
export function AcceptForm({ token, email, known }: { token: string; email: string; known: boolean }) {
  const { form, text, submit, busy, problem } = useForm({ name: '', password: '' })
  const join = submit(async ({ name, password }) => {
    const body = { token, name: name || email, password }
    await sendJson('POST', keys.acceptInvitation, ({ Anything }) => Anything, { body })
    await adoptZone().catch(() => undefined)
    window.location.assign('/')
  })
  return (
    <form ref={form} onSubmit={join} className="grid gap-4">
      <Field label="E-mail" value={email} readOnly autoComplete="username" />
      {!known && <Field {...text('name')} label="Your name" required maxLength={120} autoFocus autoComplete="name" />}
      <Field
        {...text('password')}
        type="password"
        label="Password"
        required
        minLength={10}
        autoComplete={known ? 'current-password' : 'new-password'}
        hint={known ? 'The one you sign in with here.' : 'At least 10 characters.'}
      />
      <ProblemNotice problem={problem} />
      <Button type="submit" look="main" disabled={busy}>
        {busy ? 'Joining …' : 'Join the team'}
      </Button>
    </form>
  )
}
