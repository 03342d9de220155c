'use client'
import { useEffect } from 'react'

/** Ctrl+Z, Ctrl+Shift+Z and Ctrl+S, from anywhere but where they mean something else (typed text, the board's tools). */
export function useFlowKeys({ undo, redo, save }: { undo: () => void; redo: () => void; save: (() => void) | null }) {
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.defaultPrevented) return
      const typing =
        event.target instanceof HTMLElement && event.target.closest('input:not([type=checkbox]):not([type=radio]), textarea')
      const key = event.key.toLowerCase()
      if (key === 's' && save) save()
      else if (key === 'z' && !typing) (event.shiftKey ? redo : undo)()
      else return
      event.preventDefault()
    }
    document.addEventListener('keydown', onKey)
    return () => document.removeEventListener('keydown', onKey)
  }, [undo, redo, save])
}
