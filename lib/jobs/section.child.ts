import { readFileSync } from 'node:fs'
import { Worker } from 'node:worker_threads'
import { pack } from '../geometry/pack'
import { askOthers } from '../opinions/askOthers'
import type { JobReply, JobRequest } from './sectionJob'
import { readTask, sectionTask } from './tasks'
import { CELLS, DEADLINE, MEMORY, type WatchData } from './watch'

const watchData: WatchData = { cells: new SharedArrayBuffer(8 * CELLS), parent: process.ppid }
const limits = new Float64Array(watchData.cells)

const reply = (message: JobReply) => new Promise<void>((sent) => process.send?.(message, () => sent()))

function limit(seconds: number, memoryBytes: number): void {
  limits[MEMORY] = memoryBytes
  limits[DEADLINE] = seconds > 0 ? Date.now() + 1000 * seconds : 0
}

async function work({ id, job, seconds, opinionSeconds, memoryBytes }: JobRequest): Promise<void> {
  limit(seconds, memoryBytes)
  let bytes: Uint8Array
  try {
    bytes = readFileSync(job.path)
  } catch (error) {
    limit(0, 0)
    return reply({ id, stage: 'unreadable', message: String(error) })
  }
  const drawing = readTask(bytes)
  const task = sectionTask(drawing, job.source, job.recipe, job.materials)
  await reply({ id, stage: 'answer', answer: task.answer, region: task.region && pack(task.region) })
  limit(opinionSeconds, memoryBytes)
  await reply({ id, stage: 'opinions', opinions: askOthers(bytes, drawing, task) })
  limit(0, 0)
}

process.on('disconnect', () => process.exit(0))
process.on('message', (request: JobRequest) => void work(request))
new Worker(new URL('./watchdog.mjs', import.meta.url), { workerData: watchData }).unref()
