/** What can be undone: the present with what was before and what was taken back. */
export interface History<T> {
  past: readonly T[]
  present: T
  future: readonly T[]
}

const KEPT = 200

export const begin = <T>(present: T): History<T> => ({ past: [], present, future: [] })

export const push = <T>({ past, present }: History<T>, next: T): History<T> => ({
  past: [...past.slice(-KEPT + 1), present],
  present: next,
  future: [],
})

export const undo = <T>(history: History<T>): History<T> => {
  const { past, present, future } = history
  if (past.length === 0) return history
  return { past: past.slice(0, -1), present: past[past.length - 1], future: [present, ...future] }
}

export const redo = <T>(history: History<T>): History<T> => {
  const { past, present, future } = history
  if (future.length === 0) return history
  return { past: [...past, present], present: future[0], future: future.slice(1) }
}
