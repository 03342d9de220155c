/**
 * Moments of the segment between a unit arc of sweep Δ (rad, signed) and its chord, about the middle of the chord:
 * p along the bisector away from the centre, q along the chord (counter-clockwise).
 * area ∫dA, p ∫p dA, pp ∫p² dA, qq ∫q² dA; ∫q dA = ∫pq dA = 0. All change sign with Δ. Reused, never kept.
 */
export interface UnitSegment {
  area: number
  p: number
  pp: number
  qq: number
}
export const newUnitSegment = (): UnitSegment => ({ area: 0, p: 0, pp: 0, qq: 0 })

/** Taylor coefficients in Δ²: area from Δ³, p and qq from Δ⁵, pp from Δ⁷ (the closed forms below, expanded). */
const AREA = [
  0.08333333333333333, -0.004166666666666667, 9.92063492063492e-5, -1.3778659611992946e-6, 1.252605419272086e-8,
  -8.029521918410807e-11, 3.823581865909908e-13, -1.4057286271727603e-15, 4.110317623312165e-18,
]
const P = [
  0.004166666666666667, -0.0002728174603174603, 8.783895502645502e-6, -1.8045346821388488e-7, 2.604262519084568e-9,
  -2.7905053084477068e-11, 2.308346429567645e-13, -1.518650973811846e-15, 8.13563156081638e-18,
]
const PP = [
  0.00029761904761904765, -2.48015873015873e-5, 1.0146103896103896e-6, -2.697919364586031e-8, 5.196247755771566e-10,
  -7.666843932600235e-12, 8.975700594026774e-14, -8.550635032953106e-16, 6.7599174859399176e-18,
]
const QQ = [
  0.004166666666666667, -0.000496031746031746, 2.8935185185185186e-5, -1.064714606381273e-6, 2.7380669741780854e-8,
  -5.219189246967025e-10, 7.676684032990444e-12, -8.978988848125425e-14, 8.551515815300959e-16,
]

function series(coefficients: number[], square: number): number {
  let sum = 0
  for (let k = coefficients.length - 1; k >= 0; k--) sum = sum * square + coefficients[k]
  return sum
}

/**
 * Closed forms about the centre (area (Δ − sin Δ)/2, ∫u ⅔s³, ∫u² (Δ − ½ sin 2Δ)/8, ∫v² (3Δ − 4 sin Δ + ½ sin 2Δ)/24
 * with s = sin Δ/2; derived by hand, checked against quadrature of 30 digits), moved to the chord.
 * For |Δ| < 1 they cancel, so their series is summed.
 */
export function unitSegment(sweep: number, out: UnitSegment): UnitSegment {
  const square = sweep * sweep
  if (square < 1) {
    const cube = square * sweep
    out.area = cube * series(AREA, square)
    out.p = cube * square * series(P, square)
    out.pp = cube * square * square * series(PP, square)
    out.qq = cube * square * series(QQ, square)
    return out
  }
  const s = Math.sin(0.5 * sweep)
  const c = Math.cos(0.5 * sweep)
  const sin = 2 * s * c
  const halfSin2 = sin * (1 - 2 * s * s)
  const u = (2 / 3) * s * s * s
  out.area = 0.5 * (sweep - sin)
  out.p = u - c * out.area
  out.pp = 0.125 * (sweep - halfSin2) - c * (2 * u - c * out.area)
  out.qq = (3 * sweep - 4 * sin + halfSin2) / 24
  return out
}
