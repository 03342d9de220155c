'use client'
import { Button } from '@/components/ui/Button'
import type { Finding } from '@/lib/geometry/finding'
import type { PreviewResult } from '@/lib/jobs/browser-pool'
import type { FlowAction } from './flow/flow'
import { remediesOf } from './flow/remedies'

/** A finding picked on the picture, with its answers under it; gone once the drawing no longer gives it. */
export function Asked({
  finding,
  result,
  dispatch,
  onClose,
}: {
  finding: Finding | null
  result: PreviewResult
  dispatch: (action: FlowAction) => void
  onClose: () => void
}) {
  const stands =
    finding && result.answer.findings.find(({ code, message }) => code === finding.code && message === finding.message)
  if (!stands) return null
  return (
    <div role="status" className="border-hair border-t border-l-[3px] border-l-accent px-3 py-2 text-small">
      <p>{stands.message}</p>
      <div className="flex flex-wrap gap-2 pt-1">
        {remediesOf(stands, result).map(({ word, action }) => (
          <Button key={word} onClick={() => dispatch(action)}>
            {word}
          </Button>
        ))}
        <Button look="quiet" onClick={onClose}>
          Close
        </Button>
      </div>
    </div>
  )
}
