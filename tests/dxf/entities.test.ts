import { describe, expect, it } from 'vitest'
import { ARC, ELLIPSE, LINE } from '@/lib/geometry/edges'
import { circle, codesOf, drawn, edgesOf, endsOf, entity, finding, groups, line, read } from '../support/dxf'

const only = (text: string) => edgesOf(read(drawn(text)))
const behind: [number, number][] = [
  [210, 0],
  [220, 0],
  [230, -1],
]
const arc = (x: number, y: number, r: number, from: number, to: number, ...rest: [number, number][]) =>
  entity('ARC', [10, x], [20, y], [40, r], [50, from], [51, to], ...rest)
const ellipse = (values: number[], ...rest: [number, number][]) =>
  entity('ELLIPSE', ...[10, 20, 11, 21, 40, 41, 42].map((code, i): [number, number] => [code, values[i]]), ...rest)
type Vertex = [x: number, y: number, bulge?: number]
const vertices = (list: Vertex[]): [number, number][] =>
  list.flatMap(([x, y, b]): [number, number][] =>
    b === undefined
      ? [
          [10, x],
          [20, y],
        ]
      : [
          [10, x],
          [20, y],
          [42, b],
        ],
  )
const lwpolyline = (list: Vertex[], flags = 1, ...rest: [number, number][]) =>
  entity('LWPOLYLINE', [90, list.length], [70, flags], ...rest, ...vertices(list))
const polyline = (list: Vertex[], flags: number, { end = true, vertex = 0, head = [] as [number, number][] } = {}) =>
  entity('POLYLINE', [66, 1], [10, 0], [20, 0], [70, flags], ...head) +
  list.map((v) => entity('VERTEX', ...vertices([v]), [70, vertex])).join('') +
  (end ? entity('SEQEND') : '')
const SQUARE: Vertex[] = [
  [0, 0],
  [10, 0],
  [10, 10],
  [0, 10],
]

describe('LINE', () => {
  it('keeps both points and is taken in plan, with a warning where its heights differ', () => {
    expect(endsOf(read(drawn(line(1, 2, 3, 4, [30, 5], [31, 5]))))).toEqual([[1, 2, 3, 4]])
    const drawing = read(drawn(line(1, 2, 3, 4, [31, 5])))
    expect(finding(drawing, 'heights-in-entity').message).toContain('z from 0 to 5; taken in plan')
    expect(drawing.edges.count).toBe(1)
  })

  it('takes its groups in any order', () => {
    expect(endsOf(read(drawn(entity('LINE', [21, 4], [11, 3], [20, 2], [10, 1]))))).toEqual([[1, 2, 3, 4]])
  })

  it('without a second point gives no edge and an error that names the group', () => {
    const drawing = read(drawn(entity('LINE', [10, 1], [20, 2], [11, 3])))
    expect(drawing.edges.count).toBe(0)
    expect(finding(drawing, 'group-missing').message).toContain('the y of its second point (group 21) is missing')
  })

  it('without length gives no edge and a note', () => {
    expect(codesOf(read(drawn(line(1, 2, 1, 2) + line(0, 0, 1, 1))))).toContain('no-length')
  })

  it('ignores extended data, whatever it holds', () => {
    expect(endsOf(read(drawn(line(1, 2, 3, 4, [1001, 'APP'], [1010, 9], [10, 7]))))).toEqual([[1, 2, 3, 4]])
  })
})

describe('CIRCLE and ARC', () => {
  it('a circle is one whole turn from (x + r, y)', () => {
    expect(only(circle(5, 6, 2))).toEqual([
      {
        kind: ARC,
        a: { x: 7, y: 6 },
        b: { x: 7, y: 6 },
        centre: { x: 5, y: 6 },
        radius: 2,
        start: 0,
        sweep: 2 * Math.PI,
        source: 0,
      },
    ])
  })

  it('an arc from 270° over 0° to 90° sweeps half a turn, its ends exact', () => {
    expect(only(arc(0, 0, 3, 270, 90))).toMatchObject([{ a: { x: 0, y: -3 }, b: { x: 0, y: 3 }, sweep: Math.PI }])
  })

  it('an arc from 0° to 360° is a whole turn', () => {
    expect(only(arc(0, 0, 3, 0, 360))).toMatchObject([{ a: { x: 3, y: 0 }, b: { x: 3, y: 0 }, sweep: 2 * Math.PI }])
  })

  it.each([
    [0, 360],
    [90, 450],
    [10, -350],
    [0, 359.9999999999],
    [0, 720],
  ])('an arc from %d° to %d° is a whole turn, the rounding of its angles aside', (from, to) => {
    expect(only(arc(0, 0, 3, from, to))).toMatchObject([{ sweep: 2 * Math.PI }])
  })

  it('an arc whose angles are apart by rounding only is an error', () => {
    expect(codesOf(read(drawn(arc(0, 0, 3, 90, 90.00000000000001))))).toContain('arc-without-sweep')
  })

  it('an arc whose angles are equal is nothing or a whole turn: an error', () => {
    expect(codesOf(read(drawn(arc(0, 0, 3, 30, 30))))).toContain('arc-without-sweep')
  })

  // OCS of N = (0, 0, −1): Ax = (−1, 0, 0), Ay = (0, 1, 0) (DXF reference of the format's maker, arbitrary axis algorithm)
  it('seen from behind, x is mirrored and the arc runs clockwise from 180° − a', () => {
    const [edge] = only(arc(-5, 1, 2, 0, 90, ...behind))
    expect(edge).toMatchObject({
      kind: ARC,
      centre: { x: 5, y: 1 },
      a: { x: 3, y: 1 },
      b: { x: 5, y: 3 },
      start: Math.PI,
      sweep: -Math.PI / 2,
    })
    expect(only(circle(-5, 1, 2, ...behind))).toMatchObject([{ centre: { x: 5, y: 1 }, radius: 2 }])
  })

  it.each([
    ['0, 1, 0', [0, 1, 0]],
    ['0, 0, 0', [0, 0, 0]],
    ['0, 0.1, 1', [0, 0.1, 1]],
  ])('a circle with extrusion direction (%s) is refused by name', (text, [x, y, z]) => {
    const drawing = read(drawn(circle(0, 0, 2, [210, x], [220, y], [230, z])))
    expect(drawing.edges.count).toBe(0)
    expect(finding(drawing, 'tilted').message).toContain(`(${text})`)
  })

  it.each([0, -5])('a radius of %i is refused', (r) => {
    expect(finding(read(drawn(circle(0, 0, r))), 'radius-bad').message).toContain(`its radius is ${r}`)
  })

  it('a missing radius is an error and not 1', () => {
    const drawing = read(drawn(entity('CIRCLE', [10, 0], [20, 0])))
    expect(drawing.edges.count).toBe(0)
    expect(finding(drawing, 'group-missing').message).toContain('its radius (group 40) is missing')
  })
})

describe('ELLIPSE', () => {
  it('is c + M cos t + r (N × M) sin t', () => {
    expect(only(ellipse([1, 2, 3, 4, 0.5, 0, Math.PI / 2]))).toMatchObject([
      { kind: ELLIPSE, a: { x: 4, y: 6 }, centre: { x: 1, y: 2 }, u: { x: 3, y: 4 }, v: { x: -2, y: 1.5 }, sweep: Math.PI / 2 },
    ])
  })

  it('N = (0, 0, −1) reverses the sense', () => {
    expect(only(ellipse([1, 2, 3, 4, 0.5, 0, Math.PI / 2], ...behind))).toMatchObject([
      { u: { x: 3, y: 4 }, v: { x: 2, y: -1.5 } },
    ])
  })

  it('a ratio above 1 is the same curve with its axes exchanged, and a note', () => {
    const drawing = read(drawn(ellipse([0, 0, 1, 0, 2, 0, 6.283185307])))
    expect(edgesOf(drawing)).toMatchObject([{ u: { x: 1, y: 0 }, v: { x: 0, y: 2 }, sweep: 2 * Math.PI }])
    expect(codesOf(drawing)).toEqual(['ellipse-ratio'])
  })

  it.each([6.2832, 6.28319, 6.28318531])('a full turn written as %d, rounded beyond 2π, is a full ellipse', (end) => {
    const drawing = read(drawn(ellipse([0, 0, 12, 0, 0.5, 0, end])))
    expect(drawing.entities.closed[0]).toBe(1)
    expect(edgesOf(drawing)).toEqual(only(ellipse([0, 0, 12, 0, 0.5, 0, 2 * Math.PI])))
  })

  it('a ratio of exactly 1 is a circular arc', () => {
    expect(only(ellipse([0, 0, 0, 2, 1, 0, Math.PI]))).toMatchObject([
      { kind: ARC, radius: 2, start: Math.PI / 2, sweep: Math.PI },
    ])
  })

  it.each([
    ['a ratio of 0', [0, 0, 1, 0, 0, 0, 6]],
    ['a negative ratio', [0, 0, 1, 0, -0.5, 0, 6]],
    ['no major axis', [0, 0, 0, 0, 0.5, 0, 6]],
  ])('%s is refused', (_, values) => {
    expect(codesOf(read(drawn(ellipse(values))))).toContain('ellipse-bad')
  })
})

describe('LWPOLYLINE', () => {
  // (0,0) → (10,0), b = 0.5: Δ = 106.260204708312°, r = 6.25, centre (5, 3.75), lowest point (5, −2.5): tan(Δ/4) and
  // elementary geometry
  it('a bulge of 0.5 on a chord of 10 has radius 6.25 about (5, 3.75)', () => {
    const [edge] = only(
      lwpolyline(
        [
          [0, 0, 0.5],
          [10, 0],
        ],
        0,
      ),
    )
    if (edge.kind !== ARC) throw new Error('no arc')
    expect(edge.centre).toEqual({ x: 5, y: 3.75 })
    expect(edge.radius).toBe(6.25)
    expect((edge.sweep * 180) / Math.PI).toBeWithin(106.260204708312, { absolute: 1e-12 })
    expect(edge.centre.y + edge.radius * Math.sin(edge.start + edge.sweep / 2)).toBeWithin(-2.5, { absolute: 1e-14 })
  })

  it('a bulge of 1 is half a turn, √2 − 1 a quarter', () => {
    expect(
      only(
        lwpolyline(
          [
            [0, 0, 1],
            [10, 0],
          ],
          0,
        ),
      ),
    ).toMatchObject([{ centre: { x: 5, y: 0 }, radius: 5, sweep: Math.PI }])
    const [edge] = only(
      lwpolyline(
        [
          [0, 0, 0.414213562373095],
          [10, 0],
        ],
        0,
      ),
    )
    expect(edge.kind === ARC && edge.sweep).toBeWithin(Math.PI / 2, { absolute: 1e-15 * 8 })
  })

  it('seen from behind, x and bulges change sign', () => {
    const [edge] = only(
      lwpolyline(
        [
          [0, 0, 0.5],
          [-10, 0],
        ],
        0,
        ...behind,
      ),
    )
    expect(edge).toMatchObject({ a: { x: 0, y: 0 }, b: { x: 10, y: 0 }, centre: { x: 5, y: -3.75 } })
  })

  it('a closed one has an edge back to its first vertex, an open one has not', () => {
    expect(only(lwpolyline(SQUARE))).toHaveLength(4)
    expect(only(lwpolyline(SQUARE, 0))).toHaveLength(3)
    expect(read(drawn(lwpolyline(SQUARE))).entities.closed[0]).toBe(1)
  })

  it('vertices written twice give no edge without length', () => {
    expect(only(lwpolyline([...SQUARE, [0, 10], [0, 0]]))).toHaveLength(4)
  })

  it('takes vertex ids (91), a missing count, x and y listed apart, and y before x', () => {
    const wanted = endsOf(
      read(
        drawn(
          lwpolyline([
            [0, 0, 0.5],
            [10, 0],
            [10, 10],
          ]),
        ),
      ),
    )
    const same = (...list: [number, number][]) => expect(endsOf(read(drawn(entity('LWPOLYLINE', ...list))))).toEqual(wanted)
    same([90, 3], [70, 1], [10, 0], [20, 0], [42, 0.5], [91, 1], [10, 10], [20, 0], [91, 2], [10, 10], [20, 10], [91, 3])
    same([70, 1], [10, 0], [20, 0], [42, 0.5], [10, 10], [20, 0], [10, 10], [20, 10])
    same([70, 1], [10, 0], [42, 0.5], [20, 0], [10, 10], [20, 0], [10, 10], [20, 10])
    same([70, 1], [20, 0], [10, 0], [42, 0.5], [20, 0], [10, 10], [20, 10], [10, 10])
    same([70, 1], [20, 0], [42, 0.5], [10, 0], [20, 0], [10, 10], [20, 10], [10, 10])
  })

  it.each([
    ['a count above its vertices', [[90, 9], ...vertices(SQUARE)], /says 9 vertices and has 4/],
    ['a count below its vertices', [[90, 2], ...vertices(SQUARE)], /says 2 vertices and has 4/],
    [
      'a vertex without y',
      [
        [10, 0],
        [20, 0],
        [10, 5],
        [10, 9],
        [20, 5],
      ],
      /a vertex has no y/,
    ],
    ['a bulge before the first vertex', [[42, 1], ...vertices(SQUARE)], /before the first vertex/],
  ] as [string, [number, number][], RegExp][])('%s is an error and gives no edge', (_, list, says) => {
    const drawing = read(drawn(entity('LWPOLYLINE', [70, 1], ...list)))
    expect(drawing.edges.count).toBe(0)
    const [found] = drawing.remarks[0]
    expect(found.severity).toBe('error')
    expect(found.message).toMatch(says)
  })

  it('a width asks whether it is the centre line of a sheet', () => {
    expect(finding(read(drawn(lwpolyline(SQUARE, 1, [43, 2]))), 'polyline-width').message).toContain('has a width of 2')
    expect(finding(read(drawn(lwpolyline(SQUARE, 1, [40, 0], [41, 1.5]))), 'polyline-width').message).toContain('1.5')
  })

  it('thickness is no matter', () => {
    expect(codesOf(read(drawn(lwpolyline(SQUARE, 1, [39, 25]))))).toEqual([])
  })
})

describe('POLYLINE', () => {
  it('gives the edges of its vertices, with or without SEQEND', () => {
    const wanted = endsOf(read(drawn(lwpolyline(SQUARE))))
    expect(endsOf(read(drawn(polyline(SQUARE, 1))))).toEqual(wanted)
    const unended = read(drawn(polyline(SQUARE, 1, { end: false }) + line(50, 0, 60, 0)))
    expect(endsOf(unended)).toEqual([...wanted, [50, 0, 60, 0]])
    expect(codesOf(unended)).toEqual(['polyline-without-end'])
  })

  it('control points of a frame are no metal; points of a curve fit and a spline fit are', () => {
    const frame = entity('VERTEX', [10, 99], [20, 99], [70, 16])
    const fitted = polyline(SQUARE, 5, { vertex: 8 }).replace(entity('SEQEND'), frame + entity('SEQEND'))
    expect(only(fitted)).toHaveLength(4)
    expect(only(polyline(SQUARE, 3, { vertex: 1 }))).toHaveLength(4)
  })

  it('with its control frame only is an error', () => {
    expect(codesOf(read(drawn(polyline(SQUARE, 5, { vertex: 16 }))))).toContain('spline-frame-only')
  })

  it.each([
    [16, 'mesh'],
    [64, 'polyface mesh'],
  ])('with flag %i is named a %s and counted', (flag, what) => {
    const drawing = read(drawn(polyline(SQUARE, flag)))
    expect(finding(drawing, 'polyline-mesh').message).toContain(`is a ${what}`)
    expect(drawing.ignored).toEqual({ POLYLINE: 1 })
    expect(drawing.edges.count).toBe(0)
  })

  it('in space is taken in plan: level with a note, else with a warning', () => {
    const level = polyline(SQUARE, 9, { vertex: 32 })
    expect(codesOf(read(drawn(level)))).toEqual(['polyline-3d'])
    const sloping = read(drawn(level.replace('10\n10\n20\n10\n', '10\n10\n20\n10\n30\n7\n')))
    expect(finding(sloping, 'heights-in-entity').message).toContain('z from 0 to 7')
  })

  it('with a vertex that cannot be read gives no edge and names VERTEX and line', () => {
    const drawing = read(drawn(polyline(SQUARE, 1).replace('10\n10\n20\n0\n', '10\n10mm\n20\n0\n')))
    expect(drawing.edges.count).toBe(0)
    expect(finding(drawing, 'number-bad').message).toMatch(/^VERTEX, line \d+ of the file: "10mm"/)
  })

  it('with a default width in its head is asked about', () => {
    expect(
      codesOf(
        read(
          drawn(
            polyline(SQUARE, 1, {
              head: [
                [40, 2],
                [41, 2],
              ],
            }),
          ),
        ),
      ),
    ).toContain('polyline-width')
  })
})

describe('other entities', () => {
  it('are counted by kind, those that may be metal in a warning', () => {
    const drawing = read(drawn(line(0, 0, 1, 1) + entity('TEXT', [1, 'A']).repeat(3) + entity('REGION') + entity('SOMETHING')))
    expect(drawing.read).toEqual({ LINE: 1 })
    expect(drawing.ignored).toEqual({ TEXT: 3, REGION: 1, SOMETHING: 1 })
    expect(finding(drawing, 'entities-ignored').message).toContain('3 TEXT, 1 SOMETHING')
    expect(finding(drawing, 'entities-unread')).toMatchObject({ severity: 'warning', params: { list: '1 REGION' } })
  })

  it('a kind called __proto__ is a kind like others', () => {
    const drawing = read(drawn(line(0, 0, 1, 1) + groups([0, '__proto__'])))
    expect(Object.entries(drawing.ignored)).toEqual([['__proto__', 1]])
  })
})

it('entities at different heights are taken in plan with one note', () => {
  const drawing = read(drawn(circle(0, 0, 5, [30, 2]) + line(0, 0, 1, 0, [30, -1], [31, -1])))
  expect(finding(drawing, 'heights-differ').message).toContain('z from -1 to 2')
  expect(edgesOf(drawing).map(({ kind }) => kind)).toEqual([ARC, LINE])
})
