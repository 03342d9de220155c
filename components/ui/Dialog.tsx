'use client'
import { type ReactNode, Suspense, useEffect, useId, useRef } from 'react'
import { Button } from './Button'

/** A modal dialog; the browser's own element keeps focus inside and gives it back. What it shows may be loaded when it opens. */
export function Dialog({
  title,
  open,
  onClose,
  children,
}: {
  title: string
  open: boolean
  onClose: () => void
  children: ReactNode
}) {
  const dialog = useRef<HTMLDialogElement>(null)
  const id = useId()
  useEffect(() => {
    if (open && !dialog.current?.open) dialog.current?.showModal()
    if (!open) dialog.current?.close()
  }, [open])
  return (
    <dialog
      ref={dialog}
      aria-labelledby={id}
      // the event comes late: the dialog may be open again by then
      onClose={() => dialog.current?.open || onClose()}
      className="m-auto w-full max-w-xl rounded border border-hair bg-sheet p-0 text-ink backdrop:bg-black/40"
    >
      {open && (
        <>
          <div className="flex items-center justify-between gap-4 border-b border-line py-2 pr-2 pl-5">
            <h2 id={id} className="font-semibold text-lg">
              {title}
            </h2>
            <Button look="quiet" shortcut="Escape" title="Close" aria-label="Close" onClick={onClose}>
              ×
            </Button>
          </div>
          <div className="min-h-24 p-5">
            <Suspense>{children}</Suspense>
          </div>
        </>
      )}
    </dialog>
  )
}
