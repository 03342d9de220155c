import { ARC, BEZIER, type EdgeTable, LINE } from './edges'
import { jetAt, newJet } from './evaluate'

/** The point of an edge nearest to a given one: parameter t in [0, 1], place and distance. */
export interface Nearest {
  t: number
  x: number
  y: number
  distance: number
}

function atEnd(edges: EdgeTable, i: number, end: 0 | 1, x: number, y: number): Nearest {
  const ex = edges.ends[4 * i + 2 * end]
  const ey = edges.ends[4 * i + 2 * end + 1]
  return { t: end, x: ex, y: ey, distance: Math.hypot(ex - x, ey - y) }
}

function nearerEnd(edges: EdgeTable, i: number, x: number, y: number): Nearest {
  const a = atEnd(edges, i, 0, x, y)
  const b = atEnd(edges, i, 1, x, y)
  return a.distance <= b.distance ? a : b
}

function onLine(edges: EdgeTable, i: number, x: number, y: number): Nearest {
  const ax = edges.ends[4 * i]
  const ay = edges.ends[4 * i + 1]
  const dx = edges.ends[4 * i + 2] - ax
  const dy = edges.ends[4 * i + 3] - ay
  const t = ((x - ax) * dx + (y - ay) * dy) / (dx * dx + dy * dy)
  if (!(t > 0 && t < 1)) return nearerEnd(edges, i, x, y)
  const px = ax + t * dx
  const py = ay + t * dy
  return { t, x: px, y: py, distance: Math.hypot(px - x, py - y) }
}

function onArc(edges: EdgeTable, i: number, x: number, y: number): Nearest {
  const k = edges.shape[i]
  const [cx, cy, r, start, sweep] = edges.shapes.subarray(k, k + 5)
  const turn = 2 * Math.PI
  const angle = sweep >= 0 ? Math.atan2(y - cy, x - cx) - start : start - Math.atan2(y - cy, x - cx)
  const t = (angle - turn * Math.floor(angle / turn)) / Math.abs(sweep)
  if (!(t < 1)) return nearerEnd(edges, i, x, y)
  const d = Math.hypot(x - cx, y - cy)
  if (d === 0) return atEnd(edges, i, 0, x, y)
  const px = cx + ((x - cx) / d) * r
  const py = cy + ((y - cy) / d) * r
  return { t, x: px, y: py, distance: Math.abs(d - r) }
}

const SAMPLES = 24

/** Newton's method on (P − q)·P′ = 0 from the best sample of each valley, kept between its neighbours. */
function onCurve(edges: EdgeTable, i: number, x: number, y: number): Nearest {
  const jet = newJet()
  const samples = edges.kind[i] === BEZIER ? SAMPLES + 4 * edges.shapes[edges.shape[i]] : 2 * SAMPLES
  const square = (t: number) => {
    jetAt(edges, i, t, jet)
    return (jet.x - x) ** 2 + (jet.y - y) ** 2
  }
  const values = Array.from({ length: samples + 1 }, (_, s) => square(s / samples))
  let best = nearerEnd(edges, i, x, y)
  for (let s = 0; s <= samples; s++) {
    if ((s > 0 && values[s - 1] < values[s]) || (s < samples && values[s + 1] < values[s])) continue
    let low = Math.max(0, (s - 1) / samples)
    let high = Math.min(1, (s + 1) / samples)
    let t = s / samples
    for (let step = 0; step < 60 && high - low > 1e-16; step++) {
      jetAt(edges, i, t, jet)
      const slope = (jet.x - x) * jet.dx + (jet.y - y) * jet.dy
      if (slope > 0) high = t
      else low = t
      const bend = jet.dx * jet.dx + jet.dy * jet.dy + (jet.x - x) * jet.ddx + (jet.y - y) * jet.ddy
      const next = t - slope / bend
      const kept = bend > 0 && next >= low && next <= high ? next : 0.5 * (low + high)
      if (Math.abs(kept - t) < 1e-16) break
      t = kept
    }
    const distance = Math.sqrt(square(t))
    if (distance < best.distance) best = { t, x: jet.x, y: jet.y, distance }
  }
  return best
}

/** Nearest point of edge i to (x, y), ends included. */
export function nearestOn(edges: EdgeTable, i: number, x: number, y: number): Nearest {
  switch (edges.kind[i]) {
    case LINE:
      return onLine(edges, i, x, y)
    case ARC:
      return onArc(edges, i, x, y)
    default:
      return onCurve(edges, i, x, y)
  }
}
