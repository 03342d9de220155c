import { ARC, ELLIPSE, type EdgeTable, LINE } from './edges'

/** Rows of the table sorted by how they are chained. */
export interface Sorted {
  /** rows that close by themselves, run by run: run k is closedRows[closedStart[k]] … */
  closedRows: Uint32Array
  closedStart: number[]
  /** rows whose ends are to be joined */
  loose: Uint32Array
  /** rows without length */
  empty: Uint32Array
}

const hasNoLength = (edges: EdgeTable, i: number, snap: number): boolean => {
  const e = edges.ends
  if (Math.hypot(e[4 * i + 2] - e[4 * i], e[4 * i + 3] - e[4 * i + 1]) > (edges.kind[i] === LINE ? 0 : snap)) return false
  const s = edges.shapes
  const k = edges.shape[i]
  switch (edges.kind[i]) {
    case LINE:
      return true
    case ARC:
      return s[k + 2] * Math.abs(s[k + 4]) <= snap
    case ELLIPSE:
      return (Math.hypot(s[k + 2], s[k + 3]) + Math.hypot(s[k + 4], s[k + 5])) * Math.abs(s[k + 7]) <= snap
    default: {
      let reach = 0
      for (let j = 1; j <= s[k]; j++)
        reach = Math.max(reach, Math.hypot(s[k + 2 + 3 * j] - s[k + 2], s[k + 3 + 3 * j] - s[k + 3]))
      return reach <= snap
    }
  }
}

/**
 * Splits the taken rows into edges of entities that close on themselves (circles, closed polylines, closed splines:
 * consecutive rows of one source, each running into the next and the last into the first), loose edges and edges
 * without length. An entity drawn closed is an outline whatever else touches it.
 */
export function sortEdges(edges: EdgeTable, take: Uint32Array, snap: number): Sorted {
  const e = edges.ends
  const rows = new Uint32Array(take.length)
  const empty: number[] = []
  let count = 0
  for (const i of take) {
    if (hasNoLength(edges, i, snap)) empty.push(i)
    else rows[count++] = i
  }
  const meets = (i: number, j: number) =>
    Math.abs(e[4 * i + 2] - e[4 * j]) <= snap && Math.abs(e[4 * i + 3] - e[4 * j + 1]) <= snap
  const closedRows = new Uint32Array(count)
  const closedStart = [0]
  const loose = new Uint32Array(count)
  let closed = 0
  let open = 0
  for (let from = 0; from < count; ) {
    let to = from + 1
    while (to < count && edges.source[rows[to]] === edges.source[rows[from]] && meets(rows[to - 1], rows[to])) to++
    const sameAfter = to < count && edges.source[rows[to]] === edges.source[rows[from]]
    if (!sameAfter && meets(rows[to - 1], rows[from])) {
      for (let r = from; r < to; r++) closedRows[closed++] = rows[r]
      closedStart.push(closed)
    } else for (let r = from; r < to; r++) loose[open++] = rows[r]
    from = to
  }
  return {
    closedRows: closedRows.subarray(0, closed),
    closedStart,
    loose: loose.subarray(0, open),
    empty: Uint32Array.from(empty),
  }
}
