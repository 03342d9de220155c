'use client'
import { type KeyboardEvent, type ReactNode, useId, useState } from 'react'
import { classes } from './classes'

export interface Tab {
  key: string
  label: ReactNode
  panel: ReactNode
}

/** Tabs with arrow keys; only the chosen panel is rendered. */
export function Tabs({
  label,
  tabs,
  chosen,
  onChoose,
}: {
  label: string
  tabs: Tab[]
  chosen?: string
  onChoose?: (key: string) => void
}) {
  const id = useId()
  const [own, setOwn] = useState(tabs[0]?.key)
  const key = chosen ?? own
  const at = Math.max(
    0,
    tabs.findIndex((tab) => tab.key === key),
  )
  const choose = (next: string) => (onChoose ? onChoose(next) : setOwn(next))
  const onKeyDown = (event: KeyboardEvent<HTMLDivElement>) => {
    const steps: Record<string, number> = { ArrowRight: at + 1, ArrowLeft: at - 1, Home: 0, End: tabs.length - 1 }
    const step = steps[event.key]
    if (step === undefined) return
    event.preventDefault()
    const next = tabs[(step + tabs.length) % tabs.length]
    choose(next.key)
    document.getElementById(`${id}-${next.key}`)?.focus()
  }
  return (
    <>
      <div role="tablist" aria-label={label} onKeyDown={onKeyDown} className="flex flex-wrap gap-x-5 border-b border-hair">
        {tabs.map((tab, i) => (
          <button
            key={tab.key}
            id={`${id}-${tab.key}`}
            type="button"
            role="tab"
            aria-selected={i === at}
            aria-controls={`${id}-panel`}
            tabIndex={i === at ? 0 : -1}
            onClick={() => choose(tab.key)}
            className={classes('target -mb-px border-b-2', i === at ? 'border-accent text-ink' : 'border-transparent text-soft')}
          >
            {tab.label}
          </button>
        ))}
      </div>
      <div role="tabpanel" id={`${id}-panel`} aria-labelledby={`${id}-${tabs[at]?.key}`} className="py-3">
        {tabs[at]?.panel}
      </div>
    </>
  )
}
