import { useEffect, useState } from 'react'
import { type Choice, parsed } from '@/lib/api/client'
import type { Problem } from './problem'

/** The row as somebody else left it, where a change came too late; `choice` stands outside the component. */
export function useCurrent<T>(problem: Problem | null, choice: Choice<T>): T | undefined {
  const [row, setRow] = useState<T>()
  useEffect(() => {
    setRow(undefined)
    if (problem?.code === 'stale') parsed(choice, problem.current).then(setRow, () => undefined)
  }, [problem, choice])
  return row
}
