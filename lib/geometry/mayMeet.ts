import { orient2d } from 'robust-predicates'
import { ARC, type EdgeTable, LINE } from './edges'

/** Whether (x, y) lies within the reach of the line from a to b, ends included. Squares, for it runs in the hottest loops. */
export function nearLine(ax: number, ay: number, bx: number, by: number, x: number, y: number, reach: number): boolean {
  const dx = bx - ax
  const dy = by - ay
  const along = (x - ax) * dx + (y - ay) * dy
  const length2 = dx * dx + dy * dy
  const t = along <= 0 ? 0 : along >= length2 ? 1 : along / length2
  const px = ax + t * dx - x
  const py = ay + t * dy - y
  return px * px + py * py <= reach * reach
}

/** Whether two lines cross or come within the tolerance. */
function linesMeet(e: Float64Array, i: number, j: number, tolerance: number): boolean {
  const ax = e[4 * i]
  const ay = e[4 * i + 1]
  const bx = e[4 * i + 2]
  const by = e[4 * i + 3]
  const cx = e[4 * j]
  const cy = e[4 * j + 1]
  const dx = e[4 * j + 2]
  const dy = e[4 * j + 3]
  if (orient2d(ax, ay, bx, by, cx, cy) > 0 !== orient2d(ax, ay, bx, by, dx, dy) > 0)
    if (orient2d(cx, cy, dx, dy, ax, ay) > 0 !== orient2d(cx, cy, dx, dy, bx, by) > 0) return true
  return (
    nearLine(ax, ay, bx, by, cx, cy, tolerance) ||
    nearLine(ax, ay, bx, by, dx, dy, tolerance) ||
    nearLine(cx, cy, dx, dy, ax, ay, tolerance) ||
    nearLine(cx, cy, dx, dy, bx, by, tolerance)
  )
}

/** Whether a line comes near the circle of an arc. */
function lineNearCircle(edges: EdgeTable, line: number, arc: number, tolerance: number): boolean {
  const e = edges.ends
  const ax = e[4 * line]
  const ay = e[4 * line + 1]
  const bx = e[4 * line + 2]
  const by = e[4 * line + 3]
  const k = edges.shape[arc]
  const cx = edges.shapes[k]
  const cy = edges.shapes[k + 1]
  const r = edges.shapes[k + 2]
  const inside = r - tolerance
  const within = (x: number, y: number) => inside > 0 && (x - cx) * (x - cx) + (y - cy) * (y - cy) < inside * inside
  if (within(ax, ay) && within(bx, by)) return false
  return nearLine(ax, ay, bx, by, cx, cy, r + tolerance)
}

function circlesMeet(edges: EdgeTable, i: number, j: number, tolerance: number): boolean {
  const s = edges.shapes
  const k = edges.shape[i]
  const m = edges.shape[j]
  const d = Math.hypot(s[k] - s[m], s[k + 1] - s[m + 1])
  return d <= s[k + 2] + s[m + 2] + tolerance && d >= Math.abs(s[k + 2] - s[m + 2]) - tolerance
}

/** False where edges i and j surely stay apart by more than the tolerance; for two lines the answer is exact. */
export function mayMeet(edges: EdgeTable, i: number, j: number, tolerance: number): boolean {
  const a = edges.kind[i]
  const b = edges.kind[j]
  if (a === LINE && b === LINE) return linesMeet(edges.ends, i, j, tolerance)
  if (a === LINE && b === ARC) return lineNearCircle(edges, i, j, tolerance)
  if (a === ARC && b === LINE) return lineNearCircle(edges, j, i, tolerance)
  if (a === ARC && b === ARC) return circlesMeet(edges, i, j, tolerance)
  return true
}

const TURN = 2 * Math.PI

/** Whether the direction of (x, y) from the centre lies in the arc's sweep. */
function inSweep(s: Float64Array, k: number, x: number, y: number): boolean {
  const angle = (Math.atan2(y - s[k + 1], x - s[k]) - s[k + 3]) * (s[k + 4] < 0 ? -1 : 1)
  return angle - TURN * Math.floor(angle / TURN) <= Math.abs(s[k + 4])
}

/**
 * False where two edges that share the joint (x, y) surely meet nowhere else: lines that do not double back, a line
 * and an arc, or two arcs, whose circles' second crossing lies off either. Other kinds: true, ask the exact test.
 */
export function mayMeetAgain(edges: EdgeTable, i: number, j: number, x: number, y: number, tolerance: number): boolean {
  const a = edges.kind[i]
  const b = edges.kind[j]
  const s = edges.shapes
  if (a === LINE && b === LINE) {
    const [ux, uy] = away(edges, i, x, y)
    const [vx, vy] = away(edges, j, x, y)
    return ux * vx + uy * vy > 0 && Math.abs(ux * vy - uy * vx) <= tolerance * Math.max(Math.hypot(ux, uy), Math.hypot(vx, vy))
  }
  if (a === ARC && b === LINE) return mayMeetAgain(edges, j, i, x, y, tolerance)
  if (a === LINE && b === ARC) {
    const [ux, uy] = away(edges, i, x, y)
    const k = edges.shape[j]
    const t = (-2 * ((x - s[k]) * ux + (y - s[k + 1]) * uy)) / (ux * ux + uy * uy)
    return t * Math.sqrt(ux * ux + uy * uy) > tolerance && t <= 1 && inSweep(s, k, x + t * ux, y + t * uy)
  }
  if (a !== ARC || b !== ARC) return true
  const k = edges.shape[i]
  const m = edges.shape[j]
  const dx = s[m] - s[k]
  const dy = s[m + 1] - s[k + 1]
  const d2 = dx * dx + dy * dy
  if (d2 <= tolerance * tolerance) return s[k + 4] * s[m + 4] < 0 || Math.abs(s[k + 4]) + Math.abs(s[m + 4]) > TURN + 1e-9
  const along = ((x - s[k]) * dx + (y - s[k + 1]) * dy) / d2
  const px = 2 * (s[k] + along * dx) - x
  const py = 2 * (s[k + 1] + along * dy) - y
  if (Math.hypot(px - x, py - y) <= tolerance) return false
  return inSweep(s, k, px, py) && inSweep(s, m, px, py)
}

/** The line's direction away from its end at (x, y), its length. */
function away(edges: EdgeTable, i: number, x: number, y: number): [number, number] {
  const e = edges.ends
  const sign = e[4 * i] === x && e[4 * i + 1] === y ? 1 : -1
  return [sign * (e[4 * i + 2] - e[4 * i]), sign * (e[4 * i + 3] - e[4 * i + 1])]
}
