import { type EdgeTable, emptyTable, pushCopy } from '../edges'
import type { Tolerances } from '../outlineSet'
import { selectLoops } from '../selectLoops'
import { type Arrangement, arrange } from './arrange'
import { noLoops, traceLoops } from './loops'
import { halvesOf, nextRound } from './round'

export interface Faces {
  /** the bounded faces' outer boundaries, counter-clockwise; neighbours share vertices to the last bit */
  edges: EdgeTable
  loopStart: Uint32Array
  area: Float64Array
  /** rows of the given table that bound no face over part of their length: loose ends and links */
  dangling: Uint32Array
  /** true where the edges meet too often to be arranged */
  tooMany: boolean
}

/**
 * All bounded faces of the arrangement of loose edges (rows `which` of the table, all when null), whatever way they run.
 * Edges that end in nothing, or that have the same face on both sides, bound nothing and are reported.
 */
export function facesOf(table: EdgeTable, which: Uint32Array | null, { snap }: Pick<Tolerances, 'snap'>): Faces {
  const rows = which ?? Uint32Array.from({ length: table.count }, (_, i) => i)
  const edges = emptyTable(rows.length)
  for (const i of rows) pushCopy(edges, table, i)
  const a = arrange(edges, new Uint32Array(rows.length), 1, snap)
  if (!a)
    return { ...selectLoops(edges, new Uint32Array(1), () => false), area: new Float64Array(0), dangling: rows, tooMany: true }
  const kept = new Uint8Array(a.count).fill(1)
  const degree = prune(a, kept)
  const links = linksOf(a, kept, nextRound(a, kept))
  for (const u of links) {
    kept[u] = 0
    degree[a.from[u]]--
    degree[a.to[u]]--
  }
  const loops = noLoops()
  const halves = halvesOf(kept)
  traceLoops(
    a,
    halves,
    nextRound(a, kept),
    degree.map((d) => (d > 2 ? 2 : 1)),
    loops,
  )
  const chosen = selectLoops(loops.edges, Uint32Array.from(loops.loopStart), (k) => loops.area[k] > 0)
  const dangling = new Set<number>()
  for (let u = 0; u < a.count; u++) if (!kept[u]) dangling.add(rows[a.row[u]])
  return {
    ...chosen,
    area: Float64Array.from(loops.area.filter((area) => area > 0)),
    dangling: Uint32Array.from(dangling).sort(),
    tooMany: false,
  }
}

/** Drops sub-edges that end in nothing, one after another; the degrees of the vertices afterwards. */
function prune(a: Arrangement, kept: Uint8Array): Uint16Array {
  const degree = new Uint16Array(a.vertices)
  const at: number[][] = Array.from({ length: a.vertices }, () => [])
  for (let u = 0; u < a.count; u++) {
    for (const v of [a.from[u], a.to[u]]) {
      degree[v]++
      at[v].push(u)
    }
  }
  const loose: number[] = []
  degree.forEach((d, v) => {
    if (d === 1) loose.push(v)
  })
  for (let v = loose.pop(); v !== undefined; v = loose.pop()) {
    const u = at[v].find((e) => kept[e])
    if (u === undefined) continue
    kept[u] = 0
    for (const w of [a.from[u], a.to[u]]) if (--degree[w] === 1) loose.push(w)
  }
  return degree
}

/** Sub-edges with the same way round on both sides: they link faces, or islands to what is round them. */
function linksOf(a: Arrangement, kept: Uint8Array, next: Int32Array): number[] {
  const way = new Int32Array(2 * a.count).fill(-1)
  let ways = 0
  for (const first of halvesOf(kept)) {
    if (way[first] >= 0) continue
    for (let h = first; way[h] < 0; h = next[h]) way[h] = ways
    ways++
  }
  const links: number[] = []
  for (let u = 0; u < a.count; u++) if (kept[u] && way[2 * u] === way[2 * u + 1]) links.push(u)
  return links
}
