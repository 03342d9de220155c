import Link from 'next/link'
import type { ComponentProps } from 'react'
import { classes } from './classes'

const LOOKS = {
  plain: 'border-edge bg-field text-ink hover:border-ink',
  main: 'border-accent bg-accent text-sheet hover:opacity-90',
  quiet: 'border-transparent bg-transparent text-soft hover:text-ink hover:border-hair',
  link: 'border-transparent bg-transparent text-accent hover:border-hair',
  danger: 'border-brick bg-field text-brick hover:bg-brick hover:text-sheet',
}
interface Own {
  look?: keyof typeof LOOKS
  /** the key that does the same, as aria-keyshortcuts writes it; shown in the tooltip */
  shortcut?: string
}

const buttonClass = (look: keyof typeof LOOKS, more?: string) =>
  classes(
    'target inline-flex items-center justify-center gap-2 rounded border px-3 py-1 text-center no-underline',
    'aria-pressed:border-accent aria-pressed:text-accent disabled:opacity-50',
    LOOKS[look],
    more,
  )
const tooltip = (title?: string, shortcut?: string) => (shortcut ? `${title ?? ''} (${shortcut})`.trim() : title)

export function Button({ look = 'plain', shortcut, className, title, type = 'button', ...rest }: Own & ComponentProps<'button'>) {
  return (
    <button
      {...rest}
      type={type}
      title={tooltip(title, shortcut)}
      aria-keyshortcuts={shortcut}
      className={buttonClass(look, className)}
    />
  )
}

export function LinkButton({ look = 'plain', shortcut, className, title, ...rest }: Own & ComponentProps<typeof Link>) {
  return <Link {...rest} title={tooltip(title, shortcut)} aria-keyshortcuts={shortcut} className={buttonClass(look, className)} />
}
