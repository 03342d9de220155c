'use client'
import { useEffect } from 'react'

/** While there is something unsaved, the browser asks before the page is left. */
export function useLeaving(unsaved: boolean) {
  useEffect(() => {
    if (!unsaved) return
    const ask = (event: BeforeUnloadEvent) => event.preventDefault()
    window.addEventListener('beforeunload', ask)
    return () => window.removeEventListener('beforeunload', ask)
  }, [unsaved])
}
