import { type EdgeTable, emptyTable, pushCopy } from './edges'
import type { Ends } from './snapEnds'

/** `mate` of an end that runs into no other */
export const NONE = -1
/** `mate` of an end at a vertex where more than two meet */
export const BRANCH = -2

/** A label for each edge that is connected with a branching vertex, −1 for the others; null where nothing branches. */
export function netLabels(ends: Ends, mate: Int32Array): Int32Array | null {
  if (!mate.includes(BRANCH)) return null
  const edges = mate.length >> 1
  const parent = new Int32Array(edges).map((_, k) => k)
  const find = (k: number): number => {
    let root = k
    while (parent[root] !== root) root = parent[root]
    for (let at = k; parent[at] !== root; ) {
      const next = parent[at]
      parent[at] = root
      at = next
    }
    return root
  }
  const unite = (a: number, b: number) => {
    const [low, high] = [find(a), find(b)].sort((p, q) => p - q)
    parent[high] = low
  }
  const firstAt = new Int32Array(ends.vertices).fill(-1)
  for (let end = 0; end < mate.length; end++) {
    const v = ends.vertex[end]
    if (firstAt[v] < 0) firstAt[v] = end >> 1
    else unite(firstAt[v], end >> 1)
    if (mate[end] >= 0) unite(end >> 1, mate[end] >> 1)
  }
  const branches = new Uint8Array(edges)
  for (let end = 0; end < mate.length; end++) if (mate[end] === BRANCH) branches[find(end >> 1)] = 1
  return parent.map((_, k) => (branches[find(k)] ? find(k) : -1))
}

/** The edges of each net as a table of its own. */
export function netTables(edges: EdgeTable, label: Int32Array): EdgeTable[] {
  const tables = new Map<number, EdgeTable>()
  for (let k = 0; k < label.length; k++) {
    if (label[k] < 0) continue
    let table = tables.get(label[k])
    if (!table) {
      table = emptyTable()
      tables.set(label[k], table)
    }
    pushCopy(table, edges, k)
  }
  return [...tables.values()]
}
