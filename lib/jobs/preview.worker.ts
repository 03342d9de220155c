import { buffersOf, previewOf } from './preview'
import type { PreviewReply, PreviewRequest } from './previewProtocol'
import { createTask, readTask, type SectionTask } from './tasks'

const page = self as DedicatedWorkerGlobalScope
const send = (reply: PreviewReply, moved: Transferable[] = []) => page.postMessage(reply, moved)

type RecipeRequest = Extract<PreviewRequest, { kind: 'recipe' }>

let file: { blob: Blob; name: string } | null = null
let task: SectionTask | null = null
let wanted: RecipeRequest | null = null

async function opened(seq: number, { blob, name }: { blob: Blob; name: string }): Promise<SectionTask> {
  send({ seq, stage: 'read', result: null })
  const bytes = new Uint8Array(await blob.arrayBuffer())
  // no secure context over plain http: the server takes the hash
  return createTask(readTask(bytes), { name, bytes: bytes.length, sha256: '' })
}

/** Works on the newest recipe only: those that came meanwhile replace each other. */
async function work(): Promise<void> {
  const request = wanted
  wanted = null
  if (!request || !file) return
  const { seq, recipe, materials } = request
  const isDone = await guarded(seq, async (from) => {
    task ??= await opened(seq, from)
    const result = previewOf(
      task,
      recipe,
      materials,
      (stage) => stage !== 'torsion' && send({ seq, stage, result: null }),
      'first',
    )
    send({ seq, stage: 'torsion', result }, buffersOf(result))
  })
  // a timer lets a newer recipe come before the slow part
  if (isDone) setTimeout(() => !wanted && finish(request))
}

/** The same answer with torsion and shear figures. */
async function finish({ seq, recipe, materials }: RecipeRequest): Promise<void> {
  await guarded(seq, async () => {
    if (!task) return
    const result = previewOf(task, recipe, materials, () => {})
    send({ seq, stage: 'done', result }, buffersOf(result))
  })
}

async function guarded(seq: number, run: (from: { blob: Blob; name: string }) => Promise<void>): Promise<boolean> {
  try {
    if (file) await run(file)
    return true
  } catch (error) {
    send({ seq, stage: 'failed', result: { message: error instanceof Error ? error.message : String(error) } })
    return false
  }
}

page.onmessage = ({ data }: MessageEvent<PreviewRequest>) => {
  if (data.kind === 'open') {
    file = { blob: data.file, name: data.name }
    task = null
    return
  }
  wanted = data
  // a timer lets the messages that already wait come first
  setTimeout(work)
}
