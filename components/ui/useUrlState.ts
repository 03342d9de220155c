'use client'
import { usePathname, useSearchParams } from 'next/navigation'
import { useCallback } from 'react'

/** A step that the browser's Back should undo is pushed; the rest replaces. */
type Change = (changes: Record<string, string | null>, how?: 'replace' | 'push') => void

/** The URL's query as state: what a list shows can be sent, bookmarked and gone back to. Null removes a name. */
export function useUrlState(): [URLSearchParams, Change] {
  const query = useSearchParams()
  const path = usePathname()
  const change = useCallback(
    (changes: Record<string, string | null>, how: 'replace' | 'push' = 'replace') => {
      const next = new URLSearchParams(window.location.search)
      for (const [name, value] of Object.entries(changes)) {
        if (value === null || value === '') next.delete(name)
        else next.set(name, value)
      }
      const text = next.toString()
      const url = text ? `${path}?${text}` : path
      if (how === 'push') window.history.pushState(null, '', url)
      else window.history.replaceState(null, '', url)
    },
    [path],
  )
  return [new URLSearchParams(query.toString()), change]
}
