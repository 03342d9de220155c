import Link from 'next/link'
import { type ReactNode, Suspense } from 'react'
import { Toasts } from '@/components/ui/Toasts'
import { Mark } from './Mark'
import { type Me, MeProvider } from './Me'
import { Nav } from './Nav'
import { PersonMenu } from './PersonMenu'
import { Search } from './Search'
import type { Theme } from './theme'

/** What stands round every page of the app: skip link, header, the page, messages. */
export function Frame({ me, theme, children }: { me: Me; theme: Theme; children: ReactNode }) {
  return (
    <MeProvider me={me}>
      <a
        href="#main"
        className="sr-only z-30 rounded border border-accent bg-sheet px-4 py-2 focus:not-sr-only focus:fixed focus:top-2 focus:left-2"
      >
        Skip to the page
      </a>
      <header className="flex flex-wrap items-center gap-x-6 border-b border-line px-4 py-1.5 md:px-6">
        <Link href="/" className="target flex items-center gap-2 font-bold tracking-tight">
          <Mark />
          Sectionwright
        </Link>
        <Nav />
        <Suspense>
          <Search />
        </Suspense>
        <PersonMenu theme={theme} />
      </header>
      <main id="main" tabIndex={-1} className="px-4 pb-10 outline-none md:px-6">
        {children}
      </main>
      <Toasts />
    </MeProvider>
  )
}
