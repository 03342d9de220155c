import Delaunator from 'delaunator'
import type { Region } from '../../geometry/region'
import { type Boundary, boundaryOf, type Points, splitPiece } from './boundary'
import { newQuadrature, quadratureOf } from './elements'

/**
 * Triangles of the metal. `corner` holds three vertices a triangle, counter-clockwise; `piece[3t + i]` is the
 * boundary piece that is the side from corner i to corner i + 1, or −1 for an inner side.
 */
export interface Mesh {
  x: Float64Array
  y: Float64Array
  corner: Uint32Array
  piece: Int32Array
  /** the triangle across each side, −1 beyond the metal */
  across: Int32Array
  boundary: Boundary
}

const ROUNDS = 60
/** sin² of the least angle wanted, 25°, in the ratio shortest side / (2 × circumradius). */
const LEAST = Math.sin((25 * Math.PI) / 180)

/** A mesh that can be refined: vertices and boundary pieces grow, triangles are made anew each round. */
export interface Workpiece {
  region: Region
  points: Points
  boundary: Boundary
  /** below this length nothing is split any more */
  floor: number
  /** vertices where the boundary turns so sharply that its two sides would split each other without end */
  sharp: Set<number>
}

export function workpieceOf(region: Region, size: number): Workpiece {
  const points: Points = { x: [], y: [] }
  const boundary = boundaryOf(region, points, size / 4)
  return { region, points, boundary, floor: size * 2e-6, sharp: sharpVertices(boundary, points) }
}

/** Corners of the metal under 70°: their sides are split on circles about them (shells), never at will. */
function sharpVertices(boundary: Boundary, points: Points): Set<number> {
  const before = new Map<number, number>()
  boundary.to.forEach((vertex, k) => {
    before.set(vertex, boundary.from[k])
  })
  const sharp = new Set<number>()
  boundary.from.forEach((vertex, k) => {
    const a = before.get(vertex) ?? vertex
    const b = boundary.to[k]
    const [ax, ay] = [points.x[a] - points.x[vertex], points.y[a] - points.y[vertex]]
    const [bx, by] = [points.x[b] - points.x[vertex], points.y[b] - points.y[vertex]]
    if (ax * bx + ay * by > 0.34 * Math.hypot(ax, ay) * Math.hypot(bx, by)) sharp.add(vertex)
  })
  return sharp
}

/**
 * Refines until every piece of the boundary is a side, no vertex lies in the circle over a piece, and no
 * triangle of the metal has an angle under 25° but at sharp corners (Ruppert, J. Algorithms 18 (1995) 548–585,
 * in rounds: each triangulates all points afresh, splits pieces, else adds circumcentres). Deterministic. Null where more
 * than `mostPoints` would be needed: slivers.
 */
export function meshOf(work: Workpiece, mostPoints: number): Mesh | null {
  for (let round = 0; ; round++) {
    if (work.points.x.length > mostPoints) return null
    const triangulation = triangulate(work)
    const last = round >= ROUNDS
    const splits = piecesToSplit(work, triangulation)
    if (splits.size > 0 && !last) {
      for (const k of splits) split(work, k)
      continue
    }
    const mesh = insideOf(work, triangulation)
    const { pieces, points } = last ? { pieces: new Set<number>(), points: [] } : improvements(work, mesh)
    if (pieces.size === 0 && points.length === 0) return mesh
    for (const k of pieces) split(work, k)
    for (const [x, y] of points) {
      work.points.x.push(x)
      work.points.y.push(y)
    }
  }
}

interface Triangulation {
  triangles: Uint32Array
  halfedges: Int32Array
  /** half-edge that runs along each boundary piece with the metal on its left, −1 where the piece is no side */
  along: Int32Array
}

function triangulate({ points, boundary }: Workpiece): Triangulation {
  const n = points.x.length
  const coordinates = new Float64Array(2 * n)
  for (let i = 0; i < n; i++) {
    coordinates[2 * i] = points.x[i]
    coordinates[2 * i + 1] = points.y[i]
  }
  const { triangles, halfedges } = new Delaunator(coordinates)
  const next = (e: number) => (e % 3 === 2 ? e - 2 : e + 1)
  const side = new Map<number, number>()
  boundary.from.forEach((from, k) => {
    side.set(from * n + boundary.to[k], k)
  })
  const along = new Int32Array(boundary.from.length).fill(-1)
  // delaunator turns triangles clockwise in a y-up frame: its half-edge a→b has the triangle on the right
  for (let e = 0; e < triangles.length; e++) {
    const k = side.get(triangles[next(e)] * n + triangles[e])
    if (k !== undefined) along[k] = e
  }
  return { triangles, halfedges, along }
}

const opposite = (triangles: Uint32Array, e: number): number => triangles[e % 3 === 0 ? e + 2 : e - 1]

/** Pieces that are no side of the triangulation, or whose circle holds the vertex across. */
function piecesToSplit(work: Workpiece, { triangles, along }: Triangulation): Set<number> {
  const { points, boundary } = work
  const out = new Set<number>()
  const sees = (k: number, vertex: number): boolean => {
    const [a, b] = [boundary.from[k], boundary.to[k]]
    const dot =
      (points.x[a] - points.x[vertex]) * (points.x[b] - points.x[vertex]) +
      (points.y[a] - points.y[vertex]) * (points.y[b] - points.y[vertex])
    return dot < 0
  }
  along.forEach((e, k) => {
    if (!splittable(work, k)) return
    if (e < 0) out.add(k)
    else if (sees(k, opposite(triangles, e))) out.add(k)
  })
  return out
}

function lengthOf({ points, boundary }: Workpiece, k: number): number {
  const [a, b] = [boundary.from[k], boundary.to[k]]
  return Math.hypot(points.x[a] - points.x[b], points.y[a] - points.y[b])
}

const splittable = (work: Workpiece, k: number): boolean => lengthOf(work, k) > 2 * work.floor

/** Halves a piece; next to a sharp corner at a distance that is a power of two, so that both sides match. */
function split(work: Workpiece, k: number): void {
  const { boundary, sharp, region, points } = work
  const [atStart, atEnd] = [sharp.has(boundary.from[k]), sharp.has(boundary.to[k])]
  let share = 0.5
  if (atStart !== atEnd) {
    const length = lengthOf(work, k)
    const shell = 2 ** Math.round(Math.log2(length / 2)) / length
    share = atStart ? shell : 1 - shell
    if (share < 0.2 || share > 0.8) share = 0.5
  }
  splitPiece(region, boundary, points, k, share)
}

const TURNED = [
  [0, 0, 2],
  [1, 2, 1],
  [2, 1, 0],
]

/** The triangles of the metal: those left of a boundary piece and all that are reached without crossing one. */
function insideOf({ points, boundary }: Workpiece, { triangles, halfedges, along }: Triangulation): Mesh {
  const count = triangles.length / 3
  const pieceOf = new Int32Array(triangles.length).fill(-1)
  const inside = new Uint8Array(count)
  const stack: number[] = []
  const enter = (t: number) => {
    if (inside[t]) return
    inside[t] = 1
    stack.push(t)
  }
  along.forEach((e, k) => {
    if (e < 0) return
    pieceOf[e] = k
    if (halfedges[e] >= 0) pieceOf[halfedges[e]] = k
    enter(Math.floor(e / 3))
  })
  while (stack.length > 0) {
    const t = stack.pop() ?? 0
    for (let i = 0; i < 3; i++) {
      const other = halfedges[3 * t + i]
      if (other >= 0 && pieceOf[3 * t + i] < 0) enter(Math.floor(other / 3))
    }
  }
  const number = new Int32Array(count).fill(-1)
  let metal = 0
  for (let t = 0; t < count; t++) if (inside[t]) number[t] = metal++
  const corner = new Uint32Array(3 * metal)
  const piece = new Int32Array(3 * metal)
  const across = new Int32Array(3 * metal)
  for (let t = 0; t < count; t++) {
    const m = number[t]
    if (m < 0) continue
    // turned counter-clockwise: corners 0 2 1, sides (0→2) (2→1) (1→0) are delaunator's 2, 1, 0
    for (const [i, c, e] of TURNED) {
      corner[3 * m + i] = triangles[3 * t + c]
      piece[3 * m + i] = pieceOf[3 * t + e]
      const other = halfedges[3 * t + e]
      across[3 * m + i] = other < 0 || pieceOf[3 * t + e] >= 0 ? -1 : number[Math.floor(other / 3)]
    }
  }
  return { x: Float64Array.from(points.x), y: Float64Array.from(points.y), corner, piece, across, boundary }
}

interface Circle {
  x: number
  y: number
  /** radius² */
  square: number
  shortest: number
}

function circumcircle({ x, y, corner }: Mesh, t: number): Circle {
  const [a, b, c] = [corner[3 * t], corner[3 * t + 1], corner[3 * t + 2]]
  const [bx, by, cx, cy] = [x[b] - x[a], y[b] - y[a], x[c] - x[a], y[c] - y[a]]
  const [bb, cc] = [bx * bx + by * by, cx * cx + cy * cy]
  const twice = 2 * (bx * cy - cx * by)
  const [px, py] = [(cy * bb - by * cc) / twice, (bx * cc - cx * bb) / twice]
  const shortest = Math.sqrt(Math.min(bb, cc, (bx - cx) ** 2 + (by - cy) ** 2))
  return { x: x[a] + px, y: y[a] + py, square: px * px + py * py, shortest }
}

/**
 * What the next round adds: circumcentres of thin triangles, or splits of the pieces these would come too near to,
 * and of pieces whose blended triangle folds. Of circumcentres whose circles hold each other only one is taken,
 * so that a round does what inserting one by one would.
 */
function improvements(work: Workpiece, mesh: Mesh): { pieces: Set<number>; points: [number, number][] } {
  const pieces = new Set<number>()
  const points: [number, number][] = []
  const finder = pieceFinder(work)
  const taken = new Uint8Array(mesh.corner.length / 3)
  const quadrature = newQuadrature()
  for (let t = 0; t < taken.length; t++) {
    const circle = circumcircle(mesh, t)
    if (circle.shortest < work.floor * 4) continue
    const curved = curvedSides(mesh, t)
    if (curved.length > 1) {
      if (claim(mesh, t, circle, taken)) points.push(middleOf(mesh, t))
      continue
    }
    if (curved.length === 1 && !quadratureOf(work.region, mesh, t, quadrature)) {
      if (splittable(work, curved[0])) pieces.add(curved[0])
      continue
    }
    if (circle.shortest >= 2 * LEAST * Math.sqrt(circle.square) || [0, 1, 2].some((i) => work.sharp.has(mesh.corner[3 * t + i])))
      continue
    const near = finder(circle.x, circle.y)
    for (const k of near) if (splittable(work, k)) pieces.add(k)
    if (near.length === 0 && claim(mesh, t, circle, taken)) points.push([circle.x, circle.y])
  }
  return { pieces, points }
}

/** Marks the triangles whose circles hold the new point; false where one of them is marked already. */
function claim(mesh: Mesh, t: number, { x, y }: Pick<Circle, 'x' | 'y'>, taken: Uint8Array): boolean {
  const cavity = [t]
  const seen = new Set(cavity)
  for (let i = 0; i < cavity.length; i++) {
    if (taken[cavity[i]]) return false
    for (let side = 0; side < 3; side++) {
      const other = mesh.across[3 * cavity[i] + side]
      if (other < 0 || seen.has(other)) continue
      seen.add(other)
      const circle = circumcircle(mesh, other)
      if ((circle.x - x) ** 2 + (circle.y - y) ** 2 < circle.square) cavity.push(other)
    }
  }
  for (const other of cavity) taken[other] = 1
  return true
}

function middleOf({ x, y, corner }: Mesh, t: number): [number, number] {
  const [a, b, c] = [corner[3 * t], corner[3 * t + 1], corner[3 * t + 2]]
  return [(x[a] + x[b] + x[c]) / 3, (y[a] + y[b] + y[c]) / 3]
}

function curvedSides({ piece, boundary }: Mesh, t: number): number[] {
  return [0, 1, 2].map((i) => piece[3 * t + i]).filter((k) => k >= 0 && boundary.curved[k])
}

/** Pieces whose circle holds a point, by a grid of the pieces' circles at their own scale. */
function pieceFinder(work: Workpiece): (x: number, y: number) => number[] {
  const { points, boundary } = work
  const grids = new Map<number, Map<number, number[]>>()
  const hash = (i: number, j: number) => i * 2_097_152 + j
  boundary.from.forEach((a, k) => {
    const b = boundary.to[k]
    const power = 2 ** Math.ceil(Math.log2(lengthOf(work, k)))
    let grid = grids.get(power)
    if (!grid) {
      grid = new Map()
      grids.set(power, grid)
    }
    const [i, j] = [Math.floor((points.x[a] + points.x[b]) / 2 / power), Math.floor((points.y[a] + points.y[b]) / 2 / power)]
    const cell = grid.get(hash(i, j))
    if (cell) cell.push(k)
    else grid.set(hash(i, j), [k])
  })
  return (x, y) => {
    const found: number[] = []
    for (const [power, grid] of grids) {
      const [i, j] = [Math.floor(x / power), Math.floor(y / power)]
      for (let di = -1; di <= 1; di++)
        for (let dj = -1; dj <= 1; dj++)
          for (const k of grid.get(hash(i + di, j + dj)) ?? []) {
            const [a, b] = [boundary.from[k], boundary.to[k]]
            if ((points.x[a] - x) * (points.x[b] - x) + (points.y[a] - y) * (points.y[b] - y) < 0) found.push(k)
          }
    }
    return found
  }
}
