import { type EdgeTable, LINE } from './edges'
import { bucket, insertPoint, newGrid } from './endGrid'

/**
 * Ends of the loose edges: end 2k is the first end of row k, end 2k + 1 its second. `vertex[e]` is the vertex the
 * end lies at, `x[v]`, `y[v]` its place, `degree[v]` the number of ends there.
 */
export interface Ends {
  count: number
  vertex: Int32Array
  vertices: number
  x: Float64Array
  y: Float64Array
  degree: Uint32Array
}

/**
 * Joins ends no further apart than `snap` into vertices. A vertex takes the place of one of its ends, of a line
 * before a curve (drawings write a line's ends, an arc's are computed), of several the lowest in x, then y: so that
 * order and sense of the edges do not matter.
 */
export function snapEnds(edges: EdgeTable, rows: Uint32Array, snap: number): Ends {
  const count = 2 * rows.length
  const e = edges.ends
  const vertex = new Int32Array(count)
  const x = new Float64Array(count)
  const y = new Float64Array(count)
  const degree = new Uint32Array(count)
  const fromLine = new Uint8Array(count)
  let originX = Number.POSITIVE_INFINITY
  let originY = Number.POSITIVE_INFINITY
  let extent = 0
  for (const row of rows) {
    originX = Math.min(originX, e[4 * row], e[4 * row + 2])
    originY = Math.min(originY, e[4 * row + 1], e[4 * row + 3])
    extent = Math.max(extent, Math.abs(e[4 * row] - originX), Math.abs(e[4 * row + 1] - originY))
  }
  // a vertex may move by one snap after it is filed, so the search reaches twice as far
  const reach = 2 * snap
  const grid = newGrid(count, Math.max(1024 * snap, 1e-7 * extent, 1e-300), originX, originY)
  let vertices = 0
  const search = (px: number, py: number): number => {
    const lowX = Math.floor((px - reach - originX) / grid.cell)
    const highX = Math.floor((px + reach - originX) / grid.cell)
    const lowY = Math.floor((py - reach - originY) / grid.cell)
    const highY = Math.floor((py + reach - originY) / grid.cell)
    for (let ix = lowX; ix <= highX; ix++)
      for (let iy = lowY; iy <= highY; iy++)
        for (let v = grid.head[bucket(grid, ix, iy)]; v >= 0; v = grid.next[v])
          if (Math.abs(x[v] - px) <= snap && Math.abs(y[v] - py) <= snap) return v
    return -1
  }
  for (let end = 0; end < count; end++) {
    const row = rows[end >> 1]
    const px = e[4 * row + 2 * (end & 1)]
    const py = e[4 * row + 2 * (end & 1) + 1]
    const isLine = edges.kind[row] === LINE ? 1 : 0
    let v = search(px, py)
    if (v < 0) {
      v = vertices++
      x[v] = px
      y[v] = py
      fromLine[v] = isLine
      insertPoint(grid, v, px, py)
    } else if (isLine > fromLine[v] || (isLine === fromLine[v] && (px < x[v] || (px === x[v] && py < y[v])))) {
      x[v] = px
      y[v] = py
      fromLine[v] = isLine
    }
    vertex[end] = v
    degree[v]++
  }
  return { count, vertex, vertices, x, y, degree }
}
