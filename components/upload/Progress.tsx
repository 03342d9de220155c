'use client'
import { Button } from '@/components/ui/Button'
import { Notice } from '@/components/ui/Notice'
import type { Stage } from '@/lib/jobs/browser-pool'

const STAGES: { stage: Stage; word: string }[] = [
  { stage: 'read', word: 'Reading the file' },
  { stage: 'chain', word: 'Joining edges into outlines' },
  { stage: 'combine', word: 'Combining outlines' },
  { stage: 'figures', word: 'Computing figures' },
  { stage: 'torsion', word: 'Bounding the torsion constant' },
]

/** What the worker does at the moment; long work can be cancelled and taken up again. */
export function Progress({
  stage,
  failure,
  cancelled,
  onCancel,
  onRetry,
}: {
  stage: Stage | null
  failure: string | null
  cancelled: boolean
  onCancel: () => void
  onRetry: () => void
}) {
  if (failure !== null || cancelled) {
    return (
      <Notice tone={failure === null ? 'asked' : 'error'} live>
        <p>
          {failure === null ? 'Cancelled. What you chose is kept.' : `The preview failed: ${failure} What you chose is kept.`}
        </p>
        <Button onClick={onRetry}>Go on</Button>
      </Notice>
    )
  }
  const at = STAGES.findIndex((row) => row.stage === stage)
  return (
    <div className="flex min-h-12 items-center gap-3 text-small text-soft" aria-live="polite">
      {at >= 0 && (
        <>
          <progress max={STAGES.length} value={at + 0.5} aria-label="Progress" className="w-40 accent-accent" />
          <span>{STAGES[at].word} …</span>
          <Button look="quiet" onClick={onCancel}>
            Cancel
          </Button>
        </>
      )}
    </div>
  )
}
