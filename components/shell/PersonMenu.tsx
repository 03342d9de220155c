'use client'
import { useRouter } from 'next/navigation'
import { lazy, useState } from 'react'
import { changeMe } from '@/components/people/data'
import { signOut } from '@/components/setup/session'
import { Dialog } from '@/components/ui/Dialog'
import { Menu, type MenuItem } from '@/components/ui/Menu'
import { problemOf } from '@/components/ui/problem'
import { toast } from '@/components/ui/toastStore'
import { useMe } from './Me'
import { THEMES, type Theme, takeTheme } from './theme'

const ZoneForm = lazy(() => import('./ZoneForm').then((module) => ({ default: module.ZoneForm })))

const THEME_NAMES: Record<Theme, string> = { system: 'Theme of the system', light: 'Light', dark: 'Dark' }

export function PersonMenu({ theme: first }: { theme: Theme }) {
  const me = useMe()
  const router = useRouter()
  const [theme, setTheme] = useState(first)
  const [zoneOpen, setZoneOpen] = useState(false)
  const initials = me.name
    .split(/\s+/)
    .map((word) => word[0])
    .slice(0, 2)
    .join('')
    .toUpperCase()

  const leave = () => signOut().catch((error) => toast(problemOf(error).sentence, { tone: 'error' }))
  const toTeam = async (teamId: string) => {
    try {
      await changeMe({ teamId })
      window.location.assign('/')
    } catch (error) {
      toast(problemOf(error).sentence, { tone: 'error' })
    }
  }
  const teams: (MenuItem | 'line')[] =
    me.teams.length < 2
      ? []
      : [
          ...me.teams.map(({ id, name }): MenuItem => ({ label: name, checked: id === me.team.id, onChoose: () => toTeam(id) })),
          'line',
        ]
  const items: (MenuItem | 'line')[] = [
    ...teams,
    ...THEMES.map(
      (name): MenuItem => ({
        label: THEME_NAMES[name],
        checked: theme === name,
        onChoose: () => {
          setTheme(name)
          takeTheme(name)
        },
      }),
    ),
    'line',
    { label: `Time zone: ${me.zone}`, onChoose: () => setZoneOpen(true) },
    { label: 'Sign out', onChoose: leave },
  ]
  return (
    <>
      <Menu
        label={
          <span
            aria-hidden="true"
            className="grid size-8 place-items-center rounded-full border border-edge text-tiny font-semibold"
          >
            {initials}
          </span>
        }
        name={`${me.name}, ${me.team.name} (${initials})`}
        items={items}
        className="max-md:ml-auto"
      />
      <Dialog title="Time zone" open={zoneOpen} onClose={() => setZoneOpen(false)}>
        {zoneOpen && (
          <ZoneForm
            zone={me.zone}
            onDone={() => {
              setZoneOpen(false)
              router.refresh()
            }}
          />
        )}
      </Dialog>
    </>
  )
}
