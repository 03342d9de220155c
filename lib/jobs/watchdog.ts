import { workerData } from 'node:worker_threads'
import { DEADLINE, MEMORY, type WatchData } from './watch'

const LOOK_EVERY_MS = 50

/**
 * Ends this whole process, from a thread of its own, when the work is over its deadline or its memory or when the
 * parent is gone: a busy computing thread hears neither messages nor timers. The signal tells the parent why.
 */
function watch({ cells, parent }: WatchData): void {
  const limits = new Float64Array(cells)
  setInterval(() => {
    if (process.ppid !== parent) process.kill(process.pid, 'SIGKILL')
    if (limits[DEADLINE] > 0 && Date.now() > limits[DEADLINE]) process.kill(process.pid, 'SIGALRM')
    if (limits[MEMORY] > 0 && process.memoryUsage.rss() > limits[MEMORY]) process.kill(process.pid, 'SIGVTALRM')
  }, LOOK_EVERY_MS)
}

watch(workerData as WatchData)
