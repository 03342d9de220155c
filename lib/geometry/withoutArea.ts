import type { EdgeTable } from './edges'
import type { Finding } from './finding'
import { geometryFinding } from './findings'
import { crossesItself } from './relations'

/** What is to be said of a closed chain whose area is 0: it runs back over itself, or crosses itself so that its parts cancel. */
export function withoutArea(edges: EdgeTable, from: number, to: number, snap: number): Finding {
  const at: [number, number] = [edges.ends[4 * from], edges.ends[4 * from + 1]]
  const [x, y] = at
  if (crossesItself(edges, from, to, snap)) return geometryFinding('outline-crosses-itself', { x, y }, at)
  return geometryFinding('outline-without-area', { edges: to - from, x, y }, at)
}
