import { Button } from '@/components/ui/Button'

/** How many there are, and the way to the next page; back is the browser's own. */
export function Pager({
  shown,
  total,
  noun,
  onFirst,
  onNext,
}: {
  shown: number
  total: number
  noun: string
  onFirst: (() => void) | null
  onNext: (() => void) | null
}) {
  return (
    <div className="flex items-center gap-2 py-2 text-small text-soft">
      <p className="mr-auto" aria-live="polite">
        {shown === total ? `${total} ${noun}` : `${shown} of ${total} ${noun}`}
      </p>
      {onFirst && (
        <Button look="quiet" onClick={onFirst}>
          First page
        </Button>
      )}
      {onNext && <Button onClick={onNext}>Next page</Button>}
    </div>
  )
}
