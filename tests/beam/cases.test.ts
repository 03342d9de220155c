import { expect, test } from 'vitest'
import type { BeamLoad, Support } from '@/lib/beam/beam'
import { extremes, quantityAt } from '@/lib/beam/extremes'
import { solveBeam } from '@/lib/beam/solve'

// Beam tables: AISC Manual and Roark's Formulas for Stress and Strain (formulas from memory), each value
// recomputed by an independent integration. L = 4000, a = 1000, E = 200000 MPa, I = 1e7 mm⁴, q = 5 N/mm, P = 10000 N, M0 = 10 kNm.
const L = 4000
const a = 1000
const stiffness = { area: 3000, ix: 1e7, iy: 4e6, ixy: 0, elasticModulus: 200000 }
const down = (force: number) => ({ x: 0, y: -force })
const uniform = (from: number, to: number, q = 5): BeamLoad => ({ kind: 'distributed', from, to, start: down(q), end: down(q) })
const ramp = (from: number, to: number, q0: number, q1: number): BeamLoad => ({
  kind: 'distributed',
  from,
  to,
  start: down(q0),
  end: down(q1),
})
const point = (at: number, force = 10000): BeamLoad => ({ kind: 'point', at, force: down(force) })
// positive M0 of the tables: a clockwise push, −10 kNm in the sense of +slope
const couple = (at: number, moment = 10e6): BeamLoad => ({ kind: 'moment', at, moment: { x: 0, y: moment } })
const pinned = (at: number): Support => ({ at, kind: 'pinned' })
const roller = (at: number): Support => ({ at, kind: 'roller' })
const fixed = (at: number): Support => ({ at, kind: 'fixed' })

function solved(length: number, supports: Support[], loads: BeamLoad[]) {
  const [answer] = solveBeam({ stretches: [{ to: length, stiffness }], supports, hinges: [] }, [loads])
  if (!answer.ok) throw new Error(answer.fault.message)
  const { pieces, reactions } = answer.result
  return {
    r: (i: number) => reactions[i].force.y,
    m: (z: number, side?: 'left' | 'right') => quantityAt(pieces, 'moment', 'y', z, side) / 1e6,
    d: (z: number) => -quantityAt(pieces, 'deflection', 'y', z),
    slope: (z: number) => quantityAt(pieces, 'slope', 'y', z),
    most: () => extremes(pieces, 'deflection', 'y').least,
    rise: () => extremes(pieces, 'deflection', 'y').greatest,
    sag: () => extremes(pieces, 'moment', 'y').greatest.value / 1e6,
  }
}
const simple = [pinned(0), roller(L)]
const cantilever = [fixed(0)]
const propped = [fixed(0), roller(L)]
const built = [fixed(0), fixed(L)]

type Row = [number, string, number, Support[], BeamLoad[], (s: ReturnType<typeof solved>) => number[], number[]]
const rows: Row[] = [
  [
    1,
    'simple, uniform',
    L,
    simple,
    [uniform(0, L)],
    (s) => [s.r(0), s.m(2000), s.d(2000), -s.slope(0)],
    [10000, 10, 8.333333333333, 0.006666666666667],
  ],
  [2, 'simple, midspan point', L, simple, [point(2000)], (s) => [s.r(0), s.m(2000), s.d(2000)], [5000, 10, 6.666666666667]],
  [
    3,
    'simple, point at a',
    L,
    simple,
    [point(a)],
    (s) => [s.r(0), s.r(1), s.m(a), s.d(a), -s.most().value],
    [7500, 2500, 7.5, 3.75, 4.658474953],
  ],
  [
    4,
    'simple, two points',
    L,
    simple,
    [point(a), point(L - a)],
    (s) => [s.r(0), s.sag(), s.d(2000)],
    [10000, 10, 9.166666666667],
  ],
  [
    5,
    'simple, uniform on 0..a',
    L,
    simple,
    [uniform(0, a)],
    (s) => [s.r(0), s.r(1), s.sag(), s.d(a), s.d(2000)],
    [4375, 625, 1.9140625, 1.015625, 1.197916666667],
  ],
  [
    6,
    'simple, uniform over the middle',
    L,
    simple,
    [uniform(1000, 3000)],
    (s) => [s.r(0), s.m(2000), s.d(2000)],
    [5000, 7.5, 5.9375],
  ],
  [
    7,
    'simple, triangular',
    L,
    simple,
    [ramp(0, L, 0, 5)],
    (s) => [s.r(0), s.r(1), s.sag(), -s.most().value, s.most().at],
    [3333.333333333, 6666.666666667, 5.132002393, 4.174197908, 2077.318489],
  ],
  [
    8,
    'simple, triangular to midspan',
    L,
    simple,
    [ramp(0, 2000, 0, 5), ramp(2000, L, 5, 0)],
    (s) => [s.r(0), s.m(2000), s.d(2000)],
    [5000, 6.666666666667, 5.333333333333],
  ],
  [
    9,
    'simple, end moment',
    L,
    simple,
    [couple(0, -10e6)],
    (s) => [s.r(0), s.m(0), -s.most().value, s.most().at, s.d(2000)],
    [-2500, 10, 5.132002393, 1690.598923, 5],
  ],
  [
    10,
    'simple, moment at a',
    L,
    simple,
    [couple(a, -10e6)],
    (s) => [s.r(0), s.m(a, 'left'), s.m(a), s.d(a)],
    [-2500, -2.5, 7.5, 2.5],
  ],
  [11, 'simple, equal end moments', L, simple, [couple(0, -10e6), couple(L)], (s) => [s.m(2000), s.d(2000)], [10, 10]],
  [12, 'cantilever, uniform', L, cantilever, [uniform(0, L)], (s) => [s.r(0), s.m(0), s.d(L)], [20000, -40, 80]],
  [
    13,
    'cantilever, point at the end',
    L,
    cantilever,
    [point(L)],
    (s) => [s.r(0), s.m(0), s.d(L)],
    [10000, -40, 106.666666666667],
  ],
  [
    14,
    'cantilever, point at a',
    L,
    cantilever,
    [point(a)],
    (s) => [s.m(0), s.d(L), s.d(a)],
    [-10, 9.166666666667, 1.666666666667],
  ],
  [15, 'cantilever, uniform on 0..a', L, cantilever, [uniform(0, a)], (s) => [s.m(0), s.d(L)], [-2.5, 1.5625]],
  [
    16,
    'cantilever, triangular from the fixed end',
    L,
    cantilever,
    [ramp(0, L, 5, 0)],
    (s) => [s.r(0), s.m(0), s.d(L)],
    [10000, -13.333333333333, 21.333333333333],
  ],
  [
    17,
    'cantilever, triangular from the free end',
    L,
    cantilever,
    [ramp(0, L, 0, 5)],
    (s) => [s.m(0), s.d(L)],
    [-26.666666666667, 58.666666666667],
  ],
  [18, 'cantilever, hogging end moment', L, cantilever, [couple(L, -10e6)], (s) => [s.m(0), s.d(L)], [-10, 40]],
  [
    19,
    'propped, uniform',
    L,
    propped,
    [uniform(0, L)],
    (s) => [s.r(0), s.r(1), s.m(0), s.sag(), L - s.most().at, -s.most().value],
    [12500, 7500, -10, 5.625, 1686.140662, 3.466317828],
  ],
  [
    20,
    'propped, midspan point',
    L,
    propped,
    [point(2000)],
    (s) => [s.r(1), s.m(0), s.m(2000), s.d(2000), L - s.most().at, -s.most().value],
    [3125, -7.5, 6.25, 2.916666666667, 1788.854382, 2.98142397],
  ],
  [21, 'propped, point at a', L, propped, [point(a)], (s) => [s.r(1), s.m(0), s.d(a)], [859.375, -6.5625, 0.87890625]],
  [
    22,
    'propped, triangular from the fixed end',
    L,
    propped,
    [ramp(0, L, 5, 0)],
    (s) => [s.r(0), s.r(1), s.m(0), s.sag(), -s.most().value],
    [8000, 2000, -5.333333333333, 2.385139176, 1.526489073],
  ],
  [
    23,
    'propped, triangular from the propped end',
    L,
    propped,
    [ramp(0, L, 0, 5)],
    (s) => [s.r(0), s.r(1), s.m(0), s.d(2000)],
    [4500, 5500, -4.666666666667, 1.833333333333],
  ],
  [
    24,
    'propped, hogging moment at the prop',
    L,
    propped,
    [couple(L, -10e6)],
    (s) => [s.r(1), s.m(0), s.rise().value, L - s.rise().at],
    [3750, 5, 2.962962962963, 1333.333333333],
  ],
  [
    25,
    'built in, uniform',
    L,
    built,
    [uniform(0, L)],
    (s) => [s.r(0), s.m(0), s.m(2000), s.d(2000)],
    [10000, -6.666666666667, 3.333333333333, 1.666666666667],
  ],
  [26, 'built in, midspan point', L, built, [point(2000)], (s) => [s.m(0), s.m(2000), s.d(2000)], [-5, 5, 1.666666666667]],
  [
    27,
    'built in, point at a',
    L,
    built,
    [point(a)],
    (s) => [s.r(0), s.m(0), s.m(L), s.m(a), s.d(a), s.most().at, -s.most().value],
    [8437.5, -5.625, -1.875, 2.8125, 0.703125, 1600, 0.9],
  ],
  [
    28,
    'built in, triangular',
    L,
    built,
    [ramp(0, L, 0, 5)],
    (s) => [s.r(0), s.r(1), s.m(0), s.m(L), s.d(2000), s.most().at, -s.most().value],
    [3000, 7000, -2.666666666667, -4, 0.833333333333, 2098.780305, 0.8374642274],
  ],
  [
    29,
    'built in, uniform on 0..a',
    L,
    built,
    [uniform(0, a)],
    (s) => [s.m(0), s.m(L), s.r(0), s.d(2000)],
    [-1.744791666667, -0.3385416666667, 4726.5625, 0.15625],
  ],
  [
    30,
    'built in, moment at a',
    L,
    built,
    [couple(a, -10e6)],
    (s) => [s.r(0), s.m(0), s.m(L), s.d(a)],
    [-2812.5, -1.875, -3.125, 0.703125],
  ],
  [
    31,
    'overhang, uniform',
    5000,
    simple,
    [uniform(0, 5000)],
    (s) => [s.r(0), s.r(1), s.m(L), s.sag(), s.d(5000), s.d(2000)],
    [9375, 15625, -2.5, 8.7890625, -4.6875, 7.083333333333],
  ],
  [
    32,
    'overhang, point at the tip',
    5000,
    simple,
    [point(5000)],
    (s) => [s.r(0), s.r(1), s.m(L), s.d(5000), s.rise().value],
    [-2500, 12500, -10, 8.333333333333, 5.132002393],
  ],
  [
    33,
    'two spans, uniform',
    8000,
    [pinned(0), roller(L), roller(8000)],
    [uniform(0, 8000)],
    (s) => [s.r(0), s.r(1), s.m(L), s.sag(), -s.most().value],
    [7500, 25000, -10, 5.625, 3.466317828],
  ],
  [
    34,
    'two spans, uniform on one',
    8000,
    [pinned(0), roller(L), roller(8000)],
    [uniform(0, L)],
    (s) => [s.r(0), s.r(1), s.r(2), s.m(L), s.sag(), s.d(2000), s.most().at, -s.most().value],
    [8750, 12500, -1250, -5, 7.65625, 5.833333333333, 1889.752871, 5.856355888],
  ],
  [
    35,
    'three spans, uniform',
    12000,
    [0, 4000, 8000, 12000].map(roller),
    [uniform(0, 12000)],
    (s) => [s.r(0), s.r(1), s.m(L), s.sag(), s.m(6000), -s.most().value, s.d(6000)],
    [8000, 22000, -8, 6.4, 2, 4.405896499, 0.333333333333],
  ],
  [
    36,
    'four spans, uniform',
    16000,
    [0, 4000, 8000, 12000, 16000].map(roller),
    [uniform(0, 16000)],
    (s) => [s.r(0), s.r(1), s.r(2), s.m(L), s.m(8000), s.sag(), s.d(6000), -s.most().value],
    [7857.142857, 22857.14286, 18571.42857, -8.571428571, -5.714285714, 6.173469388, 1.19047619, 4.134640917],
  ],
]

test.each(rows)('beam table row %i: %s', (_row, _name, length, supports, loads, figures, wanted) => {
  const got = figures(solved(length, supports, loads))
  expect(got).toHaveLength(wanted.length)
  got.forEach((value, i) => {
    expect(value).toBeWithin(wanted[i], { relative: 1e-9 })
  })
})

// Unsymmetric L 80 × 60 × 10: deflection out of the plane of the load; values recomputed in principal axes.
test('an L under a vertical load of 1 N/mm over 2 m moves 1.9341 mm down and 1.6115 mm sideways', () => {
  const l = { area: 1300, ix: 807756.4102564103, iy: 387756.4102564102, ixy: -323076.9230769231, elasticModulus: 200000 }
  const [answer] = solveBeam({ stretches: [{ to: 2000, stiffness: l }], supports: [pinned(0), roller(2000)], hinges: [] }, [
    [uniform(0, 2000, 1)],
  ])
  if (!answer.ok) throw new Error(answer.fault.message)
  expect(quantityAt(answer.result.pieces, 'deflection', 'y', 1000)).toBeWithin(-1.934133683, { relative: 1e-9 })
  expect(quantityAt(answer.result.pieces, 'deflection', 'x', 1000)).toBeWithin(-1.611511616, { relative: 1e-9 })
})

test('shear adds qL²/(8GA_s) to the midspan deflection of a simple span (Timoshenko, from memory)', () => {
  const soft = { ...stiffness, shearModulus: 80000, shearCompliance: { xx: 1e-3, yy: 1 / 1500, xy: 0 } }
  const [answer] = solveBeam({ stretches: [{ to: L, stiffness: soft }], supports: simple, hinges: [] }, [[uniform(0, L)]])
  if (!answer.ok) throw new Error(answer.fault.message)
  const wanted = (5 * 5 * L ** 4) / (384 * 2e12) + (5 * L * L) / (8 * 80000 * 1500)
  expect(-quantityAt(answer.result.pieces, 'deflection', 'y', 2000)).toBeWithin(wanted, { relative: 1e-10 })
})

test('three hinges in one span are a mechanism, named with its place', () => {
  const [answer] = solveBeam(
    {
      stretches: [{ to: L, stiffness }],
      supports: [fixed(0), roller(L)],
      hinges: [
        { at: 1000, releases: 'both' },
        { at: 2000, releases: 'both' },
      ],
    },
    [[point(1500)]],
  )
  expect(answer.ok ? null : answer.fault.code).toBe('mechanism')
  expect(answer.ok ? '' : answer.fault.message).toMatch(/can move freely.* at (1000|2000) mm/)
})

test('a warmed member between two pinned ends is pressed by EAα·ΔT', () => {
  const warm = { ...stiffness, expansion: 12e-6 }
  const [answer] = solveBeam({ stretches: [{ to: L, stiffness: warm }], supports: [pinned(0), pinned(L)], hinges: [] }, [
    [{ kind: 'temperature', from: 0, to: L, gradient: { x: 0, y: 0.1 }, rise: 30 }],
  ])
  if (!answer.ok) throw new Error(answer.fault.message)
  expect(answer.result.pieces[0].axial[0]).toBeWithin(-200000 * 3000 * 12e-6 * 30, { relative: 1e-12 })
  // hotter above: it arches up by αgL²/8, without any moment
  expect(quantityAt(answer.result.pieces, 'deflection', 'y', 2000)).toBeWithin((12e-6 * 0.1 * L * L) / 8, { relative: 1e-10 })
  expect(quantityAt(answer.result.pieces, 'moment', 'y', 2000)).toBeWithin(0, { absolute: 1e-3 })
})
