/**
 * Points hashed by square cells into chains in typed arrays: head of each bucket and the next point of the same
 * bucket. Buckets may hold points of other cells; the caller's distance test tells.
 */
export interface EndGrid {
  cell: number
  originX: number
  originY: number
  mask: number
  head: Int32Array
  next: Int32Array
}

export function newGrid(points: number, cell: number, originX: number, originY: number): EndGrid {
  const size = 2 ** Math.max(4, Math.ceil(Math.log2(points + 1)))
  return {
    cell,
    originX,
    originY,
    mask: size - 1,
    head: new Int32Array(size).fill(-1),
    next: new Int32Array(points),
  }
}

/** Bucket of cell (ix, iy); the mixing constants are those of a common 32-bit finalizer (common practice, no source). */
export function bucket(grid: EndGrid, ix: number, iy: number): number {
  let h = Math.imul(ix | 0, 0x9e3779b1) ^ Math.imul(iy | 0, 0x85ebca6b)
  h ^= h >>> 15
  h = Math.imul(h, 0x2c1b3c6d)
  return (h ^ (h >>> 13)) & grid.mask
}

export function insertPoint(grid: EndGrid, point: number, x: number, y: number): void {
  const b = bucket(grid, Math.floor((x - grid.originX) / grid.cell), Math.floor((y - grid.originY) / grid.cell))
  grid.next[point] = grid.head[b]
  grid.head[b] = point
}

/** Calls `visit` for each point that may lie within `reach` (at most half a cell) of x, y; some lie further, some come twice. */
export function visitNear(grid: EndGrid, x: number, y: number, reach: number, visit: (point: number) => void): void {
  const lowX = Math.floor((x - reach - grid.originX) / grid.cell)
  const highX = Math.floor((x + reach - grid.originX) / grid.cell)
  const lowY = Math.floor((y - reach - grid.originY) / grid.cell)
  const highY = Math.floor((y + reach - grid.originY) / grid.cell)
  for (let ix = lowX; ix <= highX; ix++)
    for (let iy = lowY; iy <= highY; iy++) for (let p = grid.head[bucket(grid, ix, iy)]; p >= 0; p = grid.next[p]) visit(p)
}
