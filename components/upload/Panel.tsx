import type { ReactNode } from 'react'

/** One question of the flow: its heading, where it stands, and what there is to choose. */
export function Panel({
  title,
  state,
  open = true,
  children,
}: {
  title: string
  state?: ReactNode
  open?: boolean
  children: ReactNode
}) {
  return (
    <details open={open} className="group border-t border-hair">
      <summary className="target flex items-center gap-3 py-1">
        <span aria-hidden="true" className="text-soft text-tiny group-open:rotate-90">
          ▶
        </span>
        <h2 className="font-semibold">{title}</h2>
        {state && <span className="ml-auto text-right text-small text-soft">{state}</span>}
      </summary>
      <div className="pb-3">{children}</div>
    </details>
  )
}
