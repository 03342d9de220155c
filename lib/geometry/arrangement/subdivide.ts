import { jetAt, pointAt } from './curve'
import { footOn } from './foot'
import type { Meet } from './meet'
import type { Pieces } from './monotone'

/** Pairs of stretches looked at for one pair of pieces before giving up on finding more. */
const MOST_NODES = 20_000
/** A stretch counts as nearly straight below this turn of its tangent, rad. */
const STRAIGHT = 0.5

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
 * Common points of two monotone pieces of any kind. Stretches whose strips round their chords lie apart
 * are dropped, transversal ones give their crossing by Newton, the rest are halved; what stays within
 * the tolerance without crossing gives one foot point for each run of such stretches.
 */
export function meetBySubdivision(pieces: Pieces, i: number, j: number, tolerance: number, meet: Meet): void {
  const { table, edge, t0, t1, ends } = pieces
  const touching: [number, number][] = []
  const crossings: number[] = []
  const whole = (n: number) => stretch(pieces, n, t0[n], t1[n], ends[4 * n], ends[4 * n + 1], ends[4 * n + 2], ends[4 * n + 3])
  const stack: [Stretch, Stretch][] = [[whole(i), whole(j)]]
  let nodes = 0
  while (stack.length > 0 && nodes++ < MOST_NODES) {
    const [a, b] = stack.pop() as [Stretch, Stretch]
    if (apart(a, b, tolerance)) continue
    const la = Math.hypot(a.x1 - a.x0, a.y1 - a.y0)
    const lb = Math.hypot(b.x1 - b.x0, b.y1 - b.y0)
    const angle = Math.abs(between(a, b, la, lb))
    const transversal = angle > 1.5 * (a.turn + b.turn) && a.turn + b.turn < STRAIGHT
    const found = transversal && angle > 1e-7 ? newton(pieces, i, j, a, b, tolerance / 16) : 'unsure'
    if (found === 'outside') continue
    if (found !== 'unsure') {
      const [s, t] = found
      const known = crossings.some((other) => Math.abs(other - s) <= 1e-12 * Math.abs(t1[i] - t0[i]))
      if (!known && inside(s, t0[i], t1[i]) && inside(t, t0[j], t1[j])) {
        crossings.push(s)
        pointAt(table, edge[i], s, p)
        meet(i, s, j, t, p[0], p[1])
      }
      continue
    }
    if ((a.bow + b.bow <= tolerance && close(a, b, tolerance)) || la + lb <= tolerance) {
      touching.push([Math.min(a.t0, a.t1), Math.max(a.t0, a.t1)])
      continue
    }
    if (la >= lb) for (const half of halves(pieces, i, a)) stack.push([half, b])
    else for (const half of halves(pieces, j, b)) stack.push([a, half])
  }
  for (const t of nearestOfRuns(pieces, i, j, touching)) {
    pointAt(table, edge[i], t, p)
    const { 0: x, 1: y } = p
    const tj = footOn(pieces, j, x, y, q)
    if (Math.hypot(q[0] - x, q[1] - y) <= tolerance && inside(t, t0[i], t1[i]) && inside(tj, t0[j], t1[j]))
      meet(i, t, j, tj, x, y)
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

/** Whether the chords themselves come within the tolerance along their common stretch. */
function close(a: Stretch, b: Stretch, tolerance: number): boolean {
  const long = Math.hypot(a.x1 - a.x0, a.y1 - a.y0)
  const wide = Math.hypot(b.x1 - b.x0, b.y1 - b.y0)
  return Math.abs(between(a, b, long, wide)) * Math.min(long, wide) <= 4 * tolerance
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

/** For each run of touching stretches that follow each other, the parameter on i where the two are nearest. */
function nearestOfRuns(pieces: Pieces, i: number, j: number, touching: [number, number][]): number[] {
  touching.sort((a, b) => a[0] - b[0])
  const runs: [number, number][] = []
  for (const [low, high] of touching) {
    const run = runs[runs.length - 1]
    if (run && low <= run[1] + (high - low)) run[1] = Math.max(run[1], high)
    else runs.push([low, high])
  }
  return runs.map(([low, high]) => nearestBetween(pieces, i, j, low, high)).filter((t) => t !== null)
}

/**
 * Where between two parameters of piece i the tangents are parallel, else where i passes from one side of
 * piece j to the other; null where neither is: the two are then nearest at an end, which is met elsewhere.
 */
function nearestBetween(pieces: Pieces, i: number, j: number, low: number, high: number): number | null {
  const { table, edge } = pieces
  const measure = (t: number): [slant: number, side: number] => {
    jetAt(table, edge[i], t, p)
    const { 0: x, 1: y, 2: dx, 3: dy } = p
    const tj = footOn(pieces, j, x, y, q)
    jetAt(table, edge[j], tj, q)
    return [dx * q[3] - dy * q[2], q[2] * (y - q[1]) - q[3] * (x - q[0])]
  }
  const atLow = measure(low)
  const atHigh = measure(high)
  for (const which of [0, 1]) {
    if (!(atLow[which] * atHigh[which] < 0)) continue
    let [a, b] = [low, high]
    for (let n = 0; n < 60; n++) {
      const t = (a + b) / 2
      if (measure(t)[which] > 0 === atLow[which] > 0) a = t
      else b = t
    }
    return (a + b) / 2
  }
  return null
}
