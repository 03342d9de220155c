import type { ReactNode } from 'react'

/** The head of a page: number, title, what belongs beside it, and its actions at the right. */
export function PageHead({
  number,
  title,
  beside,
  actions,
}: {
  number?: string
  title: ReactNode
  beside?: ReactNode
  actions?: ReactNode
}) {
  return (
    <div className="flex flex-wrap items-baseline gap-x-4 gap-y-2 pt-4 pb-3">
      {number && <span className="font-mono text-soft">{number}</span>}
      <h1 className="text-2xl font-semibold leading-tight tracking-tight">{title}</h1>
      {beside}
      {actions && <div className="ml-auto flex flex-wrap gap-2 max-md:ml-0 max-md:w-full max-md:*:flex-1">{actions}</div>}
    </div>
  )
}
