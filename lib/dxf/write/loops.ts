import {
  ARC,
  type ArcEdge,
  BEZIER,
  type BezierEdge,
  type Edge,
  ELLIPSE,
  type EllipseEdge,
  edgeAt,
  LINE,
  type Point,
} from '../../geometry/edges'
import type { Region } from '../../geometry/region'
import type { GroupWriter } from './groupWriter'

const DEGREES = 180 / Math.PI
const HALF_TURN = Math.PI * (1 + 1e-12)
const WHOLE_TURN = 2 * Math.PI * (1 - 1e-12)

/** Writes one loop of a region. */
export function writeLoop(w: GroupWriter, region: Region, loop: number): void {
  const layer = region.hole[loop] === 1 ? 'HOLES' : 'OUTER'
  const edges: Edge[] = []
  for (let i = region.loopStart[loop]; i < region.loopStart[loop + 1]; i++) edges.push(edgeAt(region.edges, i))
  const [first] = edges
  if (edges.length === 1 && first.kind === ARC && Math.abs(first.sweep) >= WHOLE_TURN) writeCircle(w, first, layer)
  else if (edges.every(({ kind }) => kind === LINE || kind === ARC)) writePolyline(w, edges, layer)
  else for (const edge of edges) writeEdge(w, edge, layer)
}

function writeCircle(w: GroupWriter, { centre, radius }: ArcEdge, layer: string): void {
  w.entity('CIRCLE', layer, 'AcDbCircle').point(10, centre.x, centre.y).real(40, radius)
}

/** Vertices with bulge tan(sweep/4); arcs beyond half a turn get a vertex in their middle, which keeps their digits. */
function writePolyline(w: GroupWriter, edges: readonly Edge[], layer: string): void {
  const vertices: { at: Point; bulge: number }[] = []
  for (const edge of edges) {
    if (edge.kind !== ARC) vertices.push({ at: edge.a, bulge: 0 })
    else if (Math.abs(edge.sweep) <= HALF_TURN) vertices.push({ at: edge.a, bulge: Math.tan(edge.sweep / 4) })
    else {
      const middle = edge.start + edge.sweep / 2
      const { centre, radius } = edge
      const bulge = Math.tan(edge.sweep / 8)
      const at = { x: centre.x + radius * Math.cos(middle), y: centre.y + radius * Math.sin(middle) }
      vertices.push({ at: edge.a, bulge }, { at, bulge })
    }
  }
  w.entity('LWPOLYLINE', layer, 'AcDbPolyline').put(90, vertices.length).put(70, 1)
  for (const { at, bulge } of vertices) {
    w.real(10, at.x).real(20, at.y)
    if (bulge !== 0) w.real(42, bulge)
  }
}

function writeEdge(w: GroupWriter, edge: Edge, layer: string): void {
  switch (edge.kind) {
    case LINE:
      w.entity('LINE', layer, 'AcDbLine').point(10, edge.a.x, edge.a.y).point(11, edge.b.x, edge.b.y)
      break
    case ARC:
      writeArc(w, edge, layer)
      break
    case ELLIPSE:
      writeEllipse(w, edge, layer)
      break
    case BEZIER:
      writeSpline(w, edge, layer)
  }
}

function writeArc(w: GroupWriter, edge: ArcEdge, layer: string) {
  if (Math.abs(edge.sweep) >= WHOLE_TURN) return writeCircle(w, edge, layer)
  const [from, to] = edge.sweep > 0 ? [edge.start, edge.start + edge.sweep] : [edge.start + edge.sweep, edge.start]
  w.entity('ARC', layer, 'AcDbCircle').point(10, edge.centre.x, edge.centre.y).real(40, edge.radius)
  w.put(100, 'AcDbArc')
    .real(50, from * DEGREES)
    .real(51, to * DEGREES)
}

/**
 * The format wants perpendicular axes, the longer one first: with t₀ = ½ atan2(2 u·v, |u|² − |v|²),
 * M = u cos t₀ + v sin t₀ and m = v cos t₀ − u sin t₀, the curve is c + M cos(t − t₀) + m sin(t − t₀).
 */
function writeEllipse(w: GroupWriter, { centre, u, v, start, sweep }: EllipseEdge, layer: string): void {
  const turn = 0.5 * Math.atan2(2 * (u.x * v.x + u.y * v.y), u.x * u.x + u.y * u.y - v.x * v.x - v.y * v.y)
  const [cos, sin] = [Math.cos(turn), Math.sin(turn)]
  const major = { x: u.x * cos + v.x * sin, y: u.y * cos + v.y * sin }
  const minor = { x: v.x * cos - u.x * sin, y: v.y * cos - u.y * sin }
  const length = Math.hypot(major.x, major.y)
  const ratio = (major.x * minor.y - major.y * minor.x) / (length * length)
  const sense = ratio < 0 ? -1 : 1
  const ends = [sense * (start - turn), sense * (start + sweep - turn)].sort((p, q) => p - q)
  const whole = Math.abs(sweep) >= WHOLE_TURN
  w.entity('ELLIPSE', layer, 'AcDbEllipse').point(10, centre.x, centre.y).point(11, major.x, major.y)
  w.real(40, Math.abs(ratio))
    .real(41, whole ? 0 : ends[0])
    .real(42, whole ? 2 * Math.PI : ends[1])
}

function writeSpline(w: GroupWriter, { control, weights }: BezierEdge, layer: string): void {
  const degree = control.length - 1
  const knots = [...control.map(() => 0), ...control.map(() => 1)]
  w.entity('SPLINE', layer, 'AcDbSpline')
    .put(70, weights ? 12 : 8)
    .put(71, degree)
    .put(72, knots.length)
    .put(73, control.length)
    .put(74, 0)
  for (const knot of knots) w.real(40, knot)
  for (const weight of weights ?? []) w.real(41, weight)
  for (const { x, y } of control) w.point(10, x, y)
}
