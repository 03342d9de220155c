'use client'
import { type ChangeEvent, type FormEvent, useRef, useState } from 'react'
import { type Problem, problemOf } from './problem'

type Control = HTMLInputElement | HTMLTextAreaElement | HTMLSelectElement

/** The one form pattern: typed values stay through every error; the first field at fault gets the focus. */
export function useForm<V extends object>(initial: V) {
  const [values, setValues] = useState(initial)
  const [problem, setProblem] = useState<Problem | null>(null)
  const [busy, setBusy] = useState(false)
  const form = useRef<HTMLFormElement>(null)

  const set = (change: Partial<V>) => setValues((now) => ({ ...now, ...change }))
  const put = (name: string, value: string | boolean) => setValues((now) => ({ ...now, [name]: value }))
  const text = <K extends keyof V & string>(name: K) => ({
    name,
    value: String(values[name] ?? ''),
    onChange: (event: ChangeEvent<Control>) => put(name, event.target.value),
    error: problem?.fields[name],
  })
  const check = <K extends keyof V & string>(name: K) => ({
    name,
    checked: Boolean(values[name]),
    onChange: (event: ChangeEvent<HTMLInputElement>) => put(name, event.target.checked),
  })
  const submit = (run: (values: V) => Promise<void>) => async (event: FormEvent) => {
    event.preventDefault()
    setBusy(true)
    setProblem(null)
    try {
      await run(values)
    } catch (error) {
      const caught = problemOf(error)
      setProblem(caught)
      const [first] = Object.keys(caught.fields)
      const control = first ? form.current?.elements.namedItem(first) : null
      if (control instanceof HTMLElement) control.focus()
    } finally {
      setBusy(false)
    }
  }
  return { form, values, set, text, check, submit, busy, problem, setProblem }
}
