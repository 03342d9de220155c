'use client'
import { createContext, type ReactNode, useContext } from 'react'
import type { z } from 'zod'
import type { Me as MeSchema } from '@/lib/api/schemas/people'
import { can, type Permission } from '@/lib/auth/permissions'

export type Me = z.output<typeof MeSchema>

const Context = createContext<Me | null>(null)

export function MeProvider({ me, children }: { me: Me; children: ReactNode }) {
  return <Context value={me}>{children}</Context>
}

/** Who is signed in, with the team and its settings. Stands in every page of the app. */
export function useMe(): Me {
  const me = useContext(Context)
  if (!me) throw new Error('useMe stands outside the app frame')
  return me
}

/** May the person do this? The same table that the routes ask. */
export const useMay = (permission: Permission): boolean => can(useMe(), permission)
