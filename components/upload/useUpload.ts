'use client'
import { useCallback, useEffect, useMemo, useReducer, useRef, useState } from 'react'
import { addProfile } from '@/components/jobs/data'
import { type Problem, problemOf } from '@/components/ui/problem'
import { refresh } from '@/lib/api/client'
import { keys } from '@/lib/api/keys'
import type { Material } from '@/lib/api/schemas/people'
import type { Revision } from '@/lib/api/schemas/revision'
import { choicesOf, flow, startFlow } from './flow/flow'
import { startUnit } from './flow/startUnit'
import { revisionFields, uploader } from './save'
import type { Target } from './target'
import { usePreview } from './usePreview'

interface Kept {
  revision: Revision
  number: string
}
const isAbort = (error: unknown) => error instanceof DOMException && error.name === 'AbortError'

/** One file on its way to a saved revision: choices, preview, save. */
export function useUpload(file: File, first: Target, materials: readonly Material[]) {
  const [target, setTarget] = useState(first)
  const [state, dispatch] = useReducer(flow, null, () =>
    startFlow({ material: first.kind === 'profile' ? (first.profile.material?.id ?? null) : first.materialId }),
  )
  const choices = choicesOf(state)
  const table = useMemo(() => Object.fromEntries(materials.map((material) => [material.id, material])), [materials])
  const preview = usePreview(file, choices.recipe, table)
  const { result, stage } = preview

  const unit = result && startUnit(result.drawing)
  useEffect(() => {
    if (unit !== null) dispatch({ type: 'begin', unit })
  }, [unit])

  const upload = useRef(uploader())
  const running = useRef<AbortController | null>(null)
  const [saving, setSaving] = useState(false)
  const [problem, setProblem] = useState<Problem | null>(null)
  const [saved, setSaved] = useState<Kept | null>(null)
  const ready = stage === null && result?.answer.section !== null && result !== null

  /** true where it was saved */
  const save = useCallback(async (): Promise<boolean> => {
    const section = result?.answer.section
    if (!section) return false
    const controller = new AbortController()
    running.current = controller
    setSaving(true)
    setProblem(null)
    try {
      const profile = await profileFor(target, choices.recipe.material)
      setTarget({ kind: 'profile', profile })
      const revision = await upload.current(
        {
          profileId: profile.id,
          file,
          sha256: saved?.revision.file.sha256 ?? null,
          recipe: choices.recipe,
          fields: revisionFields(state, choices, section),
        },
        controller.signal,
      )
      setSaved({ revision, number: profile.number })
      await refresh(keys.profiles())
      return true
    } catch (error) {
      if (!isAbort(error)) setProblem(problemOf(error))
      return false
    } finally {
      setSaving(false)
    }
  }, [result, target, choices, state, file, saved])

  const cancelSave = useCallback(() => running.current?.abort(), [])
  return { target, setTarget, state, choices, dispatch, preview, ready, save, saving, cancelSave, problem, saved, setSaved }
}

const profileFor = async (target: Target, materialId: string | null) =>
  target.kind === 'profile'
    ? target.profile
    : addProfile({ jobId: target.jobId, title: target.title.trim(), materialId, drawingNumber: '' })
