'use client'
import { Button } from './Button'
import { classes } from './classes'
import { dismiss, useToasts } from './toastStore'

/** Where toasts appear; stands once in the app's frame. */
export function Toasts() {
  const toasts = useToasts()
  return (
    <section aria-label="Messages" aria-live="polite" className="fixed inset-x-4 bottom-4 z-20 grid justify-items-center gap-2">
      {toasts.map(({ id, text, tone, undo }) => (
        <div
          key={id}
          className={classes(
            'flex max-w-xl items-center gap-3 rounded border bg-sheet py-1 pr-1 pl-4',
            tone === 'error' ? 'border-brick' : 'border-ink',
          )}
        >
          <p className="flex-1">{text}</p>
          {undo && (
            <Button
              look="link"
              onClick={() => {
                dismiss(id)
                undo()
              }}
            >
              Undo
            </Button>
          )}
          <Button look="quiet" aria-label="Close message" onClick={() => dismiss(id)}>
            ×
          </Button>
        </div>
      ))}
    </section>
  )
}
