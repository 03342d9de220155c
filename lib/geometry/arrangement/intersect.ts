import { type Edge, emptyTable, type Point, pushEdge } from '../edges'
import { meetPieces, runsAlong } from './meet'
import { monotonePieces } from './monotone'

/**
 * What two edges have in common: a point with its parameter on each (line and Bézier 0 to 1, arc and
 * ellipse the angle in rad), or, where `to` is there, the whole stretch from the one to the other.
 */
export interface Meeting {
  te: number
  tf: number
  at: Point
  to?: { te: number; tf: number; at: Point }
}

/**
 * All points and shared stretches of two edges, by rising parameter on the first. Ends that lie on the
 * other edge within the tolerance count; where carriers come within the tolerance without crossing there
 * is one point. Closed form for lines, arcs and line with ellipse, else subdivision and Newton.
 * Tolerance in the edges' unit. Two Béziers that touch in more than a few thousand places give up quietly.
 */
export function intersectEdges(e: Edge, f: Edge, tolerance: number): Meeting[] {
  const table = emptyTable(2)
  pushEdge(table, e)
  pushEdge(table, f)
  const pieces = monotonePieces(table, tolerance)
  let first = 0
  while (first < pieces.count && pieces.edge[first] === 0) first++
  const found: Meeting[] = []
  const shared: Meeting[] = []
  for (let i = 0; i < first; i++) {
    for (let j = first; j < pieces.count; j++) {
      const own: Meeting[] = []
      meetPieces(pieces, i, j, tolerance, (p, tp, _q, tq, x, y) => {
        own.push(p === i ? { te: tp, tf: tq, at: { x, y } } : { te: tq, tf: tp, at: { x, y } })
      })
      const points = distinct(own, tolerance)
      for (let n = 1; n < points.length; n++) {
        const [a, b] = [points[n - 1], points[n]]
        if (runsAlong(pieces, i, a.te, b.te, pieces, j, tolerance)) shared.push({ ...a, to: b })
      }
      found.push(...points)
    }
  }
  const stretches = joined(shared.sort(byFirst), tolerance)
  const points = distinct(found, tolerance).filter((m) => !stretches.some((s) => covers(s, m, tolerance)))
  return [...points, ...stretches].sort(byFirst)
}

const byFirst = (a: Meeting, b: Meeting) => a.te - b.te
const near = (a: Point, b: Point, tolerance: number) => Math.hypot(a.x - b.x, a.y - b.y) <= 2 * tolerance

function distinct(meetings: Meeting[], tolerance: number): Meeting[] {
  const kept: Meeting[] = []
  for (const m of meetings.sort(byFirst)) if (!kept.some((k) => near(k.at, m.at, tolerance))) kept.push(m)
  return kept
}

/** Stretches that follow each other across a turning point are one. */
function joined(shared: Meeting[], tolerance: number): Meeting[] {
  const out: Meeting[] = []
  for (const s of shared) {
    const last = out[out.length - 1]
    if (last?.to && near(last.to.at, s.at, tolerance)) last.to = s.to
    else out.push({ ...s })
  }
  return out
}

function covers(s: Meeting, m: Meeting, tolerance: number): boolean {
  if (!s.to) return false
  return (
    (m.te >= Math.min(s.te, s.to.te) && m.te <= Math.max(s.te, s.to.te)) ||
    near(s.at, m.at, tolerance) ||
    near(s.to.at, m.at, tolerance)
  )
}
