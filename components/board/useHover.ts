'use client'
import { useSyncExternalStore } from 'react'
import type { HoverStore } from './hover'

/** A part of what is hovered; the component renders again only when that part changes. */
export function useHover<T extends string | number | boolean | null>(
  store: HoverStore,
  select: (hovered: ReturnType<HoverStore['get']>) => T,
): T {
  return useSyncExternalStore(
    store.subscribe,
    () => select(store.get()),
    () => select(null),
  )
}
