/** Children of a node. */
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
  return Uint32Array.from(keys, (key) => key % slots)
}

/** Levels of boxes, leaves first: level n + 1 holds the union of each eight of level n. */
function levelsOf(boxes: Float64Array, order: Uint32Array, pad: number): Float64Array[] {
  const count = order.length
  let level = new Float64Array(4 * count)
  for (let i = 0; i < count; i++) {
    const b = 4 * order[i]
    level[4 * i] = boxes[b] - pad
    level[4 * i + 1] = boxes[b + 1] - pad
    level[4 * i + 2] = boxes[b + 2] + pad
    level[4 * i + 3] = boxes[b + 3] + pad
  }
  const levels = [level]
  while (level.length > 4) {
    const below = level
    const n = below.length / 4
    level = new Float64Array(4 * Math.ceil(n / WIDTH))
    for (let p = 0; 4 * p < level.length; p++) {
      const last = Math.min(n, WIDTH * (p + 1))
      let [minX, minY, maxX, maxY] = [
        below[4 * WIDTH * p],
        below[4 * WIDTH * p + 1],
        below[4 * WIDTH * p + 2],
        below[4 * WIDTH * p + 3],
      ]
      for (let c = WIDTH * p + 1; c < last; c++) {
        minX = Math.min(minX, below[4 * c])
        minY = Math.min(minY, below[4 * c + 1])
        maxX = Math.max(maxX, below[4 * c + 2])
        maxY = Math.max(maxY, below[4 * c + 3])
      }
      level[4 * p] = minX
      level[4 * p + 1] = minY
      level[4 * p + 2] = maxX
      level[4 * p + 3] = maxY
    }
    levels.push(level)
  }
  return levels
}

/**
 * Calls `visit(i, j)`, i < j, once for each two of the first `count` boxes (minX minY maxX maxY each) that come within
 * 2 × `pad` of one another; stops when it returns false. A tree of boxes packed along a Hilbert curve is joined
 * with itself: near-linear where few boxes overlap. Up to 2²³ boxes.
 */
export function visitBoxPairs(boxes: Float64Array, count: number, pad: number, visit: (i: number, j: number) => boolean): void {
  if (count < 2) return
  const order = hilbertOrder(boxes, count)
  const levels = levelsOf(boxes, order, pad)
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
      const minX = boxesHere[4 * i]
      const minY = boxesHere[4 * i + 1]
      const maxX = boxesHere[4 * i + 2]
      const maxY = boxesHere[4 * i + 3]
      // a node joins itself too, a leaf does not
      for (let j = a === b ? i + (level === 0 ? 1 : 0) : WIDTH * b; j < lastB; j++) {
        if (boxesHere[4 * j] > maxX || boxesHere[4 * j + 2] < minX || boxesHere[4 * j + 1] > maxY || boxesHere[4 * j + 3] < minY)
          continue
        if (level > 0) stack.push(level, i, j)
        else if (!visit(Math.min(order[i], order[j]), Math.max(order[i], order[j]))) return
      }
    }
  }
}
