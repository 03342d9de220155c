'use client'
import type { ReactNode } from 'react'
import { SWRConfig } from 'swr'

/** What the server read already, under the keys by which the browser will ask again. */
export function Fallback({ of, children }: { of: Record<string, unknown>; children: ReactNode }) {
  return <SWRConfig value={{ fallback: of }}>{children}</SWRConfig>
}
