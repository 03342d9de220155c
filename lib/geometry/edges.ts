/** A point or vector: x to the right, y up, as drawn. */
export interface Point {
  x: number
  y: number
}

/** Edge kinds. Every edge stays what it was drawn as; nothing is flattened before the integrals. */
export const LINE = 0
export const ARC = 1
export const ELLIPSE = 2
/** One Bézier piece (polynomial or rational); a B-spline is stored as its Bézier pieces, which is exact. */
export const BEZIER = 3
export type EdgeKind = typeof LINE | typeof ARC | typeof ELLIPSE | typeof BEZIER

/**
 * Many edges in columns, so that a million fit and post to a worker without copying.
 *
 * `ends` holds x0 y0 x1 y1 of each edge: these ends are what joins to the next edge, and after
 * chaining they may lie off the carrier by up to the chaining tolerance.
 * `shape[i]` is where the carrier of edge i starts in `shapes` (unused for lines):
 * - ARC: cx cy r start sweep (rad; sweep > 0 counter-clockwise, |sweep| ≤ 2π)
 * - ELLIPSE: cx cy ux uy vx vy start sweep; P(t) = c + u·cos t + v·sin t, t from start to start + sweep.
 *   u and v need not be perpendicular (affine image of a unit arc).
 * - BEZIER: degree rational(0|1), then (degree + 1) × (x y w) control points; w = 1 when not rational.
 * `source[i]` is the index of the drawing's entity that the edge came from.
 */
export interface EdgeTable {
  count: number
  kind: Uint8Array
  ends: Float64Array
  shape: Uint32Array
  shapes: Float64Array
  shapesUsed: number
  source: Uint32Array
}

export interface LineEdge {
  kind: typeof LINE
  a: Point
  b: Point
  source: number
}
export interface ArcEdge {
  kind: typeof ARC
  a: Point
  b: Point
  source: number
  centre: Point
  radius: number
  /** rad; sweep > 0 counter-clockwise */
  start: number
  sweep: number
}
export interface EllipseEdge {
  kind: typeof ELLIPSE
  a: Point
  b: Point
  source: number
  centre: Point
  u: Point
  v: Point
  start: number
  sweep: number
}
export interface BezierEdge {
  kind: typeof BEZIER
  a: Point
  b: Point
  source: number
  control: Point[]
  /** null for a polynomial piece */
  weights: number[] | null
}
/** One edge as an object: for borders and small numbers, never for hot loops. */
export type Edge = LineEdge | ArcEdge | EllipseEdge | BezierEdge

/** An empty table with room for `edges` edges and `shapes` carrier numbers. It grows by itself. */
export function emptyTable(edges = 64, shapes = 256): EdgeTable {
  return {
    count: 0,
    kind: new Uint8Array(edges),
    ends: new Float64Array(4 * edges),
    shape: new Uint32Array(edges),
    shapes: new Float64Array(shapes),
    shapesUsed: 0,
    source: new Uint32Array(edges),
  }
}

function roomForEdge(table: EdgeTable): void {
  if (table.count === table.kind.length) resize(table, Math.max(64, 2 * table.count))
}

function resize(table: EdgeTable, size: number): void {
  const grow = <T extends Uint8Array | Uint32Array | Float64Array>(to: T, from: T): T => {
    to.set(from)
    return to
  }
  table.kind = grow(new Uint8Array(size), table.kind)
  table.ends = grow(new Float64Array(4 * size), table.ends)
  table.shape = grow(new Uint32Array(size), table.shape)
  table.source = grow(new Uint32Array(size), table.source)
}

function resizeShapes(table: EdgeTable, size: number): void {
  const shapes = new Float64Array(size)
  shapes.set(table.shapes)
  table.shapes = shapes
}

/** Makes room for that many edges and carrier numbers more, where they are known beforehand. */
export function reserve(table: EdgeTable, edges: number, shapes: number): void {
  if (table.count + edges > table.kind.length) resize(table, table.count + edges)
  if (table.shapesUsed + shapes > table.shapes.length) resizeShapes(table, table.shapesUsed + shapes)
}

function roomForShape(table: EdgeTable, numbers: number): number {
  const at = table.shapesUsed
  if (at + numbers > table.shapes.length) resizeShapes(table, Math.max(256, 2 * table.shapes.length, at + numbers))
  table.shapesUsed = at + numbers
  return at
}

function push(table: EdgeTable, kind: EdgeKind, x0: number, y0: number, x1: number, y1: number, source: number): number {
  roomForEdge(table)
  const i = table.count++
  table.kind[i] = kind
  table.ends[4 * i] = x0
  table.ends[4 * i + 1] = y0
  table.ends[4 * i + 2] = x1
  table.ends[4 * i + 3] = y1
  table.source[i] = source
  return i
}

/** Appends a line and returns its index. */
export function pushLine(table: EdgeTable, x0: number, y0: number, x1: number, y1: number, source: number): number {
  return push(table, LINE, x0, y0, x1, y1, source)
}

/** Appends a circular arc; the ends are given, because drawings often know them better than the angles do. */
export function pushArc(
  table: EdgeTable,
  x0: number,
  y0: number,
  x1: number,
  y1: number,
  cx: number,
  cy: number,
  r: number,
  start: number,
  sweep: number,
  source: number,
): number {
  const i = push(table, ARC, x0, y0, x1, y1, source)
  const k = roomForShape(table, 5)
  table.shape[i] = k
  table.shapes[k] = cx
  table.shapes[k + 1] = cy
  table.shapes[k + 2] = r
  table.shapes[k + 3] = start
  table.shapes[k + 4] = sweep
  return i
}

/** Appends an elliptical arc P(t) = c + u·cos t + v·sin t. */
export function pushEllipse(
  table: EdgeTable,
  x0: number,
  y0: number,
  x1: number,
  y1: number,
  cx: number,
  cy: number,
  ux: number,
  uy: number,
  vx: number,
  vy: number,
  start: number,
  sweep: number,
  source: number,
): number {
  const i = push(table, ELLIPSE, x0, y0, x1, y1, source)
  const k = roomForShape(table, 8)
  table.shape[i] = k
  table.shapes.set([cx, cy, ux, uy, vx, vy, start, sweep], k)
  return i
}

/** Appends a Bézier piece; `xyw` holds degree + 1 control points as x y w. */
export function pushBezier(table: EdgeTable, degree: number, rational: boolean, xyw: ArrayLike<number>, source: number): number {
  const n = 3 * degree
  const i = push(table, BEZIER, xyw[0], xyw[1], xyw[n], xyw[n + 1], source)
  const k = roomForShape(table, 2 + n + 3)
  table.shape[i] = k
  table.shapes[k] = degree
  table.shapes[k + 1] = rational ? 1 : 0
  table.shapes.set(xyw, k + 2)
  return i
}

/** Appends edge `i` of `from` unchanged. */
export function pushCopy(table: EdgeTable, from: EdgeTable, i: number): number {
  const e = from.ends
  const j = push(table, from.kind[i] as EdgeKind, e[4 * i], e[4 * i + 1], e[4 * i + 2], e[4 * i + 3], from.source[i])
  const n = shapeLength(from, i)
  if (n > 0) {
    const k = roomForShape(table, n)
    const first = from.shape[i]
    table.shape[j] = k
    for (let m = 0; m < n; m++) table.shapes[k + m] = from.shapes[first + m]
  }
  return j
}

/** How many numbers the carrier of edge i takes in `shapes`. */
export function shapeLength(table: EdgeTable, i: number): number {
  switch (table.kind[i]) {
    case LINE:
      return 0
    case ARC:
      return 5
    case ELLIPSE:
      return 8
    default:
      return 2 + 3 * (table.shapes[table.shape[i]] + 1)
  }
}

/** Edge i as an object. */
export function edgeAt(table: EdgeTable, i: number): Edge {
  const e = table.ends
  const s = table.shapes
  const k = table.shape[i]
  const source = table.source[i]
  const a = { x: e[4 * i], y: e[4 * i + 1] }
  const b = { x: e[4 * i + 2], y: e[4 * i + 3] }
  switch (table.kind[i]) {
    case LINE:
      return { kind: LINE, a, b, source }
    case ARC:
      return { kind: ARC, a, b, source, centre: { x: s[k], y: s[k + 1] }, radius: s[k + 2], start: s[k + 3], sweep: s[k + 4] }
    case ELLIPSE:
      return {
        kind: ELLIPSE,
        a,
        b,
        source,
        centre: { x: s[k], y: s[k + 1] },
        u: { x: s[k + 2], y: s[k + 3] },
        v: { x: s[k + 4], y: s[k + 5] },
        start: s[k + 6],
        sweep: s[k + 7],
      }
    default: {
      const control: Point[] = []
      const weights: number[] = []
      for (let j = 0; j <= s[k]; j++) {
        control.push({ x: s[k + 2 + 3 * j], y: s[k + 3 + 3 * j] })
        weights.push(s[k + 4 + 3 * j])
      }
      return { kind: BEZIER, a, b, source, control, weights: s[k + 1] === 1 ? weights : null }
    }
  }
}

/** Appends an edge given as an object. */
export function pushEdge(table: EdgeTable, edge: Edge): number {
  const { a, b, source } = edge
  switch (edge.kind) {
    case LINE:
      return pushLine(table, a.x, a.y, b.x, b.y, source)
    case ARC:
      return pushArc(table, a.x, a.y, b.x, b.y, edge.centre.x, edge.centre.y, edge.radius, edge.start, edge.sweep, source)
    case ELLIPSE:
      return pushEllipse(
        table,
        a.x,
        a.y,
        b.x,
        b.y,
        edge.centre.x,
        edge.centre.y,
        edge.u.x,
        edge.u.y,
        edge.v.x,
        edge.v.y,
        edge.start,
        edge.sweep,
        source,
      )
    case BEZIER: {
      const xyw = edge.control.flatMap((p, j) => [p.x, p.y, edge.weights ? edge.weights[j] : 1])
      const i = pushBezier(table, edge.control.length - 1, edge.weights !== null, xyw, source)
      table.ends.set([a.x, a.y, b.x, b.y], 4 * i)
      return i
    }
  }
}

/** The same edge walked the other way. */
export function reversed(edge: Edge): Edge {
  const turned = { a: edge.b, b: edge.a }
  switch (edge.kind) {
    case LINE:
      return { ...edge, ...turned }
    case ARC:
    case ELLIPSE:
      return { ...edge, ...turned, start: edge.start + edge.sweep, sweep: -edge.sweep }
    case BEZIER:
      return { ...edge, ...turned, control: [...edge.control].reverse(), weights: edge.weights && [...edge.weights].reverse() }
  }
}
