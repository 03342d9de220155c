import type { Recipe } from '../geometry/recipe'
import type { UsedMaterial } from './answer'
import type { PreviewReply, PreviewRequest, PreviewResult, Stage } from './previewProtocol'

export type { DrawingView, PreviewResult, Role, Stage } from './previewProtocol'

export interface PreviewHandlers {
  /** twice for a recipe: all figures but those of finite elements, then with them */
  onResult: (result: PreviewResult, seq: number) => void
  onProgress: (stage: Stage) => void
  /** the worker itself failed: an error of the product, never of the drawing */
  onFailure: (message: string) => void
}

export interface Preview {
  /** asks for the section of this recipe and returns its number; answers to earlier recipes are dropped */
  ask: (recipe: Recipe, materials?: Record<string, UsedMaterial>) => number
  /** ends the running work at once; the next recipe starts afresh */
  cancel: () => void
  close: () => void
}

const newWorker = () => new Worker(new URL('./preview.worker.ts', import.meta.url), { type: 'module' })

/** A worker that has nothing to do: its script is loaded, and warm where it has read a drawing before. */
let spare: Worker | null = null
/** Numbers of recipes are never used twice, so that a late answer is nobody else's. */
let asked = 0

/** Starts a worker before there is a file, so that the first drawing does not wait for its script. */
export function warmPreview(): void {
  if (spare) return
  spare = newWorker()
  spare.onerror = () => {
    spare = null
  }
}

/** A worker that keeps one file and its drawing, and answers recipes on it. */
export function openPreview(file: File, { onResult, onProgress, onFailure }: PreviewHandlers): Preview {
  let worker: Worker | null = null
  let seq = 0
  let busy = false

  function onMessage({ data }: MessageEvent<PreviewReply>): void {
    if (data.seq !== seq) return
    if (data.stage === 'done' || data.stage === 'failed') busy = false
    if (data.stage === 'done') onResult(data.result, data.seq)
    else if (data.stage === 'failed') onFailure(data.result.message)
    else {
      if (data.result) onResult(data.result, data.seq)
      onProgress(data.stage)
    }
  }

  function started(): Worker {
    const fresh = spare ?? newWorker()
    spare = null
    fresh.onmessage = onMessage
    fresh.onerror = (event) => {
      stop()
      onFailure(event.message || 'The worker stopped.')
    }
    post(fresh, { kind: 'open', file, name: file.name })
    return fresh
  }

  const post = (to: Worker, request: PreviewRequest) => to.postMessage(request)

  function release(): Worker | null {
    seq = ++asked
    const ended = worker
    if (ended) {
      // ended while its script loads, a worker reports a fault that is none
      ended.onmessage = null
      ended.onerror = null
    }
    worker = null
    return ended
  }

  function stop(): void {
    release()?.terminate()
  }

  function close(): void {
    if (busy || spare) stop()
    else spare = release()
  }

  return {
    ask(recipe, materials = {}) {
      seq = ++asked
      busy = true
      worker ??= started()
      post(worker, { kind: 'recipe', seq, recipe, materials })
      return seq
    },
    cancel: stop,
    close,
  }
}
