import { type BezierEdge, BEZIER, type Edge, ELLIPSE, LINE, type Point } from './edges'

function pointAt(edge: Exclude<Edge, BezierEdge>, t: number): Point {
  if (edge.kind === LINE) return { x: edge.a.x + t * (edge.b.x - edge.a.x), y: edge.a.y + t * (edge.b.y - edge.a.y) }
  const angle = edge.start + t * edge.sweep
  const cos = Math.cos(angle)
  const sin = Math.sin(angle)
  const [u, v] =
    edge.kind === ELLIPSE
      ? [edge.u, edge.v]
      : [
          { x: edge.radius, y: 0 },
          { x: 0, y: edge.radius },
        ]
  return { x: edge.centre.x + u.x * cos + v.x * sin, y: edge.centre.y + u.y * cos + v.y * sin }
}

/** De Casteljau's scheme in homogeneous coordinates. */
function splitBezier(edge: BezierEdge, t: number): [BezierEdge, BezierEdge] {
  const work = edge.control.map(({ x, y }, j) => {
    const w = edge.weights ? edge.weights[j] : 1
    return [x * w, y * w, w]
  })
  const left: number[][] = []
  const right: number[][] = []
  for (let n = work.length; n > 0; n--) {
    left.push(work[0].slice())
    right.unshift(work[n - 1].slice())
    for (let j = 0; j + 1 < n; j++) for (let c = 0; c < 3; c++) work[j][c] += t * (work[j + 1][c] - work[j][c])
  }
  const piece = (rows: number[][], a: Point | null, b: Point | null): BezierEdge => {
    const control = rows.map(([x, y, w]) => ({ x: x / w, y: y / w }))
    return {
      ...edge,
      control,
      weights: edge.weights && rows.map(([, , w]) => w),
      a: a ?? control[0],
      b: b ?? control[control.length - 1],
    }
  }
  return [piece(left, edge.a, null), piece(right, null, edge.b)]
}

/** Both parts of an edge cut at t in (0, 1); together the same curve, the cut shared to the last bit (at `place` if given). */
export function splitEdge(edge: Edge, t: number, place?: Point): [Edge, Edge] {
  if (edge.kind === BEZIER) {
    const [left, right] = splitBezier(edge, t)
    const cut = place ?? left.b
    return [
      { ...left, b: cut },
      { ...right, a: cut },
    ]
  }
  const cut = place ?? pointAt(edge, t)
  if (edge.kind === LINE)
    return [
      { ...edge, b: cut },
      { ...edge, a: cut },
    ]
  return [
    { ...edge, b: cut, sweep: t * edge.sweep },
    { ...edge, a: cut, start: edge.start + t * edge.sweep, sweep: (1 - t) * edge.sweep },
  ]
}
