import { type EdgeTable, pushCopy, pushLine } from './edges'
import { loopArea } from './edgeArea'
import { reverseEdge } from './reverseEdge'

function emitStep(to: EdgeTable, from: EdgeTable, step: number): number {
  const i = pushCopy(to, from, step >> 1)
  if (step & 1) reverseEdge(to, i)
  return i
}

/** A straight edge from the end of edge i to the beginning of edge j, where they do not meet. */
function bridge(to: EdgeTable, i: number, j: number): void {
  const e = to.ends
  if (e[4 * i + 2] !== e[4 * j] || e[4 * i + 3] !== e[4 * j + 1])
    pushLine(to, e[4 * i + 2], e[4 * i + 3], e[4 * j], e[4 * j + 1], to.source[i])
}

function bridgeBefore(to: EdgeTable, from: EdgeTable, i: number, step: number): void {
  const e = to.ends
  const at = 4 * (step >> 1) + 2 * (step & 1)
  const x = from.ends[at]
  const y = from.ends[at + 1]
  if (e[4 * i + 2] !== x || e[4 * i + 3] !== y) pushLine(to, e[4 * i + 2], e[4 * i + 3], x, y, to.source[i])
}

/** Appends edges in walking order; step 2k walks row k forward, 2k + 1 backward. Gaps are bridged. */
export function emitChain(to: EdgeTable, from: EdgeTable, steps: ArrayLike<number>, count: number): void {
  let last = -1
  for (let s = 0; s < count; s++) {
    if (last >= 0) bridgeBefore(to, from, last, steps[s])
    last = emitStep(to, from, steps[s])
  }
}

/**
 * Appends a closed walk as a counter-clockwise loop that begins with its first step's edge. Its area, negative where the
 * walk had to be turned round.
 */
export function emitLoop(to: EdgeTable, from: EdgeTable, steps: ArrayLike<number>, count: number): number {
  const first = to.count
  const shapes = to.shapesUsed
  emitChain(to, from, steps, count)
  bridge(to, to.count - 1, first)
  const area = loopArea(to, first, to.count)
  if (area >= 0) return area
  to.count = first
  to.shapesUsed = shapes
  let last = -1
  for (let s = 0; s < count; s++) {
    const step = steps[(count - s) % count] ^ 1
    if (last >= 0) bridgeBefore(to, from, last, step)
    last = emitStep(to, from, step)
  }
  bridge(to, to.count - 1, first)
  return -loopArea(to, first, to.count)
}
