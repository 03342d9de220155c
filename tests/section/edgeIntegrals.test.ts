import { describe, expect, test } from 'vitest'
import { emptyTable, pushArc, pushBezier, pushEllipse, pushLine } from '@/lib/geometry/edges'
import { edgeMoments } from '@/lib/section/edgeMoments'
import { frameAt } from '@/lib/section/frame'
import { newUnitSegment, unitSegment } from '@/lib/section/unitSegment'

const ORIGIN = frameAt(0, 0)

function arc(cx: number, cy: number, r: number, from: number, to: number): number[] {
  const table = emptyTable()
  const at = (a: number): [number, number] => [cx + r * Math.cos(a), cy + r * Math.sin(a)]
  pushArc(table, ...at(from), ...at(to), cx, cy, r, from, to - from, 0)
  const out = new Float64Array(6)
  edgeMoments(table, 0, ORIGIN, out)
  return Array.from(out)
}

// Green's theorem, each against quadrature with 30 digits (mpmath): A, ∫x, ∫y, ∫x², ∫y², ∫xy of the fan from the origin
describe('integrals along one edge', () => {
  test('line (3, 1) → (7, 4) gives A 2.5, ∫y² 8.75, ∫xy 16.875', () => {
    const table = emptyTable()
    pushLine(table, 3, 1, 7, 4, 0)
    const out = new Float64Array(6)
    edgeMoments(table, 0, ORIGIN, out)
    const wanted = [2.5, 25 / 3, 25 / 6, 32.91666666667, 8.75, 16.875]
    for (const [k, value] of wanted.entries()) expect(out[k]).toBeWithin(value, { relative: 1e-12 })
  })

  test.each([
    [
      'counter-clockwise 0.3 → 1.7 rad about (7, −3)',
      [7, -3, 5, 0.3, 1.7],
      [21.55117319069, 147.2496532761, 5.580998607338, 1151.195323874, 14.21718414569, 28.3448703119],
    ],
    [
      'clockwise 2 → −0.5 rad about (7, −3)',
      [7, -3, 5, 2, -0.5],
      [-45.84968140674, -338.5178902208, 51.10308172104, -2847.294781115, -180.5871907371, 474.2972604657],
    ],
    [
      'counter-clockwise 0.3 → 5.2 rad about (2, 1)',
      [2, 1, 5, 0.3, 5.2],
      [56.57217523266, 64.22516018468, 87.09291899606, 357.1783146517, 531.8582967229, 184.9598776945],
    ],
  ] as const)('arc %s agrees with quadrature to 12 digits', (_, [cx, cy, r, from, to], wanted) => {
    for (const [k, value] of arc(cx, cy, r, from, to).entries()) expect(value).toBeWithin(wanted[k], { relative: 3e-12 })
  })

  test('an arc split in two adds up to itself to 1e-13', () => {
    const whole = arc(7, -3, 5, 0.3, 1.7)
    const [first, second] = [arc(7, -3, 5, 0.3, 0.9), arc(7, -3, 5, 0.9, 1.7)]
    for (const [k, value] of whole.entries()) expect(first[k] + second[k]).toBeWithin(value, { relative: 1e-13 })
  })

  test('a quarter circle as a rational Bézier piece and as an ELLIPSE equals the ARC to 1e-13', () => {
    const table = emptyTable()
    const w = Math.SQRT1_2
    pushArc(table, 50, 10, 40, 20, 40, 10, 10, 0, Math.PI / 2, 0)
    pushEllipse(table, 50, 10, 40, 20, 40, 10, 10, 0, 0, 10, 0, Math.PI / 2, 0)
    pushBezier(table, 2, true, [50, 10, 1, 50, 20, w, 40, 20, 1], 0)
    const out = [0, 1, 2].map((i) => {
      const moments = new Float64Array(6)
      edgeMoments(table, i, frameAt(3, 4, 17), moments)
      return moments
    })
    for (let k = 0; k < 6; k++) {
      expect(out[1][k]).toBeWithin(out[0][k], { relative: 1e-13 })
      expect(out[2][k]).toBeWithin(out[0][k], { relative: 1e-13 })
    }
  })

  test('a cubic Bézier piece of a parabola y = x² on [0, 2] has the fan’s exact moments', () => {
    const table = emptyTable()
    // degree raised from the quadratic (0, 0), (1, 0), (2, 4)
    pushBezier(table, 3, false, [0, 0, 1, 2 / 3, 0, 1, 4 / 3, 4 / 3, 1, 2, 4, 1], 0)
    const out = new Float64Array(6)
    edgeMoments(table, 0, ORIGIN, out)
    // ½∫x² dx = 4/3, ∫x dA = ⅓∫x³ dx = 4/3, ∫y dA = ⅓∫x⁴ dx = 32/15, ∫x² = ¼∫x⁴ = 8/5, ∫y² = ¼∫x⁶ = 32/7, ∫xy = ¼∫x⁵ = 8/3
    const wanted = [4 / 3, 4 / 3, 32 / 15, 8 / 5, 32 / 7, 8 / 3]
    for (const [k, value] of wanted.entries()) expect(out[k]).toBeWithin(value, { relative: 1e-14 })
  })

  test('a unit segment of 1e-4 rad keeps 15 digits: area Δ³/12 − Δ⁵/240, ∫p Δ⁵/240 − Δ⁷·11/40320', () => {
    const segment = unitSegment(1e-4, newUnitSegment())
    expect(segment.area).toBeWithin(1e-12 / 12 - 1e-20 / 240, { relative: 4e-16 })
    expect(segment.p).toBeWithin(1e-20 / 240 - (1e-28 * 11) / 40320, { relative: 4e-16 })
  })

  test('series and closed form of the unit segment meet at 1 rad within 1e-13 of the area', () => {
    const below = { ...unitSegment(1 - 1e-14, newUnitSegment()) }
    const above = { ...unitSegment(1 + 1e-14, newUnitSegment()) }
    for (const key of ['area', 'p', 'pp', 'qq'] as const)
      expect(below[key]).toBeWithin(above[key], { absolute: 1e-13 * above.area })
  })
})
