import { orient2d } from 'robust-predicates'
import { valueAt } from './bernstein'
import { type BezierXy, bezierXy, turnsOf } from './bezierXy'
import { ARC, ELLIPSE, type EdgeTable, LINE } from './edges'

/**
 * Crossings of the ray from (x, y) to the right with edge i, upward ones +1, downward ones −1, by the half-open rule on
 * y-monotone pieces (lower end in, upper end out): a loop's total is how often it winds round the point. Signs by robust predicates for lines (their
 * y axis points down: the sign is turned here), by the circle's and the curve's own equation else.
 */
function crossings(edges: EdgeTable, i: number, x: number, y: number): number {
  const e = edges.ends
  const ax = e[4 * i]
  const ay = e[4 * i + 1]
  const bx = e[4 * i + 2]
  const by = e[4 * i + 3]
  switch (edges.kind[i]) {
    case LINE:
      return crossesLine(ax, ay, bx, by, x, y) ? (by > ay ? 1 : -1) : 0
    case ARC:
      return crossesArc(edges, i, x, y)
    case ELLIPSE:
      return crossesEllipse(edges, i, x, y)
    default:
      return crossesBezier(edges, i, x, y)
  }
}

function crossesLine(ax: number, ay: number, bx: number, by: number, x: number, y: number): boolean {
  if (ay <= y === by <= y) return false
  if (ax > x && bx > x) return true
  if (ax <= x && bx <= x) return false
  const left = -orient2d(ax, ay, bx, by, x, y)
  return by > ay ? left > 0 : left < 0
}

/** y-monotone pieces of a cosine-like coordinate: its turning parameters within the sweep, in walking order. */
function turnings(start: number, sweep: number, extreme: number): number[] {
  const list: number[] = []
  const from = Math.min(start, start + sweep)
  const to = Math.max(start, start + sweep)
  for (let q = Math.ceil((from - extreme) / Math.PI); extreme + q * Math.PI < to; q++)
    if (extreme + q * Math.PI > from) list.push(extreme + q * Math.PI)
  return sweep < 0 ? list.reverse() : list
}

function crossesArc(edges: EdgeTable, i: number, x: number, y: number): number {
  const s = edges.shapes
  const k = edges.shape[i]
  const cx = s[k]
  const cy = s[k + 1]
  const r = s[k + 2]
  const e = edges.ends
  if (y > Math.max(cy + r, e[4 * i + 1], e[4 * i + 3]) || y < Math.min(cy - r, e[4 * i + 1], e[4 * i + 3])) return 0
  const inCircle = (x - cx) * (x - cx) + (y - cy) * (y - cy) < r * r
  const start = s[k + 3]
  const sweep = s[k + 4]
  const turns = turnings(start, sweep, Math.PI / 2)
  let count = 0
  let fromY = e[4 * i + 1]
  let fromAngle = start
  for (let p = 0; p <= turns.length; p++) {
    const last = p === turns.length
    const toAngle = last ? start + sweep : turns[p]
    const toY = last ? e[4 * i + 3] : Math.sin(toAngle) > 0 ? cy + r : cy - r
    if (fromY <= y !== toY <= y) {
      const rightSide = Math.cos(0.5 * (fromAngle + toAngle)) > 0
      if (rightSide ? x < cx || inCircle : x < cx && !inCircle) count += toY > fromY ? 1 : -1
    }
    fromY = toY
    fromAngle = toAngle
  }
  return count
}

function crossesEllipse(edges: EdgeTable, i: number, x: number, y: number): number {
  const s = edges.shapes
  const k = edges.shape[i]
  const [cx, cy, ux, uy, vx, vy, start, sweep] = s.subarray(k, k + 8)
  const e = edges.ends
  const extreme = Math.atan2(vy, uy)
  const reach = Math.hypot(uy, vy)
  const turns = turnings(start, sweep, extreme)
  let count = 0
  let fromY = e[4 * i + 1]
  let fromAngle = start
  for (let p = 0; p <= turns.length; p++) {
    const last = p === turns.length
    const toAngle = last ? start + sweep : turns[p]
    const toY = last ? e[4 * i + 3] : Math.cos(toAngle - extreme) > 0 ? cy + reach : cy - reach
    if (fromY <= y !== toY <= y) {
      const away = Math.acos(Math.max(-1, Math.min(1, (y - cy) / reach)))
      const middle = 0.5 * (fromAngle + toAngle)
      const side = Math.sin(middle - extreme) > 0 ? 1 : -1
      const t = extreme + side * away
      if (cx + ux * Math.cos(t) + vx * Math.sin(t) > x) count += toY > fromY ? 1 : -1
    }
    fromY = toY
    fromAngle = toAngle
  }
  return count
}

function crossesBezier(edges: EdgeTable, i: number, x: number, y: number): number {
  const s = edges.shapes
  const k = edges.shape[i]
  let minX = Number.POSITIVE_INFINITY
  let maxX = Number.NEGATIVE_INFINITY
  let minY = Number.POSITIVE_INFINITY
  let maxY = Number.NEGATIVE_INFINITY
  for (let j = 0; j <= s[k]; j++) {
    minX = Math.min(minX, s[k + 2 + 3 * j])
    maxX = Math.max(maxX, s[k + 2 + 3 * j])
    minY = Math.min(minY, s[k + 3 + 3 * j])
    maxY = Math.max(maxY, s[k + 3 + 3 * j])
  }
  const e = edges.ends
  const ay = e[4 * i + 1]
  const by = e[4 * i + 3]
  if (y > Math.max(maxY, ay, by) || y < Math.min(minY, ay, by) || x > Math.max(maxX, e[4 * i], e[4 * i + 2])) return 0
  if (x < Math.min(minX, e[4 * i], e[4 * i + 2])) return ay <= y === by <= y ? 0 : by > ay ? 1 : -1
  const curve = bezierXy(edges, i)
  const knots = [0, ...turnsOf(curve.y, curve), 1]
  let count = 0
  for (let p = 1; p < knots.length; p++) {
    const fromY = p === 1 ? ay : yAt(curve, knots[p - 1])
    const toY = p === knots.length - 1 ? by : yAt(curve, knots[p])
    if (fromY <= y === toY <= y) continue
    const t = level(curve, knots[p - 1], knots[p], y, toY > fromY)
    if (valueAt(curve.x, t) / valueAt(curve.w, t) > x) count += toY > fromY ? 1 : -1
  }
  return count
}

const yAt = (curve: BezierXy, t: number) => valueAt(curve.y, t) / valueAt(curve.w, t)

function level(curve: BezierXy, from: number, to: number, y: number, rising: boolean): number {
  let low = from
  let high = to
  for (let step = 0; step < 54; step++) {
    const middle = 0.5 * (low + high)
    if (yAt(curve, middle) > y === rising) high = middle
    else low = middle
  }
  return 0.5 * (low + high)
}

/** How often the loop of edges from … to − 1 winds round (x, y), counter-clockwise positive. */
export function windingOf(edges: EdgeTable, from: number, to: number, x: number, y: number): number {
  let count = 0
  for (let i = from; i < to; i++) count += crossings(edges, i, x, y)
  return count
}

/** True where (x, y) lies inside the loop of edges from … to − 1 (even–odd); on the boundary either may come out. */
export function insideLoop(edges: EdgeTable, from: number, to: number, x: number, y: number): boolean {
  return windingOf(edges, from, to, x, y) % 2 !== 0
}

/** The same over a list of rows: the only edges whose span in y can hold the point's. */
export function insideRows(edges: EdgeTable, rows: Uint32Array, from: number, to: number, x: number, y: number): boolean {
  let count = 0
  for (let r = from; r < to; r++) count += crossings(edges, rows[r], x, y)
  return count % 2 !== 0
}
