import type { ReactNode } from 'react'

/** What a page says when it has nothing to show: what it is for, and what to do next. */
export function Empty({ title, children, action }: { title: string; children?: ReactNode; action?: ReactNode }) {
  return (
    <div className="border-y border-hair py-10">
      <p className="text-lg font-semibold">{title}</p>
      {children && <div className="mt-1 max-w-prose text-soft">{children}</div>}
      {action && <div className="mt-4 flex flex-wrap gap-2">{action}</div>}
    </div>
  )
}
