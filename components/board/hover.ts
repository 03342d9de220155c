/** What the person points at, on the board or beside it. */
export type Hovered =
  | { kind: 'figure'; key: string }
  | { kind: 'outline'; id: string }
  | { kind: 'finding'; index: number }
  | null

/** A tiny external store, so that pointing at a figure redraws one row and one layer of the board. */
export interface HoverStore {
  get: () => Hovered
  set: (next: Hovered) => void
  subscribe: (listener: () => void) => () => void
}

const same = (a: Hovered, b: Hovered) => JSON.stringify(a) === JSON.stringify(b)

export function createHover(): HoverStore {
  let hovered: Hovered = null
  const listeners = new Set<() => void>()
  return {
    get: () => hovered,
    set(next) {
      if (same(hovered, next)) return
      hovered = next
      for (const listener of listeners) listener()
    },
    subscribe(listener) {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
  }
}
