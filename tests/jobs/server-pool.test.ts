import { spawn } from 'node:child_process'
import { existsSync, readFileSync } from 'node:fs'
import { setTimeout as sleep } from 'node:timers/promises'
import { afterEach, beforeAll, describe, expect, it } from 'vitest'
import { DEFAULT_RECIPE } from '@/lib/geometry/recipe'
import type { SectionJob } from '@/lib/jobs/sectionJob'
import { createSectionPool, type PoolOptions, type SectionPool } from '@/lib/jobs/server-pool'
import { bundle } from '../support/bundle'

/** `name` tells the child how to behave, `ms` how long to compute. */
const job = (name: string, ms = 0): SectionJob => ({
  path: 'unused',
  source: { name, bytes: ms, sha256: '' },
  recipe: DEFAULT_RECIPE,
  materials: {},
})
const ann = { person: 'ann' }

let child = ''
let owner = ''
let pool: SectionPool

beforeAll(async () => {
  ;[child, owner] = await bundle('tests/jobs/odd.child.ts', 'tests/jobs/owner.ts', 'lib/jobs/watchdog.ts')
})
afterEach(() => pool.close())

function open(options: Partial<PoolOptions> = {}): SectionPool {
  pool = createSectionPool({ bundle: child, size: 1, seconds: 1, opinionSeconds: 1, memoryBytes: 400 * 1024 ** 2, ...options })
  return pool
}

async function pidOf(from: SectionPool, person = 'ann'): Promise<string> {
  const result = await from.run(job('plain'), { person })
  if (!result.ok) throw new Error(result.why)
  await result.opinions
  return result.answer.engineVersion
}

describe('the pool of child processes', () => {
  it('answers first and brings the second opinions after', async () => {
    const result = await open().run(job('plain'), ann)
    expect(result.ok && result.answer.source.name).toBe('plain')
    expect(result.ok && (await result.opinions)?.opinions[0].sentence).toBe('Agrees.')
  })

  it('keeps its child warm: two jobs, one process', async () => {
    open()
    expect(await pidOf(pool)).toBe(await pidOf(pool))
  })

  it.each([
    ['loop', 'time'],
    ['heap', 'memory'],
    ['buffers', 'memory'],
    ['exit', 'died'],
  ] as const)('a child that ends by "%s" is a failure "%s", and the next job gets a new child', async (name, why) => {
    open({ seconds: name === 'loop' ? 1 : 20 })
    const before = await pidOf(pool)
    expect(await pool.run(job(name), ann)).toEqual({ ok: false, why })
    expect(await pidOf(pool)).not.toBe(before)
  })

  it('a file that cannot be opened is "unreadable", and the child lives on', async () => {
    const before = await pidOf(open())
    expect(await pool.run(job('missing'), ann)).toEqual({ ok: false, why: 'unreadable' })
    expect(await pidOf(pool)).toBe(before)
  })

  it('second opinions over their time are dropped, the answer stands', async () => {
    const result = await open().run(job('slow opinions'), ann)
    expect(result.ok).toBe(true)
    expect(result.ok && (await result.opinions)).toBeNull()
  })

  it('an abort ends the running job at once and frees the child for the next', async () => {
    const control = new AbortController()
    const running = open({ seconds: 20 }).run(job('loop'), { person: 'ann', signal: control.signal })
    await sleep(100)
    control.abort()
    expect(await running).toEqual({ ok: false, why: 'aborted' })
    expect(await pidOf(pool)).not.toBe('')
  })

  it('an abort takes a waiting job out of the queue', async () => {
    const control = new AbortController()
    const first = open().run(job('plain', 300), ann)
    const second = pool.run(job('plain'), { person: 'ann', signal: control.signal })
    control.abort()
    expect(await second).toEqual({ ok: false, why: 'aborted' })
    expect((await first).ok).toBe(true)
  })

  it('refuses the third waiting job of one person, and still takes one of another', async () => {
    open()
    const runs = [0, 1, 2].map(() => pool.run(job('plain', 100), ann))
    expect(pool.hasRoomFor('ann')).toBe(false)
    expect(await pool.run(job('plain'), ann)).toEqual({ ok: false, why: 'queue' })
    expect(pool.hasRoomFor('ben')).toBe(true)
    expect((await Promise.all([...runs, pool.run(job('plain'), { person: 'ben' })])).map(({ ok }) => ok)).toEqual([
      true,
      true,
      true,
      true,
    ])
  })

  it('two children compute side by side, and people take turns', async () => {
    open({ size: 2, waitingPerPerson: 9 })
    const order: string[] = []
    const run = (person: string, name: string) => pool.run(job(name, 150), { person }).then(() => order.push(name))
    await Promise.all([run('ann', 'a1'), run('ben', 'b1'), run('ann', 'a2'), run('ann', 'a3'), run('eva', 'e1')])
    expect(order.indexOf('e1')).toBeLessThan(order.indexOf('a3'))
  })

  it('no orphan is left after SIGKILL to the parent while its child computes for ever', async () => {
    open()
    const parent = spawn(process.execPath, [owner, child], { stdio: ['ignore', 'pipe', 'inherit'] })
    const pid = await new Promise<number>((found) => parent.stdout.once('data', (data) => found(Number(String(data)))))
    expect(isAlive(pid)).toBe(true)
    parent.kill('SIGKILL')
    const deadline = Date.now() + 15_000
    while (isAlive(pid) && Date.now() < deadline) await sleep(50)
    expect(isAlive(pid)).toBe(false)
  })
})

/** False for a process that has ended and only waits to be collected by its new parent. */
function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0)
  } catch {
    return false
  }
  const stat = `/proc/${pid}/stat`
  return !existsSync(stat) || !readFileSync(stat, 'utf8').includes(') Z ')
}
