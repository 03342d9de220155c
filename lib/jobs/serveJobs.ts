import { Worker } from 'node:worker_threads'
import type { JobReply, JobRequest, Opinions, SectionJob } from './sectionJob'
import { CELLS, DEADLINE, MEMORY, type WatchData } from './watch'

type Answer = Omit<Extract<JobReply, { stage: 'answer' }>, 'id' | 'stage'>

/** The two halves of a job: the answer, and what is asked after it has left. */
export type Work = (job: SectionJob) => { answer: Answer; opinions: () => Opinions } | { unreadable: string }

/**
 * Serves jobs from the parent process, one at a time, under a watchdog in a thread of its own: over time, over memory
 * or without its parent this process ends. The bundle `watchdog.mjs` lies beside the caller's.
 */
export function serveJobs(work: Work, watchdog: URL): void {
  const watchData: WatchData = { cells: new SharedArrayBuffer(8 * CELLS), parent: process.ppid }
  const limits = new Float64Array(watchData.cells)
  const limit = (seconds: number, memoryBytes: number) => {
    limits[MEMORY] = memoryBytes
    limits[DEADLINE] = seconds > 0 ? Date.now() + 1000 * seconds : 0
  }
  const reply = (message: JobReply) => new Promise<void>((sent) => process.send?.(message, () => sent()))

  async function serve({ id, job, seconds, opinionSeconds, memoryBytes }: JobRequest): Promise<void> {
    limit(seconds, memoryBytes)
    const done = work(job)
    if ('unreadable' in done) await reply({ id, stage: 'unreadable', message: done.unreadable })
    else {
      await reply({ id, stage: 'answer', ...done.answer })
      limit(opinionSeconds, memoryBytes)
      await reply({ id, stage: 'opinions', opinions: done.opinions() })
    }
    limit(0, 0)
  }

  process.on('disconnect', () => process.exit(0))
  process.on('message', (request: JobRequest) => void serve(request))
  new Worker(watchdog, { workerData: watchData }).unref()
}
