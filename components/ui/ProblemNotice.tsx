import type { ReactNode } from 'react'
import { Notice } from './Notice'
import type { Problem } from './problem'

/** Says what went wrong, with the request id for whoever runs the server. */
export function ProblemNotice({ problem, children }: { problem: Problem | null; children?: ReactNode }) {
  if (!problem) return null
  return (
    <Notice tone="error" live>
      <p>{problem.sentence}</p>
      {children}
      {problem.requestId && <p className="text-small text-soft">Request {problem.requestId}</p>}
    </Notice>
  )
}
