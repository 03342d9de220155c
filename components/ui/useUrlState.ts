'use client'
import { usePathname, useSearchParams } from 'next/navigation'
import { useCallback } from 'react'

/** The URL's query as state: what a list shows can be sent, bookmarked and gone back to. Null removes a name. */
export function useUrlState(): [URLSearchParams, (changes: Record<string, string | null>) => void] {
  const query = useSearchParams()
  const path = usePathname()
  const change = useCallback(
    (changes: Record<string, string | null>) => {
      const next = new URLSearchParams(window.location.search)
      for (const [name, value] of Object.entries(changes)) {
        if (value === null || value === '') next.delete(name)
        else next.set(name, value)
      }
      const text = next.toString()
      window.history.replaceState(null, '', text ? `${path}?${text}` : path)
    },
    [path],
  )
  return [new URLSearchParams(query.toString()), change]
}
