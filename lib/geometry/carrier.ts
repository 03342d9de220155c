import { ARC, ELLIPSE, type EdgeTable, LINE } from './edges'
import { jetAt, newJet } from './evaluate'

/** Angle by which the carrier of an arc (elliptical: its parameter) must turn to take point a to point b. */
function turn(edges: EdgeTable, i: number, ax: number, ay: number, bx: number, by: number): number {
  const s = edges.shapes
  const k = edges.shape[i]
  const angle = (px: number, py: number, qx: number, qy: number) => Math.atan2(px * qy - py * qx, px * qx + py * qy)
  if (edges.kind[i] === ARC) return angle(ax - s[k], ay - s[k + 1], bx - s[k], by - s[k + 1])
  const det = s[k + 2] * s[k + 5] - s[k + 3] * s[k + 4]
  const toUnit = (x: number, y: number): [number, number] => [
    ((x - s[k]) * s[k + 5] - (y - s[k + 1]) * s[k + 4]) / det,
    ((y - s[k + 1]) * s[k + 2] - (x - s[k]) * s[k + 3]) / det,
  ]
  return angle(...toUnit(ax, ay), ...toUnit(bx, by))
}

/**
 * Moves one end (0 first, 1 second) of edge i to x, y. The carrier stays (centre, radius, control points); an arc's
 * start and sweep follow the end along its carrier. Off the carrier the end may lie by the gap that was closed.
 */
export function moveEnd(edges: EdgeTable, i: number, end: 0 | 1, x: number, y: number): void {
  const e = edges.ends
  const at = 4 * i + 2 * end
  const oldX = e[at]
  const oldY = e[at + 1]
  if (oldX === x && oldY === y) return
  e[at] = x
  e[at + 1] = y
  if (edges.kind[i] !== ARC && edges.kind[i] !== ELLIPSE) return
  const start = edges.shape[i] + (edges.kind[i] === ARC ? 3 : 6)
  const delta = turn(edges, i, oldX, oldY, x, y)
  if (end === 0) {
    edges.shapes[start] += delta
    edges.shapes[start + 1] -= delta
  } else edges.shapes[start + 1] += delta
}

/** Unit direction in which the edge leaves its end (0 first, 1 second), pointing away from the edge. */
export function outward(edges: EdgeTable, i: number, end: 0 | 1): [number, number] {
  const jet = jetAt(edges, i, end, newJet())
  if (edges.kind[i] !== LINE && jet.dx === 0 && jet.dy === 0) jetAt(edges, i, end === 0 ? 1e-6 : 1 - 1e-6, jet)
  const length = Math.hypot(jet.dx, jet.dy) * (end === 0 ? -1 : 1)
  return length === 0 ? [0, 0] : [jet.dx / length, jet.dy / length]
}
