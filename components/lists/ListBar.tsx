'use client'
import { type ReactNode, useEffect, useState } from 'react'
import { Button } from '@/components/ui/Button'
import { Field } from '@/components/ui/Field'

/** Filter, bin switch and what else stands over a list. Typing reaches the URL after a short rest. */
export function ListBar({
  label,
  placeholder,
  asked,
  onAsk,
  bin,
  onBin,
  children,
}: {
  label: string
  placeholder: string
  asked: string
  onAsk: (text: string) => void
  bin: boolean
  onBin: (bin: boolean) => void
  children?: ReactNode
}) {
  const [typed, setTyped] = useState(asked)
  const [before, setBefore] = useState(asked)
  if (asked !== before) {
    setBefore(asked)
    setTyped(asked)
  }
  useEffect(() => {
    if (typed === asked) return
    const rest = setTimeout(() => onAsk(typed), 250)
    return () => clearTimeout(rest)
  }, [typed, asked, onAsk])
  return (
    <div className="flex flex-wrap items-end gap-2 py-2">
      <div className="w-76 max-md:w-full">
        <Field
          type="search"
          label={label}
          quietLabel
          placeholder={placeholder}
          value={typed}
          onChange={(event) => setTyped(event.target.value)}
        />
      </div>
      {children}
      <Button look="quiet" aria-pressed={bin} onClick={() => onBin(!bin)} title="Show what was deleted">
        Bin
      </Button>
    </div>
  )
}
