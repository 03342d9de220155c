'use client'
import { useEffect } from 'react'

/** Ctrl+Z, Ctrl+Shift+Z and Ctrl+S, from anywhere but where they mean something else (typed text, the board's tools). */
export function useFlowKeys({
  undo,
  redo,
  save,
  active,
}: {
  undo: () => void
  redo: () => void
  /** null while there is nothing that may be saved */
  save: (() => void) | null
  /** of several drawings only the one in view listens */
  active: boolean
}) {
  useEffect(() => {
    if (!active) return
    const onKey = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.defaultPrevented) return
      const typing =
        event.target instanceof HTMLElement && event.target.closest('input:not([type=checkbox]):not([type=radio]), textarea')
      const key = event.key.toLowerCase()
      if (key === 's') save?.()
      else if (key === 'z' && !typing) (event.shiftKey ? redo : undo)()
      else return
      event.preventDefault()
    }
    document.addEventListener('keydown', onKey)
    return () => document.removeEventListener('keydown', onKey)
  }, [undo, redo, save, active])
}
