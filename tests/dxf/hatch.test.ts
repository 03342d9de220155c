import { describe, expect, it } from 'vitest'
import { ARC, BEZIER, ELLIPSE, LINE } from '@/lib/geometry/edges'
import { codesOf, drawn, edgesOf, endsOf, entity, finding, fixture, line, read, select } from '../support/dxf'

type Groups = [number, number][]
const HEAD: Groups = [
  [10, 0],
  [20, 0],
  [30, 0],
  [70, 1],
  [71, 0],
]
const hatch = (...groups: Groups) => entity('HATCH', ...HEAD, ...groups, [75, 0], [76, 1], [98, 1], [10, 5], [20, 5])
const edgePath = (...edges: Groups[]): Groups => [[91, 1], [92, 1], [93, edges.length], ...edges.flat(), [97, 0]]

describe('HATCH boundaries', () => {
  it('a polyline path with bulges closes on itself', () => {
    const drawing = read(
      drawn(hatch([91, 1], [92, 3], [72, 1], [73, 1], [93, 2], [10, 0], [20, 0], [42, 1], [10, 10], [20, 0], [42, 1], [97, 0])),
    )
    expect(edgesOf(drawing)).toMatchObject([
      { kind: ARC, radius: 5, b: { x: 10, y: 0 } },
      { kind: ARC, radius: 5, b: { x: 0, y: 0 } },
    ])
    expect(drawing.read).toEqual({ HATCH: 1 })
    expect(select(drawing).edges).toHaveLength(0)
    expect(codesOf(drawing)).toContain('only-hatches')
  })

  it('edges of all four kinds, clockwise arcs with their mirrored angles', () => {
    const drawing = read(
      drawn(
        hatch(
          ...edgePath(
            [
              [72, 1],
              [10, 0],
              [20, 0],
              [11, 10],
              [21, 0],
            ],
            [
              [72, 2],
              [10, 0],
              [20, 0],
              [40, 10],
              [50, 270],
              [51, 360],
              [73, 0],
            ],
            [
              [72, 3],
              [10, 0],
              [20, 0],
              [11, 4],
              [21, 0],
              [40, 0.5],
              [50, 0],
              [51, 90],
              [73, 1],
            ],
            [
              [72, 4],
              [94, 1],
              [73, 0],
              [74, 0],
              [95, 4],
              [96, 2],
              [40, 0],
              [40, 0],
              [40, 1],
              [40, 1],
              [10, 0],
              [20, 0],
              [10, 3],
              [20, 4],
              [97, 0],
            ],
            [
              [72, 4],
              [94, 2],
              [73, 1],
              [74, 0],
              [95, 6],
              [96, 3],
              ...[0, 0, 0, 1, 1, 1].map((k): [number, number] => [40, k]),
              [10, 1],
              [20, 0],
              [42, 1],
              [10, 1],
              [20, 1],
              [42, Math.SQRT1_2],
              [10, 0],
              [20, 1],
              [42, 1],
            ],
          ),
        ),
      ),
    )
    const [straight, clockwise, elliptical, degreeOne, rational] = edgesOf(drawing)
    expect(straight).toMatchObject({ kind: LINE, b: { x: 10, y: 0 } })
    expect(clockwise).toMatchObject({ kind: ARC, a: { x: 0, y: 10 }, b: { x: 10, y: 0 }, sweep: -Math.PI / 2 })
    expect(elliptical).toMatchObject({ kind: ELLIPSE, a: { x: 4, y: 0 }, sweep: Math.PI / 2, v: { x: 0, y: 2 } })
    expect(degreeOne).toMatchObject({ kind: LINE, b: { x: 3, y: 4 } })
    expect(rational).toMatchObject({ kind: BEZIER, weights: [1, Math.SQRT1_2, 1] })
    expect(endsOf(drawing)).toHaveLength(5)
  })

  it.each<[string, Groups, RegExp]>([
    [
      'a missing coordinate',
      edgePath([
        [72, 1],
        [10, 0],
        [20, 0],
        [11, 10],
      ]),
      /group 21 .* is missing/,
    ],
    ['an unknown edge', edgePath([[72, 7]]), /an edge of kind 7/],
    ['a million paths that are not there', [[91, 1000000]], /group 92 .* is missing/],
    [
      'a billion edges',
      [
        [91, 1],
        [92, 1],
        [93, 1e9],
      ],
      /says 1000000000 parts/,
    ],
    [
      'a radius of 0',
      edgePath([
        [72, 2],
        [10, 0],
        [20, 0],
        [40, 0],
        [50, 0],
        [51, 90],
        [73, 1],
      ]),
      /radius 0/,
    ],
  ])('%s is a fault only where hatches are taken', (_, groups, says) => {
    const drawing = read(drawn(line(0, 0, 1, 1) + hatch(...groups)))
    expect(codesOf(drawing)).toContain('faults-left-out')
    expect(codesOf(drawing)).not.toContain('hatch-bad')
    const taken = select(drawing, { hatches: true }).findings.find(({ code }) => code === 'hatch-bad')
    expect(taken?.severity).toBe('error')
    expect(taken?.message).toMatch(says)
  })

  it('of p21 is closed and given on request', () => {
    const drawing = read(fixture('cases', 'p21.dxf'))
    const more = select(drawing, { hatches: true }).edges.length - select(drawing).edges.length
    expect(more).toBe(drawing.edges.count - 30)
    expect(finding(drawing, 'hatches-left-out').message).toContain('1 hatch left out')
  })
})
