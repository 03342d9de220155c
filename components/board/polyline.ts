import { ARC, BEZIER, type EdgeTable, LINE } from '@/lib/geometry/edges'
import { type Jet, jetAt, newJet } from '@/lib/geometry/evaluate'
import type { Box, DrawingPoint } from './view'

/** Steps a curved edge is drawn in for picking and label placing: one each 7.5°, or 16 a spline piece. */
const STEP = Math.PI / 24
const SPLINE_STEPS = 16

function stepsOf(edges: EdgeTable, i: number): number {
  const at = edges.shape[i]
  switch (edges.kind[i]) {
    case LINE:
      return 1
    case BEZIER:
      return SPLINE_STEPS
    default:
      return Math.ceil(Math.abs(edges.shapes[at + (edges.kind[i] === ARC ? 4 : 7)]) / STEP)
  }
}

function pushEdgePoints(edges: EdgeTable, i: number, out: number[], jet: Jet): void {
  out.push(edges.ends[4 * i], edges.ends[4 * i + 1])
  const steps = stepsOf(edges, i)
  for (let j = 1; j < steps; j++) {
    jetAt(edges, i, j / steps, jet)
    out.push(jet.x, jet.y)
  }
}

/** Edges `from` … `to − 1`, each running into the next, as x y x y …; for picking and label placing, never for figures. */
export function polylineOf(edges: EdgeTable, from: number, to: number): Float64Array {
  const out: number[] = []
  const jet = newJet()
  for (let i = from; i < to; i++) pushEdgePoints(edges, i, out, jet)
  if (to > from) out.push(edges.ends[4 * to - 2], edges.ends[4 * to - 1])
  return Float64Array.from(out)
}

export function boxOf(polyline: Float64Array): Box {
  const box = { minX: Infinity, minY: Infinity, maxX: -Infinity, maxY: -Infinity }
  for (let i = 0; i < polyline.length; i += 2) {
    box.minX = Math.min(box.minX, polyline[i])
    box.maxX = Math.max(box.maxX, polyline[i])
    box.minY = Math.min(box.minY, polyline[i + 1])
    box.maxY = Math.max(box.maxY, polyline[i + 1])
  }
  return box
}

export function distanceTo(polyline: Float64Array, p: DrawingPoint): number {
  let least = Number.POSITIVE_INFINITY
  for (let i = 0; i + 3 < polyline.length; i += 2) {
    const ax = polyline[i]
    const ay = polyline[i + 1]
    const dx = polyline[i + 2] - ax
    const dy = polyline[i + 3] - ay
    const along = dx * dx + dy * dy
    const t = along === 0 ? 0 : Math.min(Math.max(((p.x - ax) * dx + (p.y - ay) * dy) / along, 0), 1)
    least = Math.min(least, (p.x - ax - t * dx) ** 2 + (p.y - ay - t * dy) ** 2)
  }
  return Math.sqrt(least)
}

/** Does the closed polyline hold the point? (Even-odd count of crossings to the right.) */
export function holds(polyline: Float64Array, p: DrawingPoint): boolean {
  let odd = false
  for (let i = 0; i + 3 < polyline.length; i += 2) {
    const ay = polyline[i + 1]
    const by = polyline[i + 3]
    if (ay > p.y === by > p.y) continue
    if (p.x < polyline[i] + ((p.y - ay) * (polyline[i + 2] - polyline[i])) / (by - ay)) odd = !odd
  }
  return odd
}
