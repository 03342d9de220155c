'use client'
import { usePathname, useRouter, useSearchParams } from 'next/navigation'
import { type FormEvent, useEffect, useRef } from 'react'
import { classes } from '@/components/ui/classes'

/** The search of every page; the key "/" goes there from anywhere but a field. */
export function Search() {
  const router = useRouter()
  const asked = useSearchParams().get('q') ?? ''
  // on a phone the list's own field is enough
  const listed = usePathname() === '/profiles'
  const input = useRef<HTMLInputElement>(null)
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      const typing = event.target instanceof HTMLElement && event.target.closest('input, textarea, select, dialog')
      if (event.key !== '/' || typing || event.ctrlKey || event.metaKey || event.altKey) return
      event.preventDefault()
      input.current?.focus()
    }
    document.addEventListener('keydown', onKey)
    return () => document.removeEventListener('keydown', onKey)
  }, [])
  const onSubmit = (event: FormEvent) => {
    event.preventDefault()
    const text = input.current?.value.trim() ?? ''
    router.push(text ? `/profiles?q=${encodeURIComponent(text)}` : '/profiles')
  }
  return (
    <search className={classes('ml-auto w-76 max-lg:w-60 max-md:order-3 max-md:w-full', listed && 'max-md:hidden')}>
      <form onSubmit={onSubmit}>
        <input
          key={asked}
          ref={input}
          type="search"
          name="q"
          defaultValue={asked}
          aria-label="Search profiles"
          aria-keyshortcuts="/"
          title="Search (/)"
          placeholder="Number, title, or Ix ≥ 40 cm⁴"
          className="target w-full rounded border border-edge bg-field px-3"
        />
      </form>
    </search>
  )
}
