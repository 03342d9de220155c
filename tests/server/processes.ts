import { spawnSync } from 'node:child_process'
import { setTimeout as wait } from 'node:timers/promises'

/** The child processes of a process. */
export function childrenOf(pid: number): number[] {
  const { stdout } = spawnSync('ps', ['-A', '-o', 'pid=,ppid='], { encoding: 'utf8' })
  const rows = stdout
    .trim()
    .split('\n')
    .map((line) => line.trim().split(/\s+/).map(Number))
  return rows.filter(([, parent]) => parent === pid).map(([child]) => child)
}

const isAlive = (pid: number) => {
  try {
    process.kill(pid, 0)
    return true
  } catch {
    return false
  }
}

/** Those of the processes that are still there after so many seconds. */
export async function aliveAfter(pids: number[], seconds: number): Promise<number[]> {
  for (let k = 0; k < seconds * 10 && pids.some(isAlive); k++) await wait(100)
  return pids.filter(isAlive)
}
