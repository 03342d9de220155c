import Flatbush from 'flatbush'
import { boundsOfEdges } from './bounds'
import { edgeAt, type EdgeTable, emptyTable, LINE, pushCopy, pushEdge } from './edges'
import { nearLine } from './mayMeet'
import { nearestOn } from './nearest'
import { snapEnds } from './snapEnds'
import { splitEdge } from './splitEdge'

/** Pairs of end and box looked at most: hatching of a whole sheet goes past it, outlines never. */
const MOST_LOOKS = 200_000_000

/**
 * Cuts edges where another edge's free end lies on them within the tolerance (a T drawn without a vertex), so that
 * the ends meet at vertices. Returns the table itself where nothing is to be cut.
 */
export function splitAtEnds(edges: EdgeTable, snap: number, tolerance: number): EdgeTable {
  if (edges.count < 2) return edges
  const rows = new Uint32Array(edges.count).map((_, i) => i)
  const ends = snapEnds(edges, rows, snap)
  const boxes = boundsOfEdges(edges)
  const index = new Flatbush(edges.count)
  for (let i = 0; i < edges.count; i++) index.add(boxes[4 * i], boxes[4 * i + 1], boxes[4 * i + 2], boxes[4 * i + 3])
  index.finish()
  let looked = 0
  const cuts = new Map<number, number[]>()
  for (let end = 0; end < ends.count; end++) {
    const v = ends.vertex[end]
    if (ends.degree[v] > 1) continue
    const x = ends.x[v]
    const y = ends.y[v]
    index.search(x - tolerance, y - tolerance, x + tolerance, y + tolerance, (i) => {
      if (i === end >> 1 || ++looked > MOST_LOOKS) return false
      const e = edges.ends
      if (edges.kind[i] === LINE && !nearLine(e[4 * i], e[4 * i + 1], e[4 * i + 2], e[4 * i + 3], x, y, tolerance)) return false
      const beside = [0, 2].some((c) => Math.hypot(e[4 * i + c] - x, e[4 * i + c + 1] - y) <= 2 * tolerance)
      const near = nearestOn(edges, i, x, y)
      if (!beside && near.distance <= tolerance) cuts.set(i, [...(cuts.get(i) ?? []), near.t])
      return false
    })
  }
  if (cuts.size === 0) return edges
  const cut = emptyTable(edges.count + cuts.size, edges.shapesUsed)
  for (let i = 0; i < edges.count; i++) {
    const own = cuts.get(i)
    if (!own) {
      pushCopy(cut, edges, i)
      continue
    }
    let rest = edgeAt(edges, i)
    let done = 0
    for (const t of own.sort((a, b) => a - b)) {
      if (t - done < 1e-9) continue
      const [piece, after] = splitEdge(rest, (t - done) / (1 - done))
      pushEdge(cut, piece)
      rest = after
      done = t
    }
    pushEdge(cut, rest)
  }
  return cut
}
