import { type EdgeTable, emptyTable, pushCopy } from './edges'
import { snapEnds } from './snapEnds'

/** The edges of a net without those that end in nothing, again and again; and how many these were. */
export function pruneNet(net: EdgeTable, snap: number): { net: EdgeTable; pruned: number } {
  const { vertex, vertices, degree } = snapEnds(
    net,
    new Uint32Array(net.count).map((_, i) => i),
    snap,
  )
  // sum of the edges at each vertex: where one is left, the sum is that edge
  const rest = new Float64Array(vertices)
  for (let end = 0; end < vertex.length; end++) rest[vertex[end]] += end >> 1
  const gone = new Uint8Array(net.count)
  const ready: number[] = []
  for (let v = 0; v < vertices; v++) if (degree[v] === 1) ready.push(v)
  for (let v = ready.pop(); v !== undefined; v = ready.pop()) {
    if (degree[v] !== 1) continue
    const edge = rest[v]
    gone[edge] = 1
    for (const w of [vertex[2 * edge], vertex[2 * edge + 1]]) {
      rest[w] -= edge
      if (--degree[w] === 1) ready.push(w)
    }
  }
  const pruned = gone.reduce((sum, one) => sum + one, 0)
  if (pruned === 0) return { net, pruned }
  const kept = emptyTable(net.count - pruned, net.shapesUsed)
  for (let i = 0; i < net.count; i++) if (!gone[i]) pushCopy(kept, net, i)
  return { net: kept, pruned }
}
