import { jetAt, pointAt } from './curve'
import { footOn } from './foot'
import type { Meet } from './meet'
import type { Pieces } from './monotone'

/** Pairs of stretches looked at for one pair of pieces before giving up on finding more. */
const MOST_NODES = 20_000
/** Two stretches count as nearly straight when their tangents turn by less than this off their chords, rad. */
const STRAIGHT = 0.35
/** Spans in which one nearly straight stretch is followed along the other. */
const SPANS = 8

const p = new Float64Array(6)
const q = new Float64Array(6)

interface Stretch {
  t0: number
  t1: number
  x0: number
  y0: number
  x1: number
  y1: number
  /** greatest distance from the chord, bounded from samples */
  bow: number
  /** greatest angle between tangent and chord, rad */
  turn: number
}

/**
 * Common points of two monotone pieces of any kind. Stretches whose strips round their chords lie apart are dropped,
 * curved ones halved; of nearly straight ones, transversal give their crossing by Newton, and along those that run side
 * by side the signed distance is followed: its zeros are crossings, an extreme within the tolerance is one foot point.
 */
export function meetBySubdivision(pieces: Pieces, i: number, j: number, tolerance: number, meet: Meet): void {
  const { table, edge, t0, t1, ends } = pieces
  const known: number[] = []
  const found = (s: number, t: number) => {
    if (!inside(s, t0[i], t1[i]) || !inside(t, t0[j], t1[j])) return
    if (known.some((other) => Math.abs(other - s) <= 1e-12 * Math.abs(t1[i] - t0[i]))) return
    pointAt(table, edge[i], s, p)
    pointAt(table, edge[j], t, q)
    if (!(Math.hypot(p[0] - q[0], p[1] - q[1]) <= tolerance)) return
    known.push(s)
    meet(i, s, j, t, p[0], p[1])
  }
  const whole = (n: number) => stretch(pieces, n, t0[n], t1[n], ends[4 * n], ends[4 * n + 1], ends[4 * n + 2], ends[4 * n + 3])
  const stack: Stretch[] = [whole(i), whole(j)]
  for (let nodes = 0; nodes < MOST_NODES; nodes++) {
    const b = stack.pop()
    const a = stack.pop()
    if (!a || !b) return
    if (apart(a, b, tolerance)) continue
    const la = Math.hypot(a.x1 - a.x0, a.y1 - a.y0)
    const lb = Math.hypot(b.x1 - b.x0, b.y1 - b.y0)
    if (a.turn + b.turn > STRAIGHT && la + lb > tolerance) {
      if (a.turn >= b.turn) for (const half of halves(pieces, i, a)) stack.push(half, b)
      else for (const half of halves(pieces, j, b)) stack.push(a, half)
      continue
    }
    const transversal = Math.abs(between(a, b, la, lb)) > Math.max(1e-3, 1.5 * (a.turn + b.turn))
    const crossing = transversal ? newton(pieces, i, j, a, b, tolerance / 16) : 'unsure'
    if (crossing === 'unsure' && la > 3 * lb + tolerance) for (const half of halves(pieces, i, a)) stack.push(half, b)
    else if (crossing === 'unsure') sideBySide(pieces, i, j, a, tolerance, found)
    else if (crossing !== 'outside') found(...crossing)
  }
}

const inside = (t: number, a: number, b: number) => (a < b ? t > a && t < b : t > b && t < a)

function stretch(n: Pieces, i: number, t0: number, t1: number, x0: number, y0: number, x1: number, y1: number): Stretch {
  const { table } = n
  const e = n.edge[i]
  const dx = x1 - x0
  const dy = y1 - y0
  const long = Math.hypot(dx, dy)
  let bow = 0
  let turn = 0
  for (let s = 0; s <= 4; s++) {
    jetAt(table, e, t0 + ((t1 - t0) * s) / 4, p)
    if (long > 0) bow = Math.max(bow, Math.abs((p[0] - x0) * dy - (p[1] - y0) * dx) / long)
    const forward = t1 > t0 ? 1 : -1
    const cross = forward * (dx * p[3] - dy * p[2])
    const dot = forward * (dx * p[2] + dy * p[3])
    if (cross !== 0 || dot !== 0) turn = Math.max(turn, Math.abs(Math.atan2(cross, dot)))
  }
  return { t0, t1, x0, y0, x1, y1, bow: 1.25 * bow, turn }
}

function halves(n: Pieces, i: number, a: Stretch): [Stretch, Stretch] {
  const t = (a.t0 + a.t1) / 2
  pointAt(n.table, n.edge[i], t, q)
  const { 0: x, 1: y } = q
  return [stretch(n, i, a.t0, t, a.x0, a.y0, x, y), stretch(n, i, t, a.t1, x, y, a.x1, a.y1)]
}

/** Whether boxes, or strips round either chord, are further apart than the tolerance. */
function apart(a: Stretch, b: Stretch, tolerance: number): boolean {
  if (Math.min(a.x0, a.x1) > Math.max(b.x0, b.x1) + tolerance || Math.min(b.x0, b.x1) > Math.max(a.x0, a.x1) + tolerance)
    return true
  if (Math.min(a.y0, a.y1) > Math.max(b.y0, b.y1) + tolerance || Math.min(b.y0, b.y1) > Math.max(a.y0, a.y1) + tolerance)
    return true
  const room = a.bow + b.bow + tolerance
  return offStrip(a, b, room) || offStrip(b, a, room)
}

function offStrip(a: Stretch, b: Stretch, room: number): boolean {
  const long = Math.hypot(a.x1 - a.x0, a.y1 - a.y0)
  if (long === 0) return false
  const d0 = ((a.x1 - a.x0) * (b.y0 - a.y0) - (a.y1 - a.y0) * (b.x0 - a.x0)) / long
  const d1 = ((a.x1 - a.x0) * (b.y1 - a.y0) - (a.y1 - a.y0) * (b.x1 - a.x0)) / long
  return (d0 > room && d1 > room) || (d0 < -room && d1 < -room)
}

/** Angle between the chords taken as lines without direction, rad in [−π/2, π/2]. */
function between(a: Stretch, b: Stretch, la: number, lb: number): number {
  if (la === 0 || lb === 0) return 0
  const cross = (a.x1 - a.x0) * (b.y1 - b.y0) - (a.y1 - a.y0) * (b.x1 - b.x0)
  const dot = (a.x1 - a.x0) * (b.x1 - b.x0) + (a.y1 - a.y0) * (b.y1 - b.y0)
  return Math.atan2(dot < 0 ? -cross : cross, Math.abs(dot))
}

/** The crossing of two nearly straight stretches, or that it lies outside one of them, or that Newton did not settle. */
function newton(n: Pieces, i: number, j: number, a: Stretch, b: Stretch, near: number): [number, number] | 'outside' | 'unsure' {
  const { table, edge } = n
  let s = (a.t0 + a.t1) / 2
  let t = (b.t0 + b.t1) / 2
  let last = Number.POSITIVE_INFINITY
  for (let n = 0; n < 30; n++) {
    jetAt(table, edge[i], s, p)
    jetAt(table, edge[j], t, q)
    const dx = q[0] - p[0]
    const dy = q[1] - p[1]
    const det = q[2] * p[3] - p[2] * q[3]
    const ds = (q[2] * dy - q[3] * dx) / det
    const dt = (p[2] * dy - p[3] * dx) / det
    const step = Math.abs(ds / (a.t1 - a.t0)) + Math.abs(dt / (b.t1 - b.t0))
    if (!(step < 8)) return 'unsure'
    s += ds
    t += dt
    if (step < 1e-15 || (step < 1e-10 && step >= last)) break
    last = step
  }
  pointAt(table, edge[i], s, p)
  pointAt(table, edge[j], t, q)
  if (!(Math.hypot(p[0] - q[0], p[1] - q[1]) <= near)) return 'unsure'
  const margin = 1e-9
  const u = (s - a.t0) / (a.t1 - a.t0)
  const v = (t - b.t0) / (b.t1 - b.t0)
  return u >= -margin && u <= 1 + margin && v >= -margin && v <= 1 + margin ? [s, t] : 'outside'
}

/** Follows stretch a of piece i along piece j: signed distance from it, and how the tangents slant to one another. */
function sideBySide(n: Pieces, i: number, j: number, a: Stretch, tolerance: number, found: (s: number, t: number) => void): void {
  const { table, edge } = n
  const measure = (t: number): Measure => {
    jetAt(table, edge[i], t, p)
    const { 0: x, 1: y, 2: dx, 3: dy } = p
    const foot = footOn(n, j, x, y, q)
    jetAt(table, edge[j], foot, q)
    const speed = Math.hypot(q[2], q[3])
    return { t, foot, side: (q[2] * (y - q[1]) - q[3] * (x - q[0])) / speed, slant: q[2] * dy - q[3] * dx }
  }
  let low = measure(a.t0)
  for (let k = 1; k <= SPANS; k++) {
    const high = measure(k === SPANS ? a.t1 : a.t0 + ((a.t1 - a.t0) * k) / SPANS)
    if (low.side * high.side < 0) crossing(low, high)
    else if (low.slant * high.slant < 0) {
      const extreme = halve(measure, low, high, 'slant')
      if (Math.abs(extreme.side) <= tolerance) found(extreme.t, extreme.foot)
      else if (extreme.side * low.side < 0) {
        crossing(low, extreme)
        crossing(extreme, high)
      }
    }
    low = high
  }
  function crossing(from: Measure, to: Measure): void {
    const at = halve(measure, from, to, 'side')
    const touching = turnNear(measure, at, (a.t1 - a.t0) / 1024, (t) => inside(t, n.t0[j], n.t1[j]))
    const { t, foot } = touching && Math.abs(touching.side) <= tolerance ? touching : at
    found(t, foot)
  }
}

/**
 * Where the distance turns near a crossing, by two Newton steps on the slant, or null where that is not near. If it turns
 * within the tolerance the crossing is one of two that rounding made of a touch, and the turn is the one point to take.
 */
function turnNear(
  measure: (t: number) => Measure,
  at: Measure,
  step: number,
  onCurve: (foot: number) => boolean,
): Measure | null {
  const reach = 256 * Math.abs(step)
  let turn = at
  for (let n = 0; n < 3; n++) {
    // past the end of the other piece the foot stays at its end, and the slant has another rate
    const ahead = measure(turn.t + step)
    const beside = onCurve(ahead.foot) ? ahead : measure(turn.t - step)
    const rate = (beside.slant - turn.slant) / (beside.t - turn.t)
    const t = turn.t - turn.slant / rate
    if (!(Math.abs(t - at.t) <= reach)) return null
    turn = measure(t)
  }
  return turn
}

interface Measure {
  t: number
  foot: number
  side: number
  slant: number
}

/** The zero of side or slant between two parameters where it differs in sign: regula falsi (Illinois), kept bracketed. */
function halve(measure: (t: number) => Measure, from: Measure, to: Measure, what: 'side' | 'slant'): Measure {
  let [a, b] = [from, to]
  let [fa, fb] = [a[what], b[what]]
  let middle = a
  for (let n = 0; n < 100 && Math.abs(b.t - a.t) > 1e-16 * (Math.abs(a.t) + Math.abs(b.t)); n++) {
    const t = n % 4 === 3 ? (a.t + b.t) / 2 : b.t - (fb * (b.t - a.t)) / (fb - fa)
    if (t === middle.t) break
    middle = measure(t)
    const f = middle[what]
    if (f === 0) break
    if (f * fb < 0) {
      a = b
      fa = fb
    } else fa /= 2
    b = middle
    fb = f
  }
  return middle
}
