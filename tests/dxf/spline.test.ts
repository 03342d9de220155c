import { describe, expect, it } from 'vitest'
import { BEZIER, LINE } from '@/lib/geometry/edges'
import { bezierPiece, cutBezier } from '@/lib/dxf/spline/bezierPieces'
import { greatestDistance, interpolate, parametersBy } from '@/lib/dxf/spline/interpolate'
import { random } from '../support/random'
import { codesOf, drawn, edgesOf, entity, finding, fixture, read } from '../support/dxf'

type XY = [number, number]
const spline = (degree: number, knots: number[], control: XY[], weights: number[] = [], flags = weights.length > 0 ? 12 : 8) =>
  entity(
    'SPLINE',
    [70, flags],
    [71, degree],
    [72, knots.length],
    [73, control.length],
    [74, 0],
    ...knots.map((k): XY => [40, k]),
    ...weights.map((w): XY => [41, w]),
    ...control.flatMap(([x, y]): XY[] => [
      [10, x],
      [20, y],
    ]),
  )
const through = (points: XY[], flags = 8, ...rest: XY[]) =>
  entity(
    'SPLINE',
    [70, flags],
    [71, 3],
    [72, 0],
    [73, 0],
    [74, points.length],
    ...rest,
    ...points.flatMap(([x, y]): XY[] => [
      [11, x],
      [21, y],
    ]),
  )
const only = (text: string) => edgesOf(read(drawn(text)))
const CUBIC: XY[] = [
  [0, 0],
  [0, 10],
  [10, 10],
  [10, 0],
]
const CLAMPED = [0, 0, 0, 0, 1, 1, 1, 1]

/** de Boor's scheme, written a second time for the test: the point at u of a polynomial B-spline. */
function deBoor(degree: number, knots: number[], control: XY[], u: number): XY {
  let span = degree
  while (span < control.length - 1 && u >= knots[span + 1]) span++
  const d = control.slice(span - degree, span + 1).map(([x, y]) => [x, y])
  for (let r = 1; r <= degree; r++)
    for (let j = degree; j >= r; j--) {
      const i = span - degree + j
      const a = (u - knots[i]) / (knots[i + degree + 1 - r] - knots[i])
      d[j] = [(1 - a) * d[j - 1][0] + a * d[j][0], (1 - a) * d[j - 1][1] + a * d[j][1]]
    }
  return [d[degree][0], d[degree][1]]
}

describe('SPLINE of control points', () => {
  // cubic (0,0)(0,10)(10,10)(10,0), knots 0×4 1×4: P(½) = (5, 7.5), from the definition
  it('a clamped cubic of four points is one Bézier piece, and passes (5, 7.5)', () => {
    const [edge, ...more] = only(spline(3, CLAMPED, CUBIC))
    expect(more).toEqual([])
    expect(edge).toMatchObject({ kind: BEZIER, control: CUBIC.map(([x, y]) => ({ x, y })), weights: null })
    const homogeneous = Float64Array.from(CUBIC.flatMap(([x, y]) => [x, y, 1]))
    expect([...cutBezier(homogeneous, 0.5)[1].subarray(0, 2)]).toEqual([5, 7.5])
  })

  // quadratic (1,0)(1,1)(0,1), weights 1 √½ 1: the unit quarter circle
  it('weights 1 √½ 1 make the unit quarter circle: every point of the piece is 1 from the origin', () => {
    const edges = only(
      spline(
        2,
        [0, 0, 0, 1, 1, 1],
        [
          [1, 0],
          [1, 1],
          [0, 1],
        ],
        [1, Math.SQRT1_2, 1],
      ),
    )
    expect(edges).toMatchObject([{ kind: BEZIER, weights: [1, Math.SQRT1_2, 1] }])
    const homogeneous = Float64Array.from([1, 0, 1, Math.SQRT1_2, Math.SQRT1_2, Math.SQRT1_2, 0, 1, 1])
    for (const t of [0.1, 0.3, 0.5, 0.9]) {
      const [x, y, w] = cutBezier(homogeneous, t)[1]
      expect(Math.hypot(x / w, y / w)).toBeWithin(1, { absolute: 4e-16 })
    }
  })

  it('pieces of random B-splines, clamped or not, lie on the curve to 1e-13', () => {
    for (let seed = 1; seed <= 60; seed++) {
      const next = random(seed)
      const degree = 1 + Math.floor(next() * 5)
      const count = degree + 1 + Math.floor(next() * 8)
      const control = Array.from({ length: count }, (): XY => [100 * next(), 100 * next()])
      let u = 0
      const knots = Array.from({ length: count + degree + 1 }, () => (u += next() < 0.2 ? 0 : next()))
      const homogeneous = Float64Array.from(control.flatMap(([x, y]) => [x, y, 1]))
      for (let span = degree; span < count; span++) {
        if (knots[span] >= knots[span + 1]) continue
        const piece = bezierPiece(degree, knots, homogeneous, span)
        for (const t of [0.25, 0.75]) {
          const wanted = deBoor(degree, knots, control, knots[span] + t * (knots[span + 1] - knots[span]))
          const [x, y] = cutBezier(piece, t)[1]
          expect(Math.hypot(x - wanted[0], y - wanted[1]), `seed ${seed}`).toBeWithin(0, { absolute: 1e-11 })
        }
      }
    }
  })

  it('uniform knots are read on [u_p, u_(n+1)] only: three control points too many at both ends close p11', () => {
    const edges = edgesOf(read(fixture('cases', 'p11.dxf'))).filter(({ kind }) => kind === BEZIER)
    expect(edges[0].a).toEqual(edges[edges.length - 1].b)
    for (let i = 1; i < edges.length; i++) expect(edges[i].a).toEqual(edges[i - 1].b)
  })

  it('a knot as often as the degree splits the curve at a control point', () => {
    const edges = only(
      spline(
        2,
        [0, 0, 0, 1, 1, 2, 2, 2],
        [
          [0, 0],
          [5, 5],
          [10, 0],
          [15, 5],
          [20, 0],
        ],
      ),
    )
    expect(edges.map(({ a, b }) => [a, b])).toEqual([
      [
        { x: 0, y: 0 },
        { x: 10, y: 0 },
      ],
      [
        { x: 10, y: 0 },
        { x: 20, y: 0 },
      ],
    ])
  })

  it('a cusp (zero of the hodograph) splits its piece', () => {
    // x' and y' are both 0 at t = ½
    const edges = only(
      spline(3, CLAMPED, [
        [0, 0],
        [10, 10],
        [0, 10],
        [10, 0],
      ]),
    )
    expect(edges).toHaveLength(2)
    expect(edges[0].b.x).toBeWithin(5, { absolute: 1e-7 })
    expect(edges[0].b.y).toBeWithin(7.5, { absolute: 1e-7 })
  })

  it('degree 1 gives lines, and so does a straight cubic', () => {
    expect(
      only(
        spline(
          1,
          [0, 0, 1, 2, 2],
          [
            [0, 0],
            [5, 5],
            [9, 0],
          ],
        ),
      ).map(({ kind }) => kind),
    ).toEqual([LINE, LINE])
    expect(
      only(
        spline(3, CLAMPED, [
          [0, 0],
          [1, 2],
          [2, 4],
          [3, 6],
        ]),
      ),
    ).toMatchObject([{ kind: LINE, b: { x: 3, y: 6 } }])
  })

  it('pieces with weights more than twice apart are halved until they are not', () => {
    const edges = only(
      spline(
        2,
        [0, 0, 0, 1, 1, 1],
        [
          [0, 0],
          [5, 9],
          [10, 0],
        ],
        [1, 30, 1],
      ),
    )
    expect(edges.length).toBeGreaterThan(4)
    for (const edge of edges) {
      if (edge.kind !== BEZIER || !edge.weights) throw new Error('no rational piece')
      expect(Math.max(...edge.weights) / Math.min(...edge.weights)).toBeLessThanOrEqual(2)
    }
  })

  it('equal weights are no weights', () => {
    expect(only(spline(3, CLAMPED, CUBIC, [2, 2, 2, 2]))).toMatchObject([{ weights: null }])
  })

  it.each<[string, string, RegExp]>([
    ['decreasing knots', spline(3, [0, 0, 0, 0, 1, 1, 0.5, 1], CUBIC), /knots decrease, from 1 to 0.5/],
    ['too few knots', spline(3, [0, 0, 0, 1, 1], CUBIC), /has 5 knots; 4 control points of degree 3 need 8/],
    ['knots that span nothing', spline(3, [0, 0, 0, 0, 0, 0, 0, 0], CUBIC), /knots span nothing/],
    ['too few control points', spline(3, [0, 0, 0, 1, 1, 1], CUBIC.slice(0, 2)), /has 2 control points; degree 3 needs 4/],
    ['a weight of 0', spline(3, CLAMPED, CUBIC, [1, 0, 1, 1]), /a weight of 0/],
    ['a negative weight', spline(3, CLAMPED, CUBIC, [1, -1, 1, 1]), /a weight of -1/],
    ['weights 1e7 apart', spline(3, CLAMPED, CUBIC, [1, 1e7, 1, 1]), /weights lie 1.00e\+7 times apart/],
    ['weights missing', spline(3, CLAMPED, CUBIC, [], 12), /says that it is rational/],
    ['one weight missing', spline(3, CLAMPED, CUBIC, [1, 2, 1]), /3 weights for 4 control points/],
    ['degree 0', spline(0, [0, 1, 2, 3, 4], CUBIC), /degree is 0/],
    ['degree 1000', spline(1000, [0, 1], CUBIC), /degree is 1000/],
    ['nothing', spline(3, [], []), /no control points and no fit points/],
    ['a count that lies', spline(3, CLAMPED, CUBIC).replace('73\n4', '73\n5'), /says 5 control points and has 4/],
    ['a point without y', spline(3, CLAMPED, CUBIC).replace('20\n0\n', ''), /point without x or y/],
  ])('%s is refused by name', (_, text, says) => {
    const drawing = read(drawn(text))
    expect(drawing.edges.count).toBe(0)
    expect(finding(drawing, 'spline-bad').message).toMatch(says)
    expect(finding(drawing, 'spline-bad').severity).toBe('error')
  })
})

describe('SPLINE of fit points', () => {
  const points: XY[] = [
    [0, 0],
    [10, 8],
    [20, 3],
    [30, 9],
  ]

  it('passes all points, and says how it was laid and how far another way would lie', () => {
    const drawing = read(drawn(through(points)))
    expect(edgesOf(drawing).map(({ a }) => [a.x, a.y])).toEqual(points.slice(0, 3))
    const { message, params } = finding(drawing, 'spline-fit-points')
    expect(message).toContain('chord-length parameters')
    expect(message).toContain('without curvature at its ends')
    expect(params.difference).toBeGreaterThan(0)
    expect(params.difference).toBeLessThan(1)
  })

  it('has no curvature at its ends without end tangents, and a continuous second derivative inside', () => {
    const u = parametersBy(1, points)
    const pieces = interpolate(points, u, { start: null, end: null, periodic: false })
    const second = (piece: Float64Array, at: 0 | 1, c: number, h: number) => {
      const p = (k: number) => piece[3 * k + c]
      return (6 * (at === 0 ? p(0) - 2 * p(1) + p(2) : p(1) - 2 * p(2) + p(3))) / (h * h)
    }
    for (const c of [0, 1]) {
      expect(second(pieces[0], 0, c, u[1])).toBeWithin(0, { absolute: 1e-14 })
      expect(second(pieces[2], 1, c, u[3] - u[2])).toBeWithin(0, { absolute: 1e-14 })
      for (const i of [0, 1]) {
        const before = second(pieces[i], 1, c, u[i + 1] - u[i])
        expect(second(pieces[i + 1], 0, c, u[i + 2] - u[i + 1])).toBeWithin(before, { absolute: 1e-13 })
      }
    }
  })

  it('closed, it runs smoothly through its first point and lies within 7e-5 of the unit circle for 16 points on it (h⁴/384, the order of cubic interpolation)', () => {
    const circle = Array.from({ length: 16 }, (_, i): XY => [Math.cos((i * Math.PI) / 8), Math.sin((i * Math.PI) / 8)])
    const edges = edgesOf(read(drawn(through(circle, 9))))
    expect(edges).toHaveLength(16)
    expect(edges[15].b).toEqual(edges[0].a)
    for (const edge of edges) {
      if (edge.kind !== BEZIER) throw new Error('no curve')
      const [p, q, r, s] = edge.control
      expect(Math.hypot(p.x + 3 * q.x + 3 * r.x + s.x, p.y + 3 * q.y + 3 * r.y + s.y) / 8).toBeWithin(1, { absolute: 7e-5 })
    }
  })

  it('keeps end tangents that are given', () => {
    const [first] = only(through(points, 8, [12, 0], [22, 5]))
    if (first.kind !== BEZIER) throw new Error('no curve')
    expect(first.control[1].x).toBe(0)
    expect(first.control[1].y).toBeGreaterThan(0)
  })

  it('two points are a straight line, and both parametrisations agree', () => {
    expect(
      only(
        through([
          [0, 0],
          [3, 4],
        ]),
      ),
    ).toMatchObject([{ kind: LINE }])
    const pieces = interpolate(
      [
        [0, 0],
        [3, 4],
      ],
      [0, 5],
      { start: null, end: null, periodic: false },
    )
    expect(greatestDistance(pieces, pieces)).toBeWithin(0, { absolute: 0.02 })
  })

  it('with a fit tolerance, or with one point, is refused', () => {
    expect(codesOf(read(drawn(through(points, 8, [44, 0.5]))))).toContain('spline-bad')
    expect(
      codesOf(
        read(
          drawn(
            through([
              [1, 1],
              [1, 1],
            ]),
          ),
        ),
      ),
    ).toContain('spline-bad')
  })
})
