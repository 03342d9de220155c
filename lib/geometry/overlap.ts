import { ARC, BEZIER, type EdgeTable, ELLIPSE, LINE } from './edges'
import { jetAt, lengthOf, newJet } from './evaluate'
import { nearestOn } from './nearest'

const jet = newJet()
const TURN = 2 * Math.PI

/** Whether both ends and three points between of edge i (of table a) lie within the tolerance of edge j (of table b). */
export function liesOnEdge(a: EdgeTable, i: number, b: EdgeTable, j: number, tolerance: number): boolean {
  for (const t of [0, 1, 0.5, 0.25, 0.75]) {
    jetAt(a, i, t, jet)
    if (nearestOn(b, j, jet.x, jet.y).distance > tolerance) return false
  }
  return true
}

/**
 * The stretch of edge j along the carrier of edge i of the same kind: from and to as lengths from i's first end
 * along i, ascending. Null where j leaves that carrier by more than the tolerance.
 */
export function stretchAlong(edges: EdgeTable, i: number, j: number, tolerance: number): [number, number] | null {
  if (edges.kind[i] === LINE && edges.kind[j] === LINE) return alongLine(edges, i, j, tolerance)
  if (edges.kind[i] === ARC && edges.kind[j] === ARC) return alongArc(edges, i, j, tolerance)
  return null
}

function alongLine({ ends: e }: EdgeTable, i: number, j: number, tolerance: number): [number, number] | null {
  const length = Math.hypot(e[4 * i + 2] - e[4 * i], e[4 * i + 3] - e[4 * i + 1])
  const ux = (e[4 * i + 2] - e[4 * i]) / length
  const uy = (e[4 * i + 3] - e[4 * i + 1]) / length
  const s: number[] = []
  for (const end of [0, 2]) {
    const x = e[4 * j + end] - e[4 * i]
    const y = e[4 * j + end + 1] - e[4 * i + 1]
    if (Math.abs(x * uy - y * ux) > tolerance) return null
    s.push(x * ux + y * uy)
  }
  return s[0] <= s[1] ? [s[0], s[1]] : [s[1], s[0]]
}

function alongArc(edges: EdgeTable, i: number, j: number, tolerance: number): [number, number] | null {
  const s = edges.shapes
  const k = edges.shape[i]
  const m = edges.shape[j]
  const apart = Math.hypot(s[k] - s[m], s[k + 1] - s[m + 1])
  if (apart + Math.abs(s[k + 2] - s[m + 2]) > tolerance) {
    for (const t of [0, 0.25, 0.5, 0.75, 1]) {
      jetAt(edges, j, t, jet)
      if (Math.abs(Math.hypot(jet.x - s[k], jet.y - s[k + 1]) - s[k + 2]) > tolerance) return null
    }
  }
  const r = s[k + 2]
  const sign = s[k + 4] < 0 ? -1 : 1
  jetAt(edges, j, 0.5, jet)
  const middle = sign * (Math.atan2(jet.y - s[k + 1], jet.x - s[k]) - s[k + 3])
  const half = 0.5 * Math.abs(s[m + 4])
  // of the turns that name the same stretch, the one nearest to edge i's middle
  const turned = middle - TURN * Math.round((middle - 0.5 * Math.abs(s[k + 4])) / TURN)
  return [r * (turned - half), r * (turned + half)]
}

/** False where two edges surely do not run along one another: another kind, or lines off each other's carrier. */
export function mayOverlap(edges: EdgeTable, i: number, j: number, tolerance: number): boolean {
  if (edges.kind[i] !== edges.kind[j]) return false
  if (edges.kind[i] !== LINE) return true
  const e = edges.ends
  const ix = e[4 * i + 2] - e[4 * i]
  const iy = e[4 * i + 3] - e[4 * i + 1]
  const jx = e[4 * j + 2] - e[4 * j]
  const jy = e[4 * j + 3] - e[4 * j + 1]
  const i2 = ix * ix + iy * iy
  const j2 = jx * jx + jy * jy
  const cross = ix * jy - iy * jx
  if (cross * cross > 4 * tolerance * tolerance * Math.max(i2, j2)) return false
  const off = (e[4 * j] - e[4 * i]) * iy - (e[4 * j + 1] - e[4 * i + 1]) * ix
  const offBack = (e[4 * i] - e[4 * j]) * jy - (e[4 * i + 1] - e[4 * j + 1]) * jx
  return off * off <= tolerance * tolerance * i2 || offBack * offBack <= tolerance * tolerance * j2
}

/** Length over which two edges of one kind run along one another; 0 for less than the tolerance, unless one lies wholly on the other. */
export function overlapOf(edges: EdgeTable, i: number, j: number, tolerance: number): number {
  if (edges.kind[i] !== edges.kind[j]) return 0
  const li = lengthOf(edges, i)
  const lj = lengthOf(edges, j)
  const [long, short] = li >= lj ? [i, j] : [j, i]
  if (edges.kind[i] === ELLIPSE || edges.kind[i] === BEZIER)
    return liesOnEdge(edges, short, edges, long, tolerance) ? Math.min(li, lj) : 0
  const stretch = stretchAlong(edges, long, short, tolerance)
  if (!stretch) return 0
  const common = Math.min(stretch[1], Math.max(li, lj)) - Math.max(stretch[0], 0)
  return common > tolerance || common >= 0.999 * Math.min(li, lj) ? common : 0
}
