import { useSyncExternalStore } from 'react'

export interface Toast {
  id: number
  text: string
  tone: 'note' | 'error'
  undo?: () => void
}

let toasts: readonly Toast[] = []
let last = 0
const listeners = new Set<() => void>()
const none: readonly Toast[] = []

function set(next: readonly Toast[]): void {
  toasts = next
  for (const listener of listeners) listener()
}

export const dismiss = (id: number) => set(toasts.filter((toast) => toast.id !== id))

/** Says what has been done, for ten seconds; with `undo` it can be taken back. Errors stay until closed. */
export function toast(text: string, { tone = 'note', undo }: { tone?: Toast['tone']; undo?: () => void } = {}): void {
  const id = ++last
  set([...toasts.slice(-2), { id, text, tone, undo }])
  if (tone === 'note') setTimeout(() => dismiss(id), 10_000)
}

const subscribe = (listener: () => void) => {
  listeners.add(listener)
  return () => listeners.delete(listener)
}
export const useToasts = () =>
  useSyncExternalStore(
    subscribe,
    () => toasts,
    () => none,
  )
