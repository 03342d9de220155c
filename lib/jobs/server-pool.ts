import { type ChildProcess, fork } from 'node:child_process'
import { statSync } from 'node:fs'
import { availableParallelism } from 'node:os'
import path from 'node:path'
import { deferred, type Deferred } from './deferred'
import type { JobFailure, JobReply, JobResult, Opinions, SectionJob } from './sectionJob'

export interface PoolOptions {
  size: number
  seconds: number
  opinionSeconds: number
  memoryBytes: number
  /** how many jobs of one person may wait (running ones not counted) */
  waitingPerPerson: number
  /** the child's bundle */
  bundle: string
}

export interface RunOptions {
  person: string
  signal?: AbortSignal
}

/** Runs section jobs off the event loop. The server knows nothing else of how they are run. */
export interface SectionPool {
  run(job: SectionJob, options: RunOptions): Promise<JobResult>
  /** false when one more job of this person would be refused: ask before a body is taken in */
  hasRoomFor(person: string): boolean
  /** starts the children so that the first job finds one warm */
  warm(): void
  close(): Promise<void>
}

interface Waiting {
  id: number
  job: SectionJob
  person: string
  answer: Deferred<JobResult>
  opinions: Deferred<Opinions | null>
  answered: boolean
  why: JobFailure | null
}

interface Slot {
  child: ChildProcess
  built: number
  item: Waiting | null
  timer: NodeJS.Timeout | null
}

/** Signals by which the child's own watchdog tells what it ended for. */
const WHY: Partial<Record<NodeJS.Signals, JobFailure>> = { SIGALRM: 'time', SIGVTALRM: 'memory', SIGABRT: 'memory' }
/** The child ends itself on time; this much later its parent does it. */
const GRACE_SECONDS = 3

export const defaultPoolOptions = (): PoolOptions => ({
  size: availableParallelism() >= 4 ? 2 : 1,
  seconds: 30,
  opinionSeconds: 10,
  memoryBytes: 1.5 * 1024 ** 3,
  waitingPerPerson: 2,
  bundle: path.join(/* turbopackIgnore: true */ process.cwd(), 'dist-worker', 'section.child.mjs'),
})

export function createSectionPool(given: Partial<PoolOptions> = {}): SectionPool {
  const options = { ...defaultPoolOptions(), ...given }
  const waiting: Waiting[] = []
  const slots: Slot[] = []
  const servedAt = new Map<string, number>()
  let turns = 0
  let lastId = 0
  let closed = false

  const builtAt = () => statSync(options.bundle, { throwIfNoEntry: false })?.mtimeMs ?? 0

  function startSlot(): Slot {
    // next dev's own flags must not reach the child
    const { NODE_OPTIONS: _, ...env } = process.env
    const child = fork(options.bundle, {
      serialization: 'advanced',
      execArgv: [`--max-old-space-size=${Math.round(options.memoryBytes / 1024 ** 2)}`],
      env,
      stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
    })
    const slot: Slot = { child, built: builtAt(), item: null, timer: null }
    slots.push(slot)
    child.on('message', (reply: JobReply) => onReply(slot, reply))
    child.on('error', () => child.kill('SIGKILL'))
    child.on('exit', (_code, signal) => onExit(slot, signal))
    holdProcess(slot, false)
    return slot
  }

  /** An idle child must not keep its parent from ending. */
  function holdProcess({ child }: Slot, hold: boolean): void {
    if (hold) {
      child.ref()
      child.channel?.ref()
    } else {
      child.unref()
      child.channel?.unref()
    }
  }

  function onReply(slot: Slot, reply: JobReply): void {
    const { item } = slot
    if (!item || reply.id !== item.id) return
    if (reply.stage === 'answer') {
      item.answered = true
      item.answer.resolve({ ok: true, answer: reply.answer, region: reply.region, opinions: item.opinions.promise })
      limitTime(slot, options.opinionSeconds)
      return
    }
    if (reply.stage === 'unreadable') settle(item, 'unreadable')
    else item.opinions.resolve(reply.opinions)
    release(slot)
    pump()
  }

  function onExit(slot: Slot, signal: NodeJS.Signals | null): void {
    slots.splice(slots.indexOf(slot), 1)
    const { item } = slot
    release(slot)
    if (item) settle(item, item.why ?? (signal && WHY[signal]) ?? 'died')
    // a warm one stands ready for the next job
    if (item && !closed) startSlot()
    pump()
  }

  function settle(item: Waiting, why: JobFailure): void {
    item.answer.resolve({ ok: false, why })
    item.opinions.resolve(null)
  }

  function release(slot: Slot): void {
    if (slot.timer) clearTimeout(slot.timer)
    slot.timer = null
    slot.item = null
    holdProcess(slot, false)
  }

  function limitTime(slot: Slot, seconds: number): void {
    if (slot.timer) clearTimeout(slot.timer)
    slot.timer = setTimeout(() => stop(slot, 'time'), (seconds + GRACE_SECONDS) * 1000)
    slot.timer.unref()
  }

  function stop(slot: Slot, why: JobFailure): void {
    if (slot.item) slot.item.why = why
    slot.child.kill('SIGKILL')
  }

  /** People take turns: whoever was served longest ago comes next. */
  function nextWaiting(): Waiting | undefined {
    const turn = ({ person }: Waiting) => servedAt.get(person) ?? 0
    const next = waiting.reduce<Waiting | undefined>((best, item) => (!best || turn(item) < turn(best) ? item : best), undefined)
    if (next) {
      waiting.splice(waiting.indexOf(next), 1)
      servedAt.set(next.person, ++turns)
    }
    return next
  }

  function idleSlot(): Slot | undefined {
    for (const slot of slots.filter((each) => !each.item && each.built !== builtAt())) slot.child.kill('SIGKILL')
    return (
      slots.find((slot) => !slot.item && slot.child.connected && !slot.child.killed) ??
      (slots.filter((slot) => !slot.child.killed).length < options.size ? startSlot() : undefined)
    )
  }

  function pump(): void {
    while (!closed && waiting.length > 0) {
      const slot = idleSlot()
      if (!slot) return
      const item = nextWaiting()
      if (!item) return
      slot.item = item
      holdProcess(slot, true)
      limitTime(slot, options.seconds)
      const { seconds, opinionSeconds, memoryBytes } = options
      slot.child.send({ id: item.id, job: item.job, seconds, opinionSeconds, memoryBytes }, (error) => {
        if (error) stop(slot, 'died')
      })
    }
  }

  function abort(item: Waiting): void {
    const at = waiting.indexOf(item)
    if (at >= 0) {
      waiting.splice(at, 1)
      settle(item, 'aborted')
      return
    }
    const slot = slots.find((each) => each.item === item)
    if (slot && !item.answered) stop(slot, 'aborted')
  }

  const running = () => slots.filter((slot) => slot.item).length
  const hasRoomFor = (person: string) =>
    running() < options.size || waiting.filter((item) => item.person === person).length < options.waitingPerPerson

  return {
    hasRoomFor,
    async run(job, { person, signal }) {
      if (closed || signal?.aborted) return { ok: false, why: 'aborted' }
      if (!hasRoomFor(person)) return { ok: false, why: 'queue' }
      const item: Waiting = {
        id: ++lastId,
        job,
        person,
        answer: deferred(),
        opinions: deferred(),
        answered: false,
        why: null,
      }
      waiting.push(item)
      const onAbort = () => abort(item)
      signal?.addEventListener('abort', onAbort, { once: true })
      pump()
      const result = await item.answer.promise
      signal?.removeEventListener('abort', onAbort)
      return result
    },
    warm() {
      while (slots.length < options.size) startSlot()
    },
    async close() {
      closed = true
      for (const item of waiting.splice(0)) settle(item, 'aborted')
      await Promise.all(
        slots.map((slot) => {
          const gone = new Promise((resolve) => slot.child.once('exit', resolve))
          holdProcess(slot, true)
          stop(slot, 'aborted')
          return gone
        }),
      )
    },
  }
}

const shared = globalThis as typeof globalThis & { sectionPool?: SectionPool }

/** The one pool of this process; it survives the dev server's reloads. Options count at the first call. */
export function sectionPool(options: Partial<PoolOptions> = {}): SectionPool {
  shared.sectionPool ??= createSectionPool(options)
  return shared.sectionPool
}
