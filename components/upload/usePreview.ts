'use client'
import { useCallback, useEffect, useMemo, useRef, useState } from 'react'
import type { Recipe } from '@/lib/geometry/recipe'
import type { UsedMaterial } from '@/lib/jobs/answer'
import type { Preview, PreviewResult, Stage } from '@/lib/jobs/browser-pool'

interface Seen {
  /** the newest answer; older ones stay in view while the next is worked on */
  result: PreviewResult | null
  /** what is being done, null when nothing is */
  stage: Stage | null
  /** the worker failed: a fault of the product */
  failure: string | null
  cancelled: boolean
}
const NOTHING: Seen = { result: null, stage: 'read', failure: null, cancelled: false }

/** The section of this file with this recipe, from the browser's worker; asked again at every change. */
export function usePreview(file: File, recipe: Recipe, materials: Record<string, UsedMaterial>) {
  const [seen, setSeen] = useState<Seen>(NOTHING)
  const [preview, setPreview] = useState<Preview | null>(null)
  const stopped = useRef(false)
  // cancelled before the worker was there, or by a person: nothing is asked until they say so
  const held = useRef(false)

  useEffect(() => {
    let opened: Preview | null = null
    stopped.current = false
    held.current = false
    setSeen(NOTHING)
    import('@/lib/jobs/browser-pool').then(({ openPreview }) => {
      if (stopped.current) return
      opened = openPreview(file, {
        onResult: (result) => setSeen({ result, stage: null, failure: null, cancelled: false }),
        onProgress: (stage) => setSeen((now) => ({ ...now, stage, failure: null, cancelled: false })),
        onFailure: (failure) => setSeen((now) => ({ ...now, stage: null, failure })),
      })
      setPreview(opened)
    })
    return () => {
      stopped.current = true
      opened?.close()
      setPreview(null)
    }
  }, [file])

  const ask = useCallback(() => preview?.ask(recipe, materials), [preview, recipe, materials])
  useEffect(() => {
    if (!held.current) ask()
  }, [ask])

  const cancel = useCallback(() => {
    held.current = true
    preview?.cancel()
    setSeen((now) => ({ ...now, stage: null, cancelled: true }))
  }, [preview])
  const retry = useCallback(() => {
    held.current = false
    setSeen((now) => ({ ...now, stage: 'read', failure: null, cancelled: false }))
    ask()
  }, [ask])
  return useMemo(() => ({ ...seen, cancel, retry }), [seen, cancel, retry])
}
