import type { Merged } from './merge'

/**
 * What lies beside a sub-edge lies beside its whole chain: from `first` on through vertices where just two sub-edges
 * meet that carry the same counts. Calls `visit` for each further sub-edge; `turned` where it runs against `first`.
 */
export type ChainWalk = (first: number, visit: (u: number, turned: boolean) => void) => void

/** Prepares walks over the sub-edges `rows` of an arrangement with so many vertices. */
export function chainWalk(merged: Merged, rows: number[], vertices: number): ChainWalk {
  const { from, to } = merged
  const degree = new Uint8Array(vertices)
  const sum = new Float64Array(vertices)
  for (const u of rows) {
    for (const v of [from[u], to[u]]) {
      if (degree[v] < 3) degree[v]++
      sum[v] += u
    }
  }
  return (first, visit) => {
    for (const forward of [true, false]) {
      let u = first
      let turned = false
      for (;;) {
        const v = forward !== turned ? to[u] : from[u]
        const next = sum[v] - u
        if (degree[v] !== 2 || next === first || !sameCounts(merged, u, next, (to[u] === v) === (from[next] === v))) break
        if ((to[u] === v) !== (from[next] === v)) turned = !turned
        u = next
        visit(u, turned)
      }
    }
  }
}

function sameCounts({ countStart: start, countOwner, countValue }: Merged, u: number, w: number, alike: boolean): boolean {
  const size = start[u + 1] - start[u]
  if (start[w + 1] - start[w] !== size) return false
  for (let k = 0; k < size; k++) {
    let at = start[w]
    while (at < start[w + 1] && countOwner[at] !== countOwner[start[u] + k]) at++
    if (at === start[w + 1] || countValue[at] !== (alike ? 1 : -1) * countValue[start[u] + k]) return false
  }
  return true
}
