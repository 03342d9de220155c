import { orient2d } from 'robust-predicates'
import { ARC, BEZIER, LINE } from '../edges'
import { pointAt } from './curve'
import { angleNear, footOn } from './foot'
import type { Pieces } from './monotone'
import { meetBySubdivision } from './subdivide'

/** Takes a point that pieces i and j have in common: its parameters on both, and where it is. */
export type Meet = (i: number, ti: number, j: number, tj: number, x: number, y: number) => void

const foot = new Float64Array(2)

/**
 * All points that monotone pieces i and j have in common within the tolerance. Ends of one that lie on
 * the other come first, with the end's own coordinates; a shared stretch is told by its two ends only.
 * Where two carriers come within the tolerance without crossing cleanly there is one foot point.
 */
export function meetPieces(pieces: Pieces, i: number, j: number, tolerance: number, meet: Meet): void {
  const ends = meetEnds(pieces, i, j, tolerance, meet)
  const { table, edge } = pieces
  const ki = table.kind[edge[i]]
  const kj = table.kind[edge[j]]
  if (ki === LINE && kj === LINE) lineLine(pieces, i, j, tolerance, meet)
  else if (ki === LINE && kj !== BEZIER) lineConic(pieces, i, j, tolerance, meet)
  else if (kj === LINE && ki !== BEZIER) lineConic(pieces, j, i, tolerance, meet)
  else if (ki === ARC && kj === ARC) arcArc(pieces, i, j, tolerance, meet)
  else if (!(ends >= 2 && sameStretch(pieces, i, j, tolerance))) meetBySubdivision(pieces, i, j, tolerance, meet)
}

/** Ends of each on the other; returns how many. */
function meetEnds(pieces: Pieces, i: number, j: number, tolerance: number, meet: Meet): number {
  let found = 0
  for (let side = 0; side < 4; side++) {
    const own = side < 2 ? i : j
    const other = side < 2 ? j : i
    const k = 4 * own + 2 * (side & 1)
    const x = pieces.ends[k]
    const y = pieces.ends[k + 1]
    const o = 4 * other
    const e = pieces.ends
    if (x < Math.min(e[o], e[o + 2]) - tolerance || x > Math.max(e[o], e[o + 2]) + tolerance) continue
    if (y < Math.min(e[o + 1], e[o + 3]) - tolerance || y > Math.max(e[o + 1], e[o + 3]) + tolerance) continue
    const t = footOn(pieces, other, x, y, foot)
    if (Math.hypot(foot[0] - x, foot[1] - y) > tolerance) continue
    const tOwn = side & 1 ? pieces.t1[own] : pieces.t0[own]
    if (side < 2) meet(i, tOwn, j, t, x, y)
    else meet(i, t, j, tOwn, x, y)
    found++
  }
  return found
}

/** The crossing of two lines by robust orientation; of nearly collinear ones only where both parameters tell one place. */
function lineLine(pieces: Pieces, i: number, j: number, tolerance: number, meet: Meet): void {
  const e = pieces.ends
  const [ax, ay, bx, by] = [e[4 * i], e[4 * i + 1], e[4 * i + 2], e[4 * i + 3]]
  const [cx, cy, dx, dy] = [e[4 * j], e[4 * j + 1], e[4 * j + 2], e[4 * j + 3]]
  const c = orient2d(ax, ay, bx, by, cx, cy)
  const d = orient2d(ax, ay, bx, by, dx, dy)
  if (!((c > 0 && d < 0) || (c < 0 && d > 0))) return
  const a = orient2d(cx, cy, dx, dy, ax, ay)
  const b = orient2d(cx, cy, dx, dy, bx, by)
  if (!((a > 0 && b < 0) || (a < 0 && b > 0))) return
  const ti = a / (a - b)
  const tj = c / (c - d)
  const x = ax + ti * (bx - ax)
  const y = ay + ti * (by - ay)
  if (Math.hypot(cx + tj * (dx - cx) - x, cy + tj * (dy - cy) - y) <= tolerance / 4) meet(i, ti, j, tj, x, y)
}

const within = (t: number, a: number, b: number) => (a < b ? t > a && t < b : t > b && t < a)

/**
 * Line piece i and piece j of an arc or ellipse. The signed distance of c + u·cos t + v·sin t from the
 * line is d + R·cos(t − φ): two zeros, one foot point where |d| is within the tolerance of R, or none.
 */
function lineConic(pieces: Pieces, i: number, j: number, tolerance: number, meet: Meet): void {
  const { table, ends } = pieces
  const ax = ends[4 * i]
  const ay = ends[4 * i + 1]
  const lx = ends[4 * i + 2] - ax
  const ly = ends[4 * i + 3] - ay
  const long = Math.hypot(lx, ly)
  const nx = -ly / long
  const ny = lx / long
  const s = table.shapes
  const k = table.shape[pieces.edge[j]]
  const arc = table.kind[pieces.edge[j]] === ARC
  const alongU = arc ? nx * s[k + 2] : nx * s[k + 2] + ny * s[k + 3]
  const alongV = arc ? ny * s[k + 2] : nx * s[k + 4] + ny * s[k + 5]
  const d = nx * (s[k] - ax) + ny * (s[k + 1] - ay)
  const reach = arc ? s[k + 2] : Math.hypot(alongU, alongV)
  if (Math.abs(d) > reach + tolerance) return
  const phi = Math.atan2(alongV, alongU)
  const t0 = pieces.t0[j]
  const t1 = pieces.t1[j]
  const at = (angle: number, touching: boolean) => {
    const t = angleNear(angle, (t0 + t1) / 2)
    if (!within(t, t0, t1)) return
    const c = Math.cos(t)
    const n = Math.sin(t)
    let x = s[k] + (arc ? s[k + 2] * c : s[k + 2] * c + s[k + 4] * n)
    let y = s[k + 1] + (arc ? s[k + 2] * n : s[k + 3] * c + s[k + 5] * n)
    const along = ((x - ax) * lx + (y - ay) * ly) / (long * long)
    if (!(along > 0 && along < 1)) return
    if (touching) {
      x = ax + along * lx
      y = ay + along * ly
    }
    meet(i, along, j, t, x, y)
  }
  if (Math.abs(Math.abs(d) - reach) <= tolerance) {
    at(d > 0 ? phi + Math.PI : phi, true)
    return
  }
  const half = Math.atan2(Math.sqrt((reach - d) * (reach + d)), -d)
  at(phi + half, false)
  at(phi - half, false)
}

/** Two arcs: on the line through the centres, a from the first, ± h beside it; one foot point near tangency. */
function arcArc(pieces: Pieces, i: number, j: number, tolerance: number, meet: Meet): void {
  const { table } = pieces
  const s = table.shapes
  const p = table.shape[pieces.edge[i]]
  const q = table.shape[pieces.edge[j]]
  const dx = s[q] - s[p]
  const dy = s[q + 1] - s[p + 1]
  const r = s[p + 2]
  const R = s[q + 2]
  const d = Math.hypot(dx, dy)
  const differ = Math.abs(r - R)
  if (d + differ <= tolerance || d > r + R + tolerance || d < differ - tolerance) return
  const ux = dx / d
  const uy = dy / d
  const outside = Math.abs(d - (r + R)) <= tolerance
  const touching = outside || Math.abs(d - differ) <= tolerance
  const side = !outside && R > r ? -1 : 1
  const a = touching ? side * r : (d + ((r - R) * (r + R)) / d) / 2
  const h = touching ? 0 : Math.sqrt(Math.max(0, (r - a) * (r + a)))
  const at = (h: number) => {
    const x = s[p] + a * ux - h * uy
    const y = s[p + 1] + a * uy + h * ux
    const ti = angleNear(Math.atan2(y - s[p + 1], x - s[p]), (pieces.t0[i] + pieces.t1[i]) / 2)
    const tj = angleNear(Math.atan2(y - s[q + 1], x - s[q]), (pieces.t0[j] + pieces.t1[j]) / 2)
    if (within(ti, pieces.t0[i], pieces.t1[i]) && within(tj, pieces.t0[j], pieces.t1[j])) meet(i, ti, j, tj, x, y)
  }
  at(h)
  if (h > 0) at(-h)
}

/** Whether two pieces that meet at two ends run within the tolerance of each other in between. */
function sameStretch(pieces: Pieces, i: number, j: number, tolerance: number): boolean {
  const found: number[] = []
  meetEnds(pieces, i, j, tolerance, (_i, t) => found.push(t))
  const low = Math.min(...found)
  const high = Math.max(...found)
  if (!(high > low)) return false
  return runsAlong(pieces, i, low, high, pieces, j, tolerance)
}

const probe = new Float64Array(2)

/** Whether five points of piece i between the parameters lie within the tolerance of piece j. */
export function runsAlong(a: Pieces, i: number, low: number, high: number, b: Pieces, j: number, tolerance: number): boolean {
  for (let n = 1; n <= 5; n++) {
    const t = low + ((high - low) * n) / 6
    pointAt(a.table, a.edge[i], t, probe)
    const { 0: x, 1: y } = probe
    footOn(b, j, x, y, foot)
    if (Math.hypot(foot[0] - x, foot[1] - y) > tolerance) return false
  }
  return true
}
