'use client'
import { useCallback, useMemo, useReducer, useState } from 'react'
import { Board } from '@/components/board/Board'
import { boardReducer, initialBoard } from '@/components/board/boardState'
import { outlinesWithin } from '@/components/board/hit'
import { createHover } from '@/components/board/hover'
import { placeInSection } from '@/components/board/regionModel'
import type { DrawingPoint } from '@/components/board/view'
import { sheetAround, zoneOf } from '@/components/board/zones'
import { BoardBoundary } from '@/components/sheet/BoardBoundary'
import { Cautions } from '@/components/sheet/Cautions'
import { writingOf } from '@/components/sheet/writing'
import { useMe } from '@/components/shell/Me'
import { toast } from '@/components/ui/toastStore'
import type { Material } from '@/lib/api/schemas/people'
import type { Finding } from '@/lib/geometry/finding'
import { mmPerUnit, type XY } from '@/lib/geometry/recipe'
import { Asked } from './Asked'
import { FileLine } from './FileLine'
import { detailAt, detailsOf, partOf } from './flow/groups'
import { missingOf } from './flow/missing'
import { LiveFigures } from './LiveFigures'
import { Panels } from './Panels'
import { Progress } from './Progress'
import { previewModel } from './previewModel'
import { Saved } from './Saved'
import { SavePanel } from './SavePanel'
import type { Target } from './target'
import { useFlowKeys } from './useFlowKeys'
import { useLeaving } from './useLeaving'
import { useUpload } from './useUpload'

/** From a file to a saved revision: the picture stays in view, every question stands beside it. */
export function UploadFlow({
  file,
  first,
  materials,
  onOther,
  onSaved,
  active = true,
}: {
  file: File
  first: Target
  materials: readonly Material[]
  /** another file instead */
  onOther: () => void
  onSaved?: () => void
  /** it is the one in view: keys are meant for it */
  active?: boolean
}) {
  const upload = useUpload(file, first, materials)
  const { target, setTarget, state, choices, dispatch, preview, ready, saving, problem, saved } = upload
  const { result } = preview
  const [board, boardDispatch] = useReducer(boardReducer, initialBoard)
  const [hover] = useState(createHover)
  const [picked, setPicked] = useState<string | null>(null)
  const [asked, setAsked] = useState<Finding | null>(null)
  const [made, setMade] = useState<ReadonlyMap<number, string>>(new Map())
  const { settings } = useMe().team
  const writing = useMemo(() => writingOf(settings), [settings])
  const model = useMemo(() => result && previewModel(result), [result])
  const details = useMemo(() => (result ? detailsOf(result, choices.frames) : []), [result, choices.frames])

  const missing = missingOf(choices, target, ready)
  const save = useCallback(async () => {
    if (await upload.save()) onSaved?.()
  }, [upload.save, onSaved])
  useFlowKeys({
    undo: useCallback(() => dispatch({ type: 'undo' }), [dispatch]),
    redo: useCallback(() => dispatch({ type: 'redo' }), [dispatch]),
    save: missing.length === 0 && !saving && !saved ? save : null,
    active,
  })

  useLeaving(state.history.past.length > 0 && !saved)

  const show = (at: XY, size: number) => {
    if (!result) return
    const { recipe } = result.answer
    boardDispatch({ do: 'goTo', at: placeInSection(at, result.answer), size: size * mmPerUnit(recipe) })
  }
  const pick = (id: string | null) => {
    setPicked(id)
    const taken = details.filter((detail) => detail.taken).length
    if (!id || details.length < 2 || taken === 1) return
    const detail = detailAt(details, Number(id.slice(1)) - 1)
    if (detail) dispatch({ type: 'set', change: { part: detail.part } })
  }
  const takeWindow = (a: DrawingPoint, b: DrawingPoint) => {
    if (!result || !model) return
    const part = partOf(
      result,
      outlinesWithin(model.outlines, a, b).map(({ id }) => id),
    )
    if (part.length === 0) toast('No outline lies wholly in that window. Draw it from corner to corner round all you want.')
    else dispatch({ type: 'set', change: { part } })
  }
  const further = () => {
    if (!saved || !result) return
    const taken = details.filter((detail) => detail.taken)
    setMade(new Map([...made, ...taken.map(({ number }) => [number, saved.number] as const)]))
    const { jobId, materialId } = next(target)
    setTarget({ kind: 'new', jobId, title: '', materialId })
    dispatch({ type: 'set', change: { part: choices.frames.length > 0 ? details.flatMap(({ part }) => part) : null } })
    upload.setSaved(null)
  }
  const left = details.filter((detail) => !detail.taken && !made.has(detail.number)).length

  return (
    <div className="grid items-start gap-5 lg:grid-cols-[minmax(0,1fr)_27rem]">
      <div className="lg:sticky lg:top-4">
        <FileLine file={file} state={state} dispatch={dispatch} onOther={onOther} />
        <LiveFigures section={result?.answer.section ?? null} hover={hover} />
        {model && result ? (
          <BoardBoundary>
            <Board
              model={model}
              state={board}
              dispatch={boardDispatch}
              hover={hover}
              writing={writing}
              label={`Preview of ${file.name}`}
              onPick={pick}
              onMark={(index) => setAsked(result.answer.findings[index] ?? null)}
              onWindow={takeWindow}
            >
              <Asked finding={asked} result={result} dispatch={dispatch} onClose={() => setAsked(null)} />
            </Board>
          </BoardBoundary>
        ) : (
          <div className="grid h-[22rem] place-content-center border border-hair bg-sheet text-soft md:h-[min(68vh,46rem)]">
            {preview.failure === null && !preview.cancelled && 'Reading the drawing …'}
          </div>
        )}
        <Progress
          stage={preview.stage}
          failure={preview.failure}
          cancelled={preview.cancelled}
          onCancel={preview.cancel}
          onRetry={preview.retry}
        />
      </div>
      <div>
        {result && (
          <Panels
            {...{ result, choices, details, made, hover, picked, dispatch }}
            measured={distance(board.points)}
            windowing={board.tool === 'window'}
            onWindow={() => boardDispatch({ do: 'tool', tool: 'window' })}
            zoneOf={(at) => (model ? zoneOf(sheetAround(model.extents), placeInSection(at, result.answer)) : '')}
            onShow={show}
          />
        )}
        {result?.answer.section && <Cautions answer={result.answer} />}
        {saved ? (
          <Saved revision={saved.revision} number={saved.number} further={left} onFurther={further} />
        ) : (
          <SavePanel
            {...{ state, choices, target, materials, missing, saving, problem, dispatch }}
            onTitle={(title) => target.kind === 'new' && setTarget({ ...target, title })}
            onSave={save}
            onCancel={upload.cancelSave}
          />
        )}
      </div>
    </div>
  )
}

const next = (target: Target) =>
  target.kind === 'new' ? target : { jobId: target.profile.job.id, materialId: target.profile.material?.id ?? null }

type Points = readonly { x: number; y: number }[]
const distance = ([a, b]: Points) => (a && b ? Math.hypot(b.x - a.x, b.y - a.y) : null)
