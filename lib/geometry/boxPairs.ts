/** Children of a node, and boxes in a run. */
const WIDTH = 8

/** Distance along a Hilbert curve over a 2¹⁵ × 2¹⁵ grid (Hacker's Delight, from memory). */
function hilbert(x: number, y: number): number {
  let d = 0
  for (let s = 1 << 14; s > 0; s >>= 1) {
    const rx = x & s ? 1 : 0
    const ry = y & s ? 1 : 0
    d = (d << 2) | ((3 * rx) ^ ry)
    if (ry === 0) {
      if (rx === 1) {
        x = ~x & 0x7fff
        y = ~y & 0x7fff
      }
      const kept = x
      x = y
      y = kept
    }
  }
  return d
}

/** Boxes (four numbers each) sorted along a Hilbert curve. */
function hilbertOrder(boxes: Float64Array, count: number): Uint32Array {
  let minX = Number.POSITIVE_INFINITY
  let minY = Number.POSITIVE_INFINITY
  let maxX = Number.NEGATIVE_INFINITY
  let maxY = Number.NEGATIVE_INFINITY
  for (let j = 0; j < 4 * count; j += 4) {
    minX = Math.min(minX, boxes[j])
    minY = Math.min(minY, boxes[j + 1])
    maxX = Math.max(maxX, boxes[j + 2])
    maxY = Math.max(maxY, boxes[j + 3])
  }
  const toX = 0x7fff / (maxX - minX || 1)
  const toY = 0x7fff / (maxY - minY || 1)
  const slots = 2 ** 23
  const keys = new Float64Array(count)
  for (let i = 0; i < count; i++) {
    const x = (0.5 * (boxes[4 * i] + boxes[4 * i + 2]) - minX) * toX
    const y = (0.5 * (boxes[4 * i + 1] + boxes[4 * i + 3]) - minY) * toY
    keys[i] = hilbert(x, y) * slots + i
  }
  keys.sort()
  const order = new Uint32Array(count)
  for (let i = 0; i < count; i++) order[i] = keys[i] - slots * Math.floor(keys[i] / slots)
  return order
}

const near = (boxes: Float64Array, i: number, j: number, reach: number): boolean =>
  boxes[4 * j] <= boxes[4 * i + 2] + reach &&
  boxes[4 * j + 2] >= boxes[4 * i] - reach &&
  boxes[4 * j + 1] <= boxes[4 * i + 3] + reach &&
  boxes[4 * j + 3] >= boxes[4 * i + 1] - reach

/** Runs of up to eight boxes, each near the one before, as the edges of a loop are: the first of each run, and the count at the end. */
function runsOf(boxes: Float64Array, count: number, reach: number): Uint32Array {
  const start = new Uint32Array(count + 1)
  let runs = 0
  for (let i = 0; i < count; i++) if (i === 0 || i - start[runs - 1] === WIDTH || !near(boxes, i - 1, i, reach)) start[runs++] = i
  start[runs] = count
  return start.subarray(0, runs + 1)
}

/** The box round boxes from … to − 1, written to `out` as its n-th. */
function unite(boxes: Float64Array, from: number, to: number, out: Float64Array, n: number): void {
  let minX = boxes[4 * from]
  let minY = boxes[4 * from + 1]
  let maxX = boxes[4 * from + 2]
  let maxY = boxes[4 * from + 3]
  for (let b = 4 * from + 4; b < 4 * to; b += 4) {
    if (boxes[b] < minX) minX = boxes[b]
    if (boxes[b + 1] < minY) minY = boxes[b + 1]
    if (boxes[b + 2] > maxX) maxX = boxes[b + 2]
    if (boxes[b + 3] > maxY) maxY = boxes[b + 3]
  }
  out[4 * n] = minX
  out[4 * n + 1] = minY
  out[4 * n + 2] = maxX
  out[4 * n + 3] = maxY
}

/** Levels of boxes, leaves first: level n + 1 holds the union of each eight of level n. */
function levelsOf(boxes: Float64Array, order: Uint32Array): Float64Array[] {
  let level = new Float64Array(4 * order.length)
  for (let i = 0; i < order.length; i++) unite(boxes, order[i], order[i] + 1, level, i)
  const levels = [level]
  while (level.length > 4) {
    const below = level
    const n = below.length / 4
    level = new Float64Array(4 * Math.ceil(n / WIDTH))
    for (let p = 0; 4 * p < level.length; p++) unite(below, WIDTH * p, Math.min(n, WIDTH * (p + 1)), level, p)
    levels.push(level)
  }
  return levels
}

/** Visits the pairs of boxes within run a, or between runs a and b; false where the visitor has had enough. */
function joinRuns(
  boxes: Float64Array,
  start: Uint32Array,
  runBoxes: Float64Array,
  a: number,
  b: number,
  reach: number,
  visit: (i: number, j: number) => boolean,
): boolean {
  const lastA = start[a + 1]
  const lastB = start[b + 1]
  for (let i = start[a]; i < lastA; i++) {
    const minX = boxes[4 * i] - reach
    const minY = boxes[4 * i + 1] - reach
    const maxX = boxes[4 * i + 2] + reach
    const maxY = boxes[4 * i + 3] + reach
    if (runBoxes[4 * b] > maxX || runBoxes[4 * b + 2] < minX || runBoxes[4 * b + 1] > maxY || runBoxes[4 * b + 3] < minY) continue
    for (let j = a === b ? i + 1 : start[b]; j < lastB; j++) {
      if (boxes[4 * j] > maxX || boxes[4 * j + 2] < minX || boxes[4 * j + 1] > maxY || boxes[4 * j + 3] < minY) continue
      if (!visit(i, j)) return false
    }
  }
  return true
}

/**
 * Calls `visit(i, j)`, i < j, once for each two of the first `count` boxes (minX minY maxX maxY each) that come within
 * 2 × `pad` of one another; stops when it returns false. A tree of boxes packed along a Hilbert curve is joined
 * with itself: near-linear where few boxes overlap. Its leaves are runs of neighbours, so that loops given edge by edge
 * make a small tree. Up to 2²³ leaves.
 */
export function visitBoxPairs(boxes: Float64Array, count: number, pad: number, visit: (i: number, j: number) => boolean): void {
  if (count < 2) return
  const reach = 2 * pad
  const start = runsOf(boxes, count, reach)
  const runs = start.length - 1
  const runBoxes = new Float64Array(4 * runs)
  for (let r = 0; r < runs; r++) unite(boxes, start[r], start[r + 1], runBoxes, r)
  const order = hilbertOrder(runBoxes, runs)
  const levels = levelsOf(runBoxes, order)
  if (levels.length === 1) {
    joinRuns(boxes, start, runBoxes, 0, 0, reach, visit)
    return
  }
  const stack = [levels.length - 1, 0, 0]
  while (stack.length > 0) {
    const b = stack.pop() ?? 0
    const a = stack.pop() ?? 0
    const level = (stack.pop() ?? 0) - 1
    const boxesHere = levels[level]
    const n = boxesHere.length / 4
    const lastA = Math.min(n, WIDTH * (a + 1))
    const lastB = Math.min(n, WIDTH * (b + 1))
    for (let i = WIDTH * a; i < lastA; i++) {
      const minX = boxesHere[4 * i] - reach
      const minY = boxesHere[4 * i + 1] - reach
      const maxX = boxesHere[4 * i + 2] + reach
      const maxY = boxesHere[4 * i + 3] + reach
      // a node joins itself too
      for (let j = a === b ? i : WIDTH * b; j < lastB; j++) {
        if (boxesHere[4 * j] > maxX || boxesHere[4 * j + 2] < minX || boxesHere[4 * j + 1] > maxY || boxesHere[4 * j + 3] < minY)
          continue
        if (level > 0) stack.push(level, i, j)
        else if (!joinRuns(boxes, start, runBoxes, Math.min(order[i], order[j]), Math.max(order[i], order[j]), reach, visit))
          return
      }
    }
  }
}
