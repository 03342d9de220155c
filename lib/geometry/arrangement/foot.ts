import { ARC, LINE } from '../edges'
import { jetAt, pointAt } from './curve'
import type { Pieces } from './monotone'

const jet = new Float64Array(6)

/** Angle t + 2πk nearest to `near`. */
export function angleNear(t: number, near: number): number {
  return t - 2 * Math.PI * Math.round((t - near) / (2 * Math.PI))
}

const clamp = (t: number, a: number, b: number) => (a < b ? Math.min(Math.max(t, a), b) : Math.min(Math.max(t, b), a))

/**
 * Nearest point of monotone piece i to (x, y): writes its x y into `out` and returns its parameter.
 * Lines and arcs in closed form; ellipses and Béziers by Newton from the point at the same x or y.
 * The ends of the piece count as lying where `ends` has them.
 */
export function footOn(pieces: Pieces, i: number, x: number, y: number, out: Float64Array): number {
  const { table } = pieces
  const e = pieces.edge[i]
  const t0 = pieces.t0[i]
  const t1 = pieces.t1[i]
  let t: number
  if (table.kind[e] === LINE) {
    const d = table.ends
    const ux = d[4 * e + 2] - d[4 * e]
    const uy = d[4 * e + 3] - d[4 * e + 1]
    t = ((x - d[4 * e]) * ux + (y - d[4 * e + 1]) * uy) / (ux * ux + uy * uy)
  } else if (table.kind[e] === ARC) {
    const k = table.shape[e]
    t = angleNear(Math.atan2(y - table.shapes[k + 1], x - table.shapes[k]), (t0 + t1) / 2)
  } else {
    t = newtonFoot(pieces, i, x, y)
  }
  t = clamp(t, t0, t1)
  if (t === t0 || t === t1) {
    const k = 4 * i + (t === t0 ? 0 : 2)
    out[0] = pieces.ends[k]
    out[1] = pieces.ends[k + 1]
  } else pointAt(table, e, t, out)
  return t
}

const SAMPLES = 6

/** Newton on (P − q)·P′ = 0 from the nearest of a few samples, kept between that sample's neighbours. */
function newtonFoot(pieces: Pieces, i: number, x: number, y: number): number {
  const { table } = pieces
  const e = pieces.edge[i]
  const t0 = pieces.t0[i]
  const step = (pieces.t1[i] - t0) / SAMPLES
  let nearest = Number.POSITIVE_INFINITY
  let best = 0
  for (let n = 0; n <= SAMPLES; n++) {
    pointAt(table, e, n === SAMPLES ? pieces.t1[i] : t0 + n * step, jet)
    const d = (jet[0] - x) ** 2 + (jet[1] - y) ** 2
    if (d >= nearest) continue
    nearest = d
    best = n
  }
  let low = t0 + Math.max(0, best - 1) * step
  let high = best >= SAMPLES - 1 ? pieces.t1[i] : t0 + (best + 1) * step
  const forward = step > 0 ? 1 : -1
  let t = t0 + best * step
  for (let n = 0; n < 60; n++) {
    jetAt(table, e, t, jet)
    const dx = jet[0] - x
    const dy = jet[1] - y
    const slope = dx * jet[2] + dy * jet[3]
    if (slope === 0) return t
    if (slope * forward > 0) high = t
    else low = t
    const bend = jet[2] * jet[2] + jet[3] * jet[3] + dx * jet[4] + dy * jet[5]
    let next = t - slope / bend
    const kept = bend > 0 && (forward > 0 ? next >= low && next <= high : next <= low && next >= high)
    if (!kept || (n > 8 && n % 3 === 0)) next = (low + high) / 2
    if (Math.abs(next - t) <= 1e-16 * Math.max(Math.abs(t), Math.abs(step))) return next
    t = next
  }
  return t
}

/**
 * Parameter at which monotone piece i has the given x (axis 0) or y (axis 1), held within the piece.
 * Bracketed Newton; the bracket is sound because the piece is monotone.
 */
export function levelOn(pieces: Pieces, i: number, axis: 0 | 1, value: number): number {
  const { table, ends } = pieces
  const e = pieces.edge[i]
  let a = pieces.t0[i]
  let b = pieces.t1[i]
  const va = ends[4 * i + axis]
  const vb = ends[4 * i + 2 + axis]
  const up = vb > va
  if (up ? value <= va : value >= va) return a
  if (up ? value >= vb : value <= vb) return b
  const fraction = (value - va) / (vb - va)
  if (table.kind[e] === LINE) return a + fraction * (b - a)
  const wide = Math.abs(b - a)
  let t = a + fraction * (b - a)
  for (let n = 0; n < 80; n++) {
    jetAt(table, e, t, jet)
    const off = jet[axis] - value
    if (off === 0) return t
    if (off < 0 === up) a = t
    else b = t
    let next = t - off / jet[2 + axis]
    const inside = a < b ? next > a && next < b : next < a && next > b
    if (!inside || (n > 8 && n % 2 === 0)) next = (a + b) / 2
    if (Math.abs(next - t) <= 2e-16 * (wide + Math.abs(t))) return next
    t = next
  }
  return t
}
