/** A symmetric sparsity pattern: the neighbours of i are `column[start[i]] … column[start[i + 1] − 1]`, i itself included. */
export interface Pattern {
  n: number
  start: Int32Array
  column: Int32Array
}

const SMALL = 24

/**
 * An order of elimination by geometric nested dissection: halve by the longer side's median, take the near half's
 * rim as separator, order it last (George, SIAM J. Numer. Anal. 10 (1973) 345–363, from memory). `last` unknowns
 * (tied to whole holes) come at the very end. Returns old index by new index.
 */
export function dissect({ n, start, column }: Pattern, x: Float64Array, y: Float64Array, last: ReadonlySet<number>): Int32Array {
  const order = new Int32Array(n)
  const part = new Int32Array(n)
  let filled = n
  for (const i of last) {
    order[--filled] = i
    part[i] = -1
  }
  let parts = 0
  // (members, end of their place in the order), filled from the back: separators first
  const stack: [Int32Array, number][] = [[Int32Array.from({ length: n }, (_, i) => i).filter((i) => part[i] >= 0), filled]]
  while (stack.length > 0) {
    const [members, end] = stack.pop() ?? [new Int32Array(0), 0]
    if (members.length <= SMALL) {
      order.set(members, end - members.length)
      continue
    }
    let [minX, maxX, minY, maxY] = [
      Number.POSITIVE_INFINITY,
      Number.NEGATIVE_INFINITY,
      Number.POSITIVE_INFINITY,
      Number.NEGATIVE_INFINITY,
    ]
    for (const i of members) {
      minX = Math.min(minX, x[i])
      maxX = Math.max(maxX, x[i])
      minY = Math.min(minY, y[i])
      maxY = Math.max(maxY, y[i])
    }
    const along = maxX - minX >= maxY - minY ? x : y
    const sorted = members.slice().sort((i, j) => along[i] - along[j] || i - j)
    const half = sorted.length >> 1
    const [near, far] = [++parts, ++parts]
    for (let k = 0; k < sorted.length; k++) part[sorted[k]] = k < half ? near : far
    const rim: number[] = []
    const inner: number[] = []
    for (let k = 0; k < half; k++) {
      const i = sorted[k]
      let touches = false
      for (let p = start[i]; p < start[i + 1] && !touches; p++) touches = part[column[p]] === far
      if (touches) rim.push(i)
      else inner.push(i)
    }
    for (const i of rim) part[i] = -1
    order.set(rim, end - rim.length)
    const rest = end - rim.length
    const farMembers = sorted.slice(half)
    stack.push([farMembers, rest], [Int32Array.from(inner), rest - farMembers.length])
  }
  return order
}
