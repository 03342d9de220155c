import { ARC, BEZIER, type EdgeTable, ELLIPSE, emptyTable, LINE, pushArc, pushBezier, pushEllipse, pushLine } from '../edges'
import { endOf, pointAt, startOf } from './curve'

const p = new Float64Array(2)
const q = new Float64Array(2)

/**
 * The same edges about a local origin, row by row. Where snapped ends lie off their carrier by more than a
 * quarter of the tolerance, the carrier is moved, turned and scaled by the one similarity that takes its
 * ends to the snapped ones, so that chains of edges have no leaks; parameters keep their meaning.
 */
export function workTable(edges: EdgeTable, ox: number, oy: number, tolerance: number): EdgeTable {
  const out = emptyTable(edges.count, edges.shapesUsed)
  for (let e = 0; e < edges.count; e++) {
    const d = edges.ends
    pushFitted(out, edges, e, d[4 * e] - ox, d[4 * e + 1] - oy, d[4 * e + 2] - ox, d[4 * e + 3] - oy, ox, oy, tolerance)
  }
  return out
}

function pushFitted(
  out: EdgeTable,
  from: EdgeTable,
  e: number,
  x0: number,
  y0: number,
  x1: number,
  y1: number,
  ox: number,
  oy: number,
  tolerance: number,
): void {
  const source = from.source[e]
  if (from.kind[e] === LINE) {
    pushLine(out, x0, y0, x1, y1, source)
    return
  }
  pointAt(from, e, startOf(from, e), p)
  pointAt(from, e, endOf(from, e), q)
  const [ax, ay, bx, by] = [p[0] - ox, p[1] - oy, q[0] - ox, q[1] - oy]
  const off = Math.max(Math.hypot(ax - x0, ay - y0), Math.hypot(bx - x1, by - y1))
  let mx = 1
  let my = 0
  let [fromX, fromY, toX, toY] = [ox, oy, 0, 0]
  if (off > tolerance / 4) {
    const dx = bx - ax
    const dy = by - ay
    const square = dx * dx + dy * dy
    mx = ((x1 - x0) * dx + (y1 - y0) * dy) / square
    my = ((y1 - y0) * dx - (x1 - x0) * dy) / square
    if (!(Math.hypot(mx - 1, my) < 0.1)) {
      if (extentOf(from, e) < 20 * off) {
        pushLine(out, x0, y0, x1, y1, source)
        return
      }
      mx = 1
      my = 0
    }
    ;[fromX, fromY, toX, toY] = [p[0], p[1], x0, y0]
  }
  const s = from.shapes
  const k = from.shape[e]
  const x = (i: number) => toX + mx * (s[i] - fromX) - my * (s[i + 1] - fromY)
  const y = (i: number) => toY + my * (s[i] - fromX) + mx * (s[i + 1] - fromY)
  const turn = Math.atan2(my, mx)
  switch (from.kind[e]) {
    case ARC:
      pushArc(out, x0, y0, x1, y1, x(k), y(k), s[k + 2] * Math.hypot(mx, my), s[k + 3] + turn, s[k + 4], source)
      return
    case ELLIPSE: {
      const [ux, uy, vx, vy] = s.subarray(k + 2, k + 6)
      const turned = [mx * ux - my * uy, my * ux + mx * uy, mx * vx - my * vy, my * vx + mx * vy] as const
      pushEllipse(out, x0, y0, x1, y1, x(k), y(k), ...turned, s[k + 6], s[k + 7], source)
      return
    }
    case BEZIER: {
      const xyw: number[] = []
      for (let i = 0; i <= s[k]; i++) xyw.push(x(k + 2 + 3 * i), y(k + 2 + 3 * i), s[k + 4 + 3 * i])
      const i = pushBezier(out, s[k], s[k + 1] === 1, xyw, source)
      out.ends.set([x0, y0, x1, y1], 4 * i)
    }
  }
}

/** Distance of the edge's middle or second end from its first end, the greater. */
function extentOf(table: EdgeTable, e: number): number {
  const [start, end] = [startOf(table, e), endOf(table, e)]
  pointAt(table, e, start, q)
  const [x, y] = q
  pointAt(table, e, end, q)
  const chord = Math.hypot(q[0] - x, q[1] - y)
  pointAt(table, e, (start + end) / 2, q)
  return Math.max(chord, Math.hypot(q[0] - x, q[1] - y))
}
