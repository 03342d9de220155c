import { ARC, BEZIER, type EdgeTable, ELLIPSE, type Point } from './edges'
import type { Region } from './region'
import { reverseEdge } from './reverseEdge'

/** Mirror first (x to −x), then scale, then turn about the origin (degrees, counter-clockwise), then move. */
export interface Similarity {
  mirror?: boolean
  scale?: number
  turn?: number
  move?: Point
}

interface Matrix {
  a: number
  b: number
  c: number
  d: number
  x: number
  y: number
  scale: number
  angle: number
  mirror: boolean
}

/** Cosine and sine of an angle in degrees, exact at multiples of 90°. */
export function cosSin(degrees: number): [number, number] {
  const quarter = degrees / 90
  if (Number.isInteger(quarter)) {
    const q = ((quarter % 4) + 4) % 4
    return [[1, 0, -1, 0][q], [0, 1, 0, -1][q]]
  }
  const angle = (degrees * Math.PI) / 180
  return [Math.cos(angle), Math.sin(angle)]
}

function matrixOf({ mirror = false, scale = 1, turn = 0, move = { x: 0, y: 0 } }: Similarity): Matrix {
  const [cos, sin] = cosSin(turn)
  const side = mirror ? -scale : scale
  const angle = (turn * Math.PI) / 180
  return { a: side * cos, b: -scale * sin, c: side * sin, d: scale * cos, x: move.x, y: move.y, scale, angle, mirror }
}

function moveShape(s: Float64Array, kind: number, k: number, m: Matrix): void {
  const place = (at: number) => {
    const x = s[at]
    const y = s[at + 1]
    s[at] = m.a * x + m.b * y + m.x
    s[at + 1] = m.c * x + m.d * y + m.y
  }
  const turn = (at: number) => {
    const x = s[at]
    const y = s[at + 1]
    s[at] = m.a * x + m.b * y
    s[at + 1] = m.c * x + m.d * y
  }
  if (kind === ARC) {
    place(k)
    s[k + 2] *= m.scale
    s[k + 3] = (m.mirror ? Math.PI - s[k + 3] : s[k + 3]) + m.angle
    if (m.mirror) s[k + 4] = -s[k + 4]
  } else if (kind === ELLIPSE) {
    place(k)
    turn(k + 2)
    turn(k + 4)
  } else if (kind === BEZIER) for (let j = 0; j <= s[k]; j++) place(k + 2 + 3 * j)
}

/** The edges moved: arcs stay arcs, their radius is only scaled. With a mirror every edge keeps its own first end. */
export function transformEdges(edges: EdgeTable, similarity: Similarity): EdgeTable {
  const m = matrixOf(similarity)
  const { count, shapesUsed } = edges
  const ends = edges.ends.slice(0, 4 * count)
  for (let j = 0; j < 4 * count; j += 2) {
    const x = ends[j]
    const y = ends[j + 1]
    ends[j] = m.a * x + m.b * y + m.x
    ends[j + 1] = m.c * x + m.d * y + m.y
  }
  const shapes = edges.shapes.slice(0, shapesUsed)
  for (let i = 0; i < count; i++) moveShape(shapes, edges.kind[i], edges.shape[i], m)
  return {
    count,
    kind: edges.kind.slice(0, count),
    ends,
    shape: edges.shape.slice(0, count),
    shapes,
    shapesUsed,
    source: edges.source.slice(0, count),
  }
}

/** Turns the order and the sense of edges from … to − 1 of a table round, in place. */
function reverseLoop(edges: EdgeTable, from: number, to: number): void {
  for (let i = from; i < to; i++) reverseEdge(edges, i)
  edges.kind.subarray(from, to).reverse()
  edges.shape.subarray(from, to).reverse()
  edges.source.subarray(from, to).reverse()
  const e = edges.ends
  for (let i = from, j = to - 1; i < j; i++, j--) {
    const kept = e.slice(4 * i, 4 * i + 4)
    e.copyWithin(4 * i, 4 * j, 4 * j + 4)
    e.set(kept, 4 * j)
  }
}

/** The region moved; mirrored loops are walked the other way, so that the metal stays on the left. */
export function transformRegion(region: Region, similarity: Similarity): Region {
  const edges = transformEdges(region.edges, similarity)
  const loopStart = region.loopStart.slice()
  if (similarity.mirror) for (let k = 0; k + 1 < loopStart.length; k++) reverseLoop(edges, loopStart[k], loopStart[k + 1])
  return { edges, loopStart, hole: region.hole.slice(), piece: region.piece.slice(), pieces: region.pieces }
}
