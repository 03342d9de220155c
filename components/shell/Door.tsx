import type { ReactNode } from 'react'
import { Mark } from './Mark'

/** The frame of the pages before one is signed in: a sheet with its title block. */
export function Door({ title, lead, children }: { title: string; lead?: ReactNode; children: ReactNode }) {
  return (
    <div className="mx-auto grid min-h-dvh max-w-lg content-center gap-6 px-4 py-10">
      <header className="flex items-center gap-2 font-bold tracking-tight">
        <Mark />
        Sectionwright
      </header>
      <main id="main" className="border border-hair bg-sheet px-5 py-6 md:px-8">
        <h1 className="text-2xl font-semibold tracking-tight">{title}</h1>
        {lead && <div className="mt-1 text-soft">{lead}</div>}
        <div className="mt-5">{children}</div>
      </main>
    </div>
  )
}
