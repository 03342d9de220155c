import { ARC, BEZIER, ELLIPSE, type EdgeTable, LINE } from './edges'
import { integrate } from './gauss'

/** Position and first two derivatives of an edge by its parameter t in [0, 1]; reused, never kept. */
export interface Jet {
  x: number
  y: number
  dx: number
  dy: number
  ddx: number
  ddy: number
}
export const newJet = (): Jet => ({ x: 0, y: 0, dx: 0, dy: 0, ddx: 0, ddy: 0 })

function conic(jet: Jet, cx: number, cy: number, ux: number, uy: number, vx: number, vy: number, a: number, s: number): void {
  const cos = Math.cos(a)
  const sin = Math.sin(a)
  jet.x = cx + ux * cos + vx * sin
  jet.y = cy + uy * cos + vy * sin
  jet.dx = s * (vx * cos - ux * sin)
  jet.dy = s * (vy * cos - uy * sin)
  jet.ddx = -s * s * (ux * cos + vx * sin)
  jet.ddy = -s * s * (uy * cos + vy * sin)
}

const work = new Float64Array(3 * 64)

/** Homogeneous value and two derivatives: the last three rows of de Casteljau's scheme, about the first control point. */
function bezier(jet: Jet, s: Float64Array, k: number, t: number): void {
  const n = s[k]
  const w = n < 64 ? work : new Float64Array(3 * (n + 1))
  for (let j = 0; j <= n; j++) {
    const weight = s[k + 4 + 3 * j]
    w[3 * j] = (s[k + 2 + 3 * j] - s[k + 2]) * weight
    w[3 * j + 1] = (s[k + 3 + 3 * j] - s[k + 3]) * weight
    w[3 * j + 2] = weight
  }
  let ddx = 0
  let ddy = 0
  let ddw = 0
  let dx = 0
  let dy = 0
  let dw = 0
  for (let m = n; m > 0; m--) {
    if (m === 2) {
      ddx = n * (n - 1) * (w[6] - 2 * w[3] + w[0])
      ddy = n * (n - 1) * (w[7] - 2 * w[4] + w[1])
      ddw = n * (n - 1) * (w[8] - 2 * w[5] + w[2])
    }
    if (m === 1) {
      dx = n * (w[3] - w[0])
      dy = n * (w[4] - w[1])
      dw = n * (w[5] - w[2])
    }
    for (let i = 0; i < 3 * m; i++) w[i] += t * (w[i + 3] - w[i])
  }
  const weight = w[2]
  const x = w[0] / weight
  const y = w[1] / weight
  jet.x = s[k + 2] + x
  jet.y = s[k + 3] + y
  jet.dx = (dx - x * dw) / weight
  jet.dy = (dy - y * dw) / weight
  jet.ddx = (ddx - 2 * jet.dx * dw - x * ddw) / weight
  jet.ddy = (ddy - 2 * jet.dy * dw - y * ddw) / weight
}

/**
 * Point and derivatives of edge i at t in [0, 1] (t runs from its first end to its second; for arcs in proportion
 * to the angle, for Bézier pieces their own parameter). On the carrier: snapped ends are not looked at, but for lines.
 */
export function jetAt(edges: EdgeTable, i: number, t: number, jet: Jet): Jet {
  const s = edges.shapes
  const k = edges.shape[i]
  switch (edges.kind[i]) {
    case LINE: {
      const e = edges.ends
      jet.dx = e[4 * i + 2] - e[4 * i]
      jet.dy = e[4 * i + 3] - e[4 * i + 1]
      jet.x = t < 0.5 ? e[4 * i] + t * jet.dx : e[4 * i + 2] - (1 - t) * jet.dx
      jet.y = t < 0.5 ? e[4 * i + 1] + t * jet.dy : e[4 * i + 3] - (1 - t) * jet.dy
      jet.ddx = 0
      jet.ddy = 0
      break
    }
    case ARC:
      conic(jet, s[k], s[k + 1], s[k + 2], 0, 0, s[k + 2], s[k + 3] + t * s[k + 4], s[k + 4])
      break
    case ELLIPSE:
      conic(jet, s[k], s[k + 1], s[k + 2], s[k + 3], s[k + 4], s[k + 5], s[k + 6] + t * s[k + 7], s[k + 7])
      break
    case BEZIER:
      bezier(jet, s, k, t)
      break
  }
  return jet
}

/** Signed curvature, positive where the edge turns left. */
export function curvatureOf({ dx, dy, ddx, ddy }: Jet): number {
  return (dx * ddy - dy * ddx) / Math.hypot(dx, dy) ** 3
}

/** Length of edge i; ten-point Gauss, halved until it no longer changes, for ellipses and Bézier pieces. */
export function lengthOf(edges: EdgeTable, i: number): number {
  const e = edges.ends
  switch (edges.kind[i]) {
    case LINE:
      return Math.hypot(e[4 * i + 2] - e[4 * i], e[4 * i + 3] - e[4 * i + 1])
    case ARC:
      return edges.shapes[edges.shape[i] + 2] * Math.abs(edges.shapes[edges.shape[i] + 4])
    default: {
      const jet = newJet()
      return integrate((t) => Math.hypot(jetAt(edges, i, t, jet).dx, jet.dy), 0, 1)
    }
  }
}
