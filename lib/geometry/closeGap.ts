import { outward } from './carrier'
import { ARC, type EdgeTable, LINE } from './edges'

/** How two ends that do not meet are brought together. */
export interface Closing {
  how: 'carriers extended' | 'joined at the tangent point' | 'ends joined' | 'bridged by a straight edge'
  /** where both ends go; null: they stay and a straight edge joins them */
  meet: [number, number] | null
  /** area that the other reasonable closing would add to a loop that is counter-clockwise from p to q, drawing units² */
  area: number
}

/** One end of an edge: row and 0 (first) or 1 (second). */
export interface EndRef {
  row: number
  end: 0 | 1
  x: number
  y: number
}

const SIN_10_DEGREES = Math.sin(Math.PI / 18)

type XY = [number, number]
/** What a loop gains by going from a to c instead of a to b to c. */
const shortcut = (a: XY, b: XY, c: XY) => -0.5 * ((b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]))

/** Crossing of the two carriers nearest to the gap; lines and arcs in closed form, other curves by their tangent. */
function crossing(edges: EdgeTable, p: EndRef, q: EndRef, u: XY, v: XY): XY | null {
  const line = (e: EndRef) => edges.kind[e.row] !== ARC
  if (line(p) && line(q)) {
    const det = u[0] * v[1] - u[1] * v[0]
    const t = ((q.x - p.x) * v[1] - (q.y - p.y) * v[0]) / det
    return [p.x + t * u[0], p.y + t * u[1]]
  }
  if (line(p)) return lineCircle(edges, q.row, p, u)
  if (line(q)) return lineCircle(edges, p.row, q, v)
  return circleCircle(edges, p, q)
}

function lineCircle(edges: EdgeTable, arc: number, p: EndRef, u: XY): XY | null {
  const s = edges.shapes
  const k = edges.shape[arc]
  const fx = p.x - s[k]
  const fy = p.y - s[k + 1]
  const b = fx * u[0] + fy * u[1]
  const across = fx * u[1] - fy * u[0]
  const half = (s[k + 2] - across) * (s[k + 2] + across)
  if (half < 0) return null
  const root = Math.sqrt(half)
  const t = Math.abs(-b - root) < Math.abs(-b + root) ? -b - root : -b + root
  return [p.x + t * u[0], p.y + t * u[1]]
}

function circleCircle(edges: EdgeTable, p: EndRef, q: EndRef): XY | null {
  const s = edges.shapes
  const k = edges.shape[p.row]
  const m = edges.shape[q.row]
  const dx = s[m] - s[k]
  const dy = s[m + 1] - s[k + 1]
  const d = Math.hypot(dx, dy)
  if (d === 0) return null
  const along = (d * d + (s[k + 2] - s[m + 2]) * (s[k + 2] + s[m + 2])) / (2 * d)
  const half = (s[k + 2] - along) * (s[k + 2] + along)
  if (half < 0) return null
  const side = Math.sign(dx * (p.y - s[k + 1]) - dy * (p.x - s[k])) * Math.sqrt(half)
  return [s[k] + (along * dx - side * dy) / d, s[k + 1] + (along * dy + side * dx) / d]
}

/** The foot point where a line and an arc, or two arcs, run into one another smoothly. */
function footPoint(edges: EdgeTable, p: EndRef, q: EndRef, u: XY): XY | null {
  const s = edges.shapes
  const pIsLine = edges.kind[p.row] === LINE
  const qIsLine = edges.kind[q.row] === LINE
  if (pIsLine && qIsLine) return null
  const k = edges.shape[p.row]
  const m = edges.shape[q.row]
  if (pIsLine && edges.kind[q.row] === ARC) {
    const t = (s[m] - p.x) * u[0] + (s[m + 1] - p.y) * u[1]
    return [p.x + t * u[0], p.y + t * u[1]]
  }
  if (edges.kind[p.row] !== ARC || edges.kind[q.row] !== ARC) return null
  const d = Math.hypot(s[m] - s[k], s[m + 1] - s[k + 1])
  if (d <= 1e-6 * (s[k + 2] + s[m + 2])) return null
  const ux = (s[m] - s[k]) / d
  const uy = (s[m + 1] - s[k + 1]) / d
  const towards = (p.x - s[k]) * ux + (p.y - s[k + 1]) * uy >= 0 ? 1 : -1
  const fromOther = (q.x - s[m]) * ux + (q.y - s[m + 1]) * uy >= 0 ? 1 : -1
  const onP = towards * s[k + 2]
  const onQ = d + fromOther * s[m + 2]
  const t = 0.5 * (onP + onQ)
  return [s[k] + t * ux, s[k + 1] + t * uy]
}

const within = (a: XY | null, p: EndRef, q: EndRef, reach: number): a is XY =>
  a !== null && Math.hypot(a[0] - p.x, a[1] - p.y) <= reach && Math.hypot(a[0] - q.x, a[1] - q.y) <= reach

/**
 * Closes the gap between ends p and q, no wider than `tolerance`. Carriers that meet at more than 10° within the
 * tolerance are extended to their crossing; near tangency the foot point joins them, never the crossing (it runs
 * away); else a gap that the drawing's digits explain (`small`) is taken out, and a wider one keeps both ends and
 * is bridged by a straight edge.
 */
export function closeGap(edges: EdgeTable, p: EndRef, q: EndRef, tolerance: number, small: boolean): Closing {
  const u = outward(edges, p.row, p.end)
  const v = outward(edges, q.row, q.end)
  const P: XY = [p.x, p.y]
  const Q: XY = [q.x, q.y]
  const sine = Math.abs(u[0] * v[1] - u[1] * v[0])
  if (sine > SIN_10_DEGREES) {
    const meet = crossing(edges, p, q, u, v)
    if (within(meet, p, q, tolerance)) return { how: 'carriers extended', meet, area: shortcut(P, meet, Q) }
  } else if (u[0] * v[0] + u[1] * v[1] < 0) {
    const meet = footPoint(edges, p, q, u) ?? footPoint(edges, q, p, v)
    if (within(meet, p, q, tolerance)) return { how: 'joined at the tangent point', meet, area: shortcut(P, meet, Q) }
    const overlap = (q.x - p.x) * u[0] + (q.y - p.y) * u[1] < 0
    if (overlap) return { how: 'ends joined', meet: middle(P, Q), area: 0 }
  }
  if (small) return { how: 'ends joined', meet: preferred(edges, p, q), area: 0 }
  return { how: 'bridged by a straight edge', meet: null, area: swing(edges, p, q) }
}

const middle = (a: XY, b: XY): XY => [0.5 * (a[0] + b[0]), 0.5 * (a[1] + b[1])]

/** A line's end before a curve's, else the lower in x, then y: the same whichever comes first. */
function preferred(edges: EdgeTable, p: EndRef, q: EndRef): XY {
  const line = (e: EndRef) => edges.kind[e.row] === LINE
  const first = line(p) !== line(q) ? line(p) : p.x < q.x || (p.x === q.x && p.y < q.y)
  return first ? [p.x, p.y] : [q.x, q.y]
}

/** Area that the other reasonable closing of a bridge would change: the shorter edge swung to the other's end. */
function swing(edges: EdgeTable, p: EndRef, q: EndRef): number {
  const far = (e: EndRef): XY => [edges.ends[4 * e.row + 2 - 2 * e.end], edges.ends[4 * e.row + 3 - 2 * e.end]]
  const a = far(p)
  const b = far(q)
  const length = (e: EndRef, f: XY) => Math.hypot(e.x - f[0], e.y - f[1])
  return length(p, a) <= length(q, b) ? shortcut(a, [p.x, p.y], [q.x, q.y]) : shortcut([p.x, p.y], [q.x, q.y], b)
}
