import { ARC, BEZIER, type Edge, type EdgeTable, ELLIPSE, emptyTable, LINE, type Point, pushEdge } from '@/lib/geometry/edges'

/** A closed outline, counter-clockwise. */
export type Shape = Edge[]

export const lineTo = (a: Point, b: Point): Edge => ({ kind: LINE, a, b, source: 0 })

export function arc(centre: Point, radius: number, start: number, sweep: number, a?: Point, b?: Point): Edge {
  const at = (t: number) => ({ x: centre.x + radius * Math.cos(t), y: centre.y + radius * Math.sin(t) })
  return { kind: ARC, a: a ?? at(start), b: b ?? at(start + sweep), centre, radius, start, sweep, source: 0 }
}

export function circle(x: number, y: number, radius: number, start = 0): Shape {
  const a = { x: x + radius * Math.cos(start), y: y + radius * Math.sin(start) }
  return [arc({ x, y }, radius, start, 2 * Math.PI, a, a)]
}

export function polygon(...points: [number, number][]): Shape {
  const p = points.map(([x, y]) => ({ x, y }))
  return p.map((a, i) => lineTo(a, p[(i + 1) % p.length]))
}

export const rectangle = (x: number, y: number, w: number, h: number): Shape =>
  polygon([x, y], [x + w, y], [x + w, y + h], [x, y + h])

/** A rectangle with corners of radius r; r = h/2 gives a slot. */
export function rounded(x: number, y: number, w: number, h: number, r: number): Shape {
  const corners = [
    { x: x + w - r, y: y + r, start: -Math.PI / 2 },
    { x: x + w - r, y: y + h - r, start: 0 },
    { x: x + r, y: y + h - r, start: Math.PI / 2 },
    { x: x + r, y: y + r, start: Math.PI },
  ]
  const reach = [
    [0, -r, r, 0],
    [r, 0, 0, r],
    [0, r, -r, 0],
    [-r, 0, 0, -r],
  ]
  const arcs = corners.map(({ x: cx, y: cy, start }, i) => {
    const [ax, ay, bx, by] = reach[i]
    return arc({ x: cx, y: cy }, r, start, Math.PI / 2, { x: cx + ax, y: cy + ay }, { x: cx + bx, y: cy + by })
  })
  const shape: Shape = []
  arcs.forEach((edge, i) => {
    shape.push(edge)
    const next = arcs[(i + 1) % 4]
    if (edge.b.x !== next.a.x || edge.b.y !== next.a.y) shape.push(lineTo(edge.b, next.a))
    else next.a = edge.b
  })
  return shape
}

/** x → a·x + c·y + e, y → b·x + d·y + f */
export type Affine = [a: number, b: number, c: number, d: number, e: number, f: number]

export const turnAndMove = (angle: number, x: number, y: number): Affine => {
  const [c, s] = [Math.cos(angle), Math.sin(angle)]
  return [c, s, -s, c, x, y]
}

/** The affine image, exact: arcs become elliptical arcs unless the map is a rotation and shift. */
export function mapped(shape: Shape, [a, b, c, d, e, f]: Affine): Shape {
  const p = ({ x, y }: Point) => ({ x: a * x + c * y + e, y: b * x + d * y + f })
  const v = ({ x, y }: Point) => ({ x: a * x + c * y, y: b * x + d * y })
  const rigid = a === d && b === -c
  return shape.map((edge): Edge => {
    const ends = { a: p(edge.a), b: p(edge.b), source: edge.source }
    switch (edge.kind) {
      case LINE:
        return { kind: LINE, ...ends }
      case ARC: {
        const { radius: r, start, sweep } = edge
        if (rigid) return { kind: ARC, ...ends, centre: p(edge.centre), radius: r, start: start + Math.atan2(b, a), sweep }
        return { kind: ELLIPSE, ...ends, centre: p(edge.centre), u: v({ x: r, y: 0 }), v: v({ x: 0, y: r }), start, sweep }
      }
      case ELLIPSE:
        return { ...edge, ...ends, centre: p(edge.centre), u: v(edge.u), v: v(edge.v) }
      default:
        return { ...edge, ...ends, control: edge.control.map(p) }
    }
  })
}

/** Arcs as Bézier pieces on their quadrants: rational quadratic (exact), or cubic (another curve, the same for equal quadrants). */
export function asBeziers(shape: Shape, rational: boolean): Shape {
  return shape.flatMap((edge): Edge[] => {
    if (edge.kind === LINE) {
      const { a, b, source } = edge
      return [{ kind: BEZIER, a, b, source, control: [a, { x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 }, b], weights: null }]
    }
    if (edge.kind !== ARC) return [edge]
    const { centre, radius: r, start, sweep, source } = edge
    const n = Math.max(1, Math.round(Math.abs(sweep) / (Math.PI / 2)))
    const at = (t: number, k: number) => ({ x: centre.x + k * r * Math.cos(t), y: centre.y + k * r * Math.sin(t) })
    const step = sweep / n
    const joints = Array.from({ length: n + 1 }, (_, i) => (i === 0 ? edge.a : i === n ? edge.b : at(start + i * step, 1)))
    return joints.slice(1).map((b, i): Edge => {
      const a = joints[i]
      const t = start + i * step
      if (rational)
        return {
          kind: BEZIER,
          a,
          b,
          source,
          control: [a, at(t + step / 2, 1 / Math.cos(step / 2)), b],
          weights: [1, Math.cos(step / 2), 1],
        }
      const k = (4 / 3) * Math.tan(step / 4) * r
      const tangent = (q: Point, angle: number, m: number) => ({ x: q.x - m * Math.sin(angle), y: q.y + m * Math.cos(angle) })
      return { kind: BEZIER, a, b, source, control: [a, tangent(a, t, k), tangent(b, t + step, -k), b], weights: null }
    })
  })
}

/** Shapes as one table with the shape's number as owner of each edge. */
export function tableOf(shapes: Shape[]): { edges: EdgeTable; owner: Uint32Array } {
  const edges = emptyTable()
  const owner: number[] = []
  shapes.forEach((shape, k) => {
    for (const edge of shape) {
      pushEdge(edges, { ...edge, source: k })
      owner.push(k)
    }
  })
  return { edges, owner: Uint32Array.from(owner) }
}

export const sizeOf = (shapes: Shape[]): number => {
  const xs = shapes.flat().flatMap((e) => [e.a.x, e.b.x])
  const ys = shapes.flat().flatMap((e) => [e.a.y, e.b.y])
  return Math.max(Math.max(...xs) - Math.min(...xs), Math.max(...ys) - Math.min(...ys), 1)
}
