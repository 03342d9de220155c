'use client'
import Link from 'next/link'
import { type KeyboardEvent, type ReactNode, useEffect, useId, useRef, useState } from 'react'
import { classes } from './classes'

export interface MenuItem {
  label: ReactNode
  /** where it leads, or */
  href?: string
  onChoose?: () => void
  /** a choice of several shows a mark */
  checked?: boolean
  danger?: boolean
}

type Place = Record<'top' | 'bottom' | 'left' | 'right', number | undefined>

/** Fixed to the window, so that no scrolling table cuts the menu off; above the button where there is no room below. */
function placeUnder({ top, bottom, left, right }: DOMRect, align: 'left' | 'right'): Place {
  const { clientWidth, clientHeight } = document.documentElement
  const above = bottom > 0.6 * clientHeight
  return {
    top: above ? undefined : bottom + 4,
    bottom: above ? clientHeight - top + 4 : undefined,
    left: align === 'left' ? left : undefined,
    right: align === 'right' ? clientWidth - right : undefined,
  }
}

/** A button with a menu under it: arrow keys walk, Escape closes, a click outside closes. */
export function Menu({
  label,
  name,
  items,
  align = 'right',
  className,
}: {
  label: ReactNode
  name: string
  items: (MenuItem | 'line')[]
  align?: 'left' | 'right'
  className?: string
}) {
  const id = useId()
  const [place, setPlace] = useState<Place | null>(null)
  const open = place !== null
  const setOpen = (next: boolean) =>
    setPlace(next && button.current ? placeUnder(button.current.getBoundingClientRect(), align) : null)
  const root = useRef<HTMLDivElement>(null)
  const button = useRef<HTMLButtonElement>(null)
  const entries = () => [...(root.current?.querySelectorAll<HTMLElement>('[role^=menuitem]') ?? [])]

  useEffect(() => {
    if (!open) return
    root.current?.querySelector<HTMLElement>('[role^=menuitem]')?.focus({ preventScroll: true })
    const outside = (event: PointerEvent) => {
      if (event.target instanceof Node && !root.current?.contains(event.target)) setPlace(null)
    }
    const away = ({ target }: Event) => {
      if (!(target instanceof Node && root.current?.contains(target))) setPlace(null)
    }
    document.addEventListener('pointerdown', outside)
    window.addEventListener('resize', away)
    document.addEventListener('scroll', away, { capture: true, passive: true })
    return () => {
      document.removeEventListener('pointerdown', outside)
      window.removeEventListener('resize', away)
      document.removeEventListener('scroll', away, { capture: true })
    }
  }, [open])

  const close = () => {
    setOpen(false)
    button.current?.focus()
  }
  const onKeyDown = (event: KeyboardEvent<HTMLDivElement>) => {
    if (event.key === 'Tab') return setOpen(false)
    const all = entries()
    const at = all.findIndex((entry) => entry.matches(':focus'))
    const steps: Record<string, number> = { ArrowDown: at + 1, ArrowUp: at - 1, Home: 0, End: all.length - 1 }
    if (event.key === 'Escape') close()
    else if (steps[event.key] === undefined) return
    else all[(steps[event.key] + all.length) % all.length]?.focus()
    event.preventDefault()
  }
  return (
    <div ref={root} className={classes('relative', className)}>
      <button
        ref={button}
        type="button"
        aria-haspopup="menu"
        aria-expanded={open}
        aria-controls={open ? id : undefined}
        aria-label={name}
        title={name}
        onClick={() => setOpen(!open)}
        onKeyDown={(event) => event.key === 'ArrowDown' && setOpen(true)}
        className="target inline-flex min-w-10 items-center justify-center gap-2 rounded border border-transparent px-2 hover:border-hair aria-expanded:border-hair max-md:min-w-12"
      >
        {label}
      </button>
      {open && (
        <div
          id={id}
          role="menu"
          aria-label={name}
          tabIndex={-1}
          onKeyDown={onKeyDown}
          style={place}
          className="fixed z-10 max-h-[80vh] min-w-56 overflow-y-auto rounded border border-hair bg-sheet py-1 text-left font-sans"
        >
          {items.map((item, i) => {
            if (item === 'line') return <hr key={`line-${String(i)}`} className="my-1 border-line" />
            const shared = {
              role: item.checked === undefined ? 'menuitem' : 'menuitemradio',
              'aria-checked': item.checked,
              tabIndex: -1,
              className: classes(
                'target flex w-full items-center gap-2 px-4 text-left hover:bg-wash focus:bg-wash -outline-offset-2',
                item.danger && 'text-brick',
              ),
            }
            const text = (
              <>
                {item.checked !== undefined && (
                  <span
                    aria-hidden="true"
                    className={classes('size-2 rounded-full', item.checked ? 'bg-accent' : 'bg-transparent')}
                  />
                )}
                {item.label}
              </>
            )
            return item.href ? (
              <Link key={item.href} href={item.href} {...shared} onClick={() => setOpen(false)}>
                {text}
              </Link>
            ) : (
              <button
                key={typeof item.label === 'string' ? item.label : `item-${String(i)}`}
                type="button"
                {...shared}
                onClick={() => {
                  close()
                  item.onChoose?.()
                }}
              >
                {text}
              </button>
            )
          })}
        </div>
      )}
    </div>
  )
}
