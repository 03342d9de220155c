import { cookies } from 'next/headers'
import type { ReactNode } from 'react'
import { Frame } from '@/components/shell/Frame'
import { THEME_COOKIE, themeOf } from '@/components/shell/theme'
import { database } from '@/db/instance'
import { getMe } from '@/db/people'
import { requireActor } from '@/lib/auth/actor'

export default async function AppLayout({ children }: { children: ReactNode }) {
  const actor = await requireActor('team.read')
  const me = await getMe(database().read, actor)
  return (
    <Frame me={me} theme={themeOf((await cookies()).get(THEME_COOKIE)?.value)}>
      {children}
    </Frame>
  )
}
