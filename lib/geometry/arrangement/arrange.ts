import Flatbush from 'flatbush'
import type { EdgeTable } from '../edges'
import { meetPieces } from './meet'
import { mergeEqual } from './merge'
import { monotonePieces, type Pieces } from './monotone'
import { emptyVertices, type Vertices, vertexAt } from './vertices'
import { windings } from './winding'
import { workTable } from './workTable'

/** Crossings an arrangement takes on before it says that the drawing is too tangled: seconds, not minutes. */
export const MOST_CROSSINGS = 50_000

/**
 * The plane cut by edges. Sub-edge u runs from vertex from[u] to to[u] on edge row[u] of `edges`, between
 * parameters t0[u] and t1[u] (t1 < t0 where it runs against the edge). Sub-edges that several edges share
 * are one; what each owner's edges do there is the signed count countValue[i] of owner countOwner[i], for
 * i from countStart[u] to countStart[u + 1] − 1. left[u] and right[u] index `sets`: the owners that hold
 * the points on that side (winding number not 0), ascending.
 */
export interface Arrangement {
  edges: EdgeTable
  tolerance: number
  vertices: number
  /** coordinates of the vertices as given: an edge's own end to the last bit where it is one */
  x: Float64Array
  y: Float64Array
  /** edges about the local origin, and their monotone pieces: what the geometry is reckoned with */
  pieces: Pieces
  local: Vertices
  count: number
  from: Uint32Array
  to: Uint32Array
  row: Uint32Array
  /** monotone piece of each sub-edge */
  piece: Uint32Array
  t0: Float64Array
  t1: Float64Array
  countStart: Uint32Array
  countOwner: Uint32Array
  countValue: Int32Array
  left: Uint32Array
  right: Uint32Array
  sets: Uint32Array[]
}

/**
 * Arranges all edges of the table; owner[e] is the outline (operand) that edge e bounds. Null when the
 * edges meet in more than `most` places. Tolerance in the edges' unit: vertices nearer than it are one,
 * source ends win over points found.
 */
export function arrange(
  edges: EdgeTable,
  owner: Uint32Array,
  owners: number,
  tolerance: number,
  most = MOST_CROSSINGS,
): Arrangement | null {
  const [ox, oy] = middle(edges)
  const work = workTable(edges, ox, oy, tolerance)
  const pieces = monotonePieces(work, tolerance)
  const local = emptyVertices(tolerance, 2 * pieces.count)
  const endOfVertex: number[] = []
  for (let k = 0; k < 2 * edges.count; k++) {
    const v = vertexAt(local, work.ends[2 * k], work.ends[2 * k + 1])
    if (v === endOfVertex.length) endOfVertex.push(k)
  }
  const splits = split(pieces, local, tolerance, most)
  if (!splits) return null
  const { x, y } = coordinates(local, endOfVertex, edges, ox, oy)
  const merged = mergeEqual(pieces, splits, owner, local)
  return { edges, tolerance, vertices: local.count, x, y, pieces, local, ...merged, ...windings(pieces, local, merged, owners) }
}

function middle(edges: EdgeTable): [number, number] {
  let [minX, minY, maxX, maxY] = [
    Number.POSITIVE_INFINITY,
    Number.POSITIVE_INFINITY,
    Number.NEGATIVE_INFINITY,
    Number.NEGATIVE_INFINITY,
  ]
  for (let k = 0; k < 4 * edges.count; k += 2) {
    minX = Math.min(minX, edges.ends[k])
    maxX = Math.max(maxX, edges.ends[k])
    minY = Math.min(minY, edges.ends[k + 1])
    maxY = Math.max(maxY, edges.ends[k + 1])
  }
  return edges.count === 0 ? [0, 0] : [minX + (maxX - minX) / 2, minY + (maxY - minY) / 2]
}

function coordinates(local: Vertices, endOfVertex: number[], edges: EdgeTable, ox: number, oy: number) {
  const x = new Float64Array(local.count)
  const y = new Float64Array(local.count)
  for (let v = 0; v < local.count; v++) {
    const own = v < endOfVertex.length
    x[v] = own ? edges.ends[2 * endOfVertex[v]] : local.x[v] + ox
    y[v] = own ? edges.ends[2 * endOfVertex[v] + 1] : local.y[v] + oy
  }
  return { x, y }
}

/** For each piece, the parameters and vertices at which it is cut, its own ends included, in its direction. */
export interface Splits {
  start: Uint32Array
  t: Float64Array
  vertex: Uint32Array
}

function split(pieces: Pieces, local: Vertices, tolerance: number, most: number): Splits | null {
  const onPiece: number[] = []
  const atT: number[] = []
  const atVertex: number[] = []
  const add = (i: number, t: number, v: number) => {
    onPiece.push(i)
    atT.push(t)
    atVertex.push(v)
  }
  const { count, ends } = pieces
  for (let i = 0; i < count; i++) {
    add(i, pieces.t0[i], vertexAt(local, ends[4 * i], ends[4 * i + 1]))
    add(i, pieces.t1[i], vertexAt(local, ends[4 * i + 2], ends[4 * i + 3]))
  }
  if (count === 0) return { start: new Uint32Array(1), t: new Float64Array(0), vertex: new Uint32Array(0) }
  const index = new Flatbush(count)
  for (let i = 0; i < count; i++) {
    const [x0, y0, x1, y1] = [ends[4 * i], ends[4 * i + 1], ends[4 * i + 2], ends[4 * i + 3]]
    index.add(
      Math.min(x0, x1) - tolerance,
      Math.min(y0, y1) - tolerance,
      Math.max(x0, x1) + tolerance,
      Math.max(y0, y1) + tolerance,
    )
  }
  index.finish()
  const crossings = local.count + most
  const meetings = 20 * (most + count)
  const tooMany = () => local.count > crossings || onPiece.length > meetings
  const meet = (i: number, ti: number, j: number, tj: number, x: number, y: number) => {
    const v = vertexAt(local, x, y)
    add(i, ti, v)
    add(j, tj, v)
  }
  for (let i = 0; i < count && !tooMany(); i++) {
    const [x0, y0, x1, y1] = [ends[4 * i], ends[4 * i + 1], ends[4 * i + 2], ends[4 * i + 3]]
    index.search(Math.min(x0, x1), Math.min(y0, y1), Math.max(x0, x1), Math.max(y0, y1), (j) => {
      if (j > i && !tooMany()) meetPieces(pieces, i, j, tolerance, meet)
      return false
    })
  }
  return tooMany() ? null : sorted(pieces, onPiece, atT, atVertex)
}

function sorted(pieces: Pieces, onPiece: number[], atT: number[], atVertex: number[]): Splits {
  const { count } = pieces
  const start = new Uint32Array(count + 1)
  for (const i of onPiece) start[i + 1]++
  for (let i = 0; i < count; i++) start[i + 1] += start[i]
  const order = new Uint32Array(onPiece.length)
  const fill = start.slice()
  onPiece.forEach((i, n) => {
    order[fill[i]++] = n
  })
  const t = new Float64Array(onPiece.length)
  const vertex = new Uint32Array(onPiece.length)
  for (let i = 0; i < count; i++) {
    const forward = pieces.t1[i] > pieces.t0[i] ? 1 : -1
    const own = order.subarray(start[i], start[i + 1])
    if (own.length > 2) own.sort((a, b) => forward * (atT[a] - atT[b]) || a - b)
    own.forEach((n, k) => {
      const at = start[i] + k
      t[at] = atT[n]
      vertex[at] = atVertex[n]
      if (k === 0 || vertex[at - 1] !== vertex[at]) return
      if (n < own[k - 1]) t[at - 1] = t[at]
      else t[at] = t[at - 1]
    })
  }
  return { start, t, vertex }
}
