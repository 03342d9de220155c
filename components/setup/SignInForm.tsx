'use client'
import { useState } from 'react'
import { Button } from '@/components/ui/Button'
import { Field } from '@/components/ui/Field'
import { Notice } from '@/components/ui/Notice'
import { ProblemNotice } from '@/components/ui/ProblemNotice'
import { useForm } from '@/components/ui/useForm'
import { adoptZone, signIn } from './session'

/** `to` is a path of this app where the person wanted to go. */
export function SignInForm({ to }: { to: string }) {
  const [wrong, setWrong] = useState<string | null>(null)
  const { form, text, submit, busy, problem } = useForm({ email: '', password: '' })
  const enter = submit(async ({ email, password }) => {
    const refused = await signIn(email.trim(), password)
    setWrong(refused)
    if (refused) return
    await adoptZone().catch(() => undefined)
    window.location.assign(to)
  })
  return (
    <form ref={form} onSubmit={enter} className="grid gap-4">
      <Field {...text('email')} type="email" label="E-mail" required autoFocus autoComplete="username" />
      <Field {...text('password')} type="password" label="Password" required autoComplete="current-password" />
      {wrong && (
        <Notice tone="error" live>
          {wrong}
        </Notice>
      )}
      <ProblemNotice problem={problem} />
      <Button type="submit" look="main" disabled={busy}>
        {busy ? 'Signing in …' : 'Sign in'}
      </Button>
    </form>
  )
}
