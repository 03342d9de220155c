import { LINE } from '../../geometry/edges'
import { jetAt, newJet } from '../../geometry/evaluate'
import type { Region } from '../../geometry/region'

/**
 * The boundary as short pieces between mesh vertices. Piece k runs from vertex `from[k]` to `to[k]` along edge
 * `edge[k]` of the region, parameters t0 to t1, metal on its left. `curved` pieces follow the true edge.
 */
export interface Boundary {
  from: number[]
  to: number[]
  edge: number[]
  t0: number[]
  t1: number[]
  curved: boolean[]
  /** loop of the region the piece belongs to */
  loop: number[]
}

export interface Points {
  x: number[]
  y: number[]
}

const jet = newJet()

/** The point of a region's edge at t, exact on its carrier. */
export function pointOn(region: Region, edge: number, t: number): { x: number; y: number } {
  jetAt(region.edges, edge, t, jet)
  return { x: jet.x, y: jet.y }
}

/** Greatest turning of one piece, rad: keeps the blended maps of its triangles one to one. */
const TURN = Math.PI / 4

/** Pieces of every loop: edges split so that none turns more than 45° nor is longer than `longest`. */
export function boundaryOf(region: Region, points: Points, longest: number): Boundary {
  const known = new Map<string, number>()
  // loops that touch share the vertex, or the triangulation would see two in one place
  const vertexAt = (x: number, y: number): number => {
    const key = `${x} ${y}`
    const vertex = known.get(key) ?? points.x.length
    if (vertex === points.x.length) {
      known.set(key, vertex)
      points.x.push(x)
      points.y.push(y)
    }
    return vertex
  }
  const boundary: Boundary = { from: [], to: [], edge: [], t0: [], t1: [], curved: [], loop: [] }
  const { edges, loopStart } = region
  for (let loop = 0; loop + 1 < loopStart.length; loop++) {
    const first = boundary.from.length
    for (let edge = loopStart[loop]; edge < loopStart[loop + 1]; edge++) {
      const curved = edges.kind[edge] !== LINE
      const length = Math.hypot(
        edges.ends[4 * edge + 2] - edges.ends[4 * edge],
        edges.ends[4 * edge + 3] - edges.ends[4 * edge + 1],
      )
      const turns = curved ? Math.ceil(turning(region, edge) / TURN - 1e-9) : 1
      const pieces = Math.max(1, turns, Math.ceil(length / longest - 1e-9))
      for (let i = 0; i < pieces; i++) {
        const { x, y } = i === 0 ? { x: edges.ends[4 * edge], y: edges.ends[4 * edge + 1] } : pointOn(region, edge, i / pieces)
        boundary.from.push(vertexAt(x, y))
        boundary.edge.push(edge)
        boundary.t0.push(i / pieces)
        boundary.t1.push((i + 1) / pieces)
        boundary.curved.push(curved)
        boundary.loop.push(loop)
      }
    }
    for (let k = first; k < boundary.from.length; k++)
      boundary.to.push(boundary.from[k + 1 < boundary.from.length ? k + 1 : first])
  }
  return boundary
}

/** Total turning of an edge's tangent, rad, by 16 steps. */
function turning(region: Region, edge: number): number {
  let total = 0
  jetAt(region.edges, edge, 0, jet)
  let before = Math.atan2(jet.dy, jet.dx)
  for (let i = 1; i <= 16; i++) {
    jetAt(region.edges, edge, i / 16, jet)
    const now = Math.atan2(jet.dy, jet.dx)
    total += Math.abs(Math.atan2(Math.sin(now - before), Math.cos(now - before)))
    before = now
  }
  return total
}

/** Splits piece k at the share u of its parameter range; the new vertex lies on the true edge. */
export function splitPiece(region: Region, boundary: Boundary, points: Points, k: number, u = 0.5): void {
  const t = boundary.t0[k] + u * (boundary.t1[k] - boundary.t0[k])
  const { x, y } = pointOn(region, boundary.edge[k], t)
  const middle = points.x.length
  points.x.push(x)
  points.y.push(y)
  boundary.from.push(middle)
  boundary.to.push(boundary.to[k])
  boundary.edge.push(boundary.edge[k])
  boundary.t0.push(t)
  boundary.t1.push(boundary.t1[k])
  boundary.curved.push(boundary.curved[k])
  boundary.loop.push(boundary.loop[k])
  boundary.to[k] = middle
  boundary.t1[k] = t
}
