'use client'
import { type ReactNode, useState } from 'react'
import { Field } from '@/components/ui/Field'
import { parseNumber } from '@/lib/units/parseNumber'

/** A number that takes effect when it reads as one; what is typed stays, with a sentence, where it does not. */
export function NumberChoice({
  label,
  unit,
  hint,
  value,
  allow,
  onChoose,
}: {
  label: string
  unit?: string
  hint?: ReactNode
  value: number
  allow: (value: number) => boolean
  onChoose: (value: number) => void
}) {
  const [typed, setTyped] = useState(String(value))
  const [before, setBefore] = useState(value)
  if (value !== before) {
    setBefore(value)
    const now = parseNumber(typed)
    if (!now.ok || now.value !== value) setTyped(String(value))
  }
  const parsed = parseNumber(typed)
  const wrong = parsed.ok ? (allow(parsed.value) ? null : 'That is out of range.') : parsed.message
  return (
    <Field
      label={label}
      unit={unit}
      inputMode="decimal"
      value={typed}
      error={wrong}
      hint={parsed.ok && parsed.echo ? parsed.echo : hint}
      onChange={(event) => {
        setTyped(event.target.value)
        const next = parseNumber(event.target.value)
        if (next.ok && allow(next.value) && next.value !== value) {
          setBefore(next.value)
          onChoose(next.value)
        }
      }}
    />
  )
}
