'use client'
import { useRef, useState } from 'react'
import { Button } from './Button'
import { Field } from './Field'

/**
 * A text to take along. The clipboard is closed over plain http on another host: then the text is
 * selected, and the button says which keys copy it.
 */
export function CopyField({ label, value }: { label: string; value: string }) {
  const frame = useRef<HTMLDivElement>(null)
  const [said, setSaid] = useState('Copy')
  const select = () => {
    const input = frame.current?.querySelector('input')
    input?.focus()
    input?.select()
  }
  const copy = async () => {
    select()
    try {
      await navigator.clipboard.writeText(value)
      setSaid('Copied')
    } catch {
      setSaid('Press Ctrl C')
    }
  }
  return (
    <div ref={frame} className="flex items-end gap-2">
      <div className="flex-1">
        <Field label={label} readOnly value={value} onFocus={select} className="font-mono text-small" />
      </div>
      <Button onClick={copy} aria-live="polite">
        {said}
      </Button>
    </div>
  )
}
