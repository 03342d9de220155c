/** Points in a hash grid; one that comes within the tolerance of an earlier one takes the earlier one's place. */
export interface Vertices {
  count: number
  x: Float64Array
  y: Float64Array
  tolerance: number
  head: Int32Array
  next: Int32Array
}

/** An empty grid; it grows by itself. */
export function emptyVertices(tolerance: number, room = 1024): Vertices {
  const size = 2 ** Math.ceil(Math.log2(Math.max(16, room)))
  return {
    count: 0,
    x: new Float64Array(size),
    y: new Float64Array(size),
    tolerance,
    head: new Int32Array(2 * size).fill(-1),
    next: new Int32Array(size),
  }
}

const cellSize = (v: Vertices) => 8 * v.tolerance

function bucket(v: Vertices, cx: number, cy: number): number {
  const h = Math.imul(cx | 0, 0x9e3779b1) ^ Math.imul(cy | 0, 0x85ebca6b)
  return (h ^ (h >>> 15)) & (v.head.length - 1)
}

/** The vertex at (x, y): the nearest one within the tolerance, or a new one. */
export function vertexAt(v: Vertices, x: number, y: number): number {
  const known = nearestVertex(v, x, y)
  if (known >= 0) return known
  if (v.count === v.x.length) growVertices(v)
  const i = v.count++
  v.x[i] = x
  v.y[i] = y
  insert(v, i)
  return i
}

/** The nearest vertex within the tolerance of (x, y), or −1. */
export function nearestVertex(v: Vertices, x: number, y: number): number {
  const size = cellSize(v)
  const left = Math.floor((x - v.tolerance) / size)
  const right = Math.floor((x + v.tolerance) / size)
  const low = Math.floor((y - v.tolerance) / size)
  const high = Math.floor((y + v.tolerance) / size)
  let best = -1
  let nearest = v.tolerance
  for (let cx = left; cx <= right; cx++) {
    for (let cy = low; cy <= high; cy++) {
      for (let i = v.head[bucket(v, cx, cy)]; i >= 0; i = v.next[i]) {
        const d = Math.hypot(v.x[i] - x, v.y[i] - y)
        if (d < nearest || (d === nearest && (best < 0 || i < best))) {
          nearest = d
          best = i
        }
      }
    }
  }
  return best
}

function insert(v: Vertices, i: number): void {
  const size = cellSize(v)
  const h = bucket(v, Math.floor(v.x[i] / size), Math.floor(v.y[i] / size))
  v.next[i] = v.head[h]
  v.head[h] = i
}

function growVertices(v: Vertices): void {
  const size = 2 * v.x.length
  const { x, y } = v
  v.x = new Float64Array(size)
  v.x.set(x)
  v.y = new Float64Array(size)
  v.y.set(y)
  v.next = new Int32Array(size)
  v.head = new Int32Array(2 * size).fill(-1)
  for (let i = 0; i < v.count; i++) insert(v, i)
}
