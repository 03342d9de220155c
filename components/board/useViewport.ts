'use client'
import { type RefObject, useLayoutEffect, useState } from 'react'
import type { Viewport } from './view'

/** Before the page has measured itself, and on the server. */
export const FIRST_VIEWPORT: Viewport = { width: 900, height: 620 }

const useBrowserLayoutEffect = typeof window === 'undefined' ? () => undefined : useLayoutEffect

/** The size of an element in px, followed as it changes. */
export function useViewport(ref: RefObject<Element | null>): Viewport {
  const [viewport, setViewport] = useState(FIRST_VIEWPORT)
  useBrowserLayoutEffect(() => {
    const element = ref.current
    if (!element) return
    const measure = () => {
      const { width, height } = element.getBoundingClientRect()
      if (width > 0 && height > 0)
        setViewport((last) => (last.width === width && last.height === height ? last : { width, height }))
    }
    measure()
    const observer = new ResizeObserver(measure)
    observer.observe(element)
    return () => observer.disconnect()
  }, [ref])
  return viewport
}
