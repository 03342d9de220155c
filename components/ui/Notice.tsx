import type { ReactNode } from 'react'
import { classes } from './classes'

const TONES = {
  note: 'border-hair',
  asked: 'border-accent [&_b]:text-accent',
  good: 'border-moss [&_b]:text-moss',
  warning: 'border-ochre [&_b]:text-ochre',
  error: 'border-brick [&_b]:text-brick',
}

/** A sentence that must be seen; bold words take the tone. `live` reads it aloud when it appears. */
export function Notice({
  tone = 'note',
  live = false,
  className,
  children,
}: {
  tone?: keyof typeof TONES
  live?: boolean
  className?: string
  children: ReactNode
}) {
  const role = live ? (tone === 'error' ? 'alert' : 'status') : undefined
  return (
    <div role={role} className={classes('my-2 border-l-[3px] py-0.5 pl-3', TONES[tone], className)}>
      {children}
    </div>
  )
}
