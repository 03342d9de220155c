/** Control points in homogeneous coordinates, wx wy w of each. */
export type Homogeneous = Float64Array

/**
 * The Bézier piece of a B-spline on its knot span [knots[span], knots[span + 1]], exact up to rounding: control point
 * j is the blossom with degree − j arguments at the span's start and j at its end, by de Boor's scheme
 * d_i ← (1 − α) d_{i−1} + α d_i, α = (u − u_i)/(u_{i+p+1−r} − u_i). Only the span's own knots enter, so unclamped
 * knots and knots of any multiplicity need no special case.
 */
export function bezierPiece(degree: number, knots: ArrayLike<number>, control: Homogeneous, span: number): Homogeneous {
  const piece = new Float64Array(3 * (degree + 1))
  const d = new Float64Array(3 * (degree + 1))
  const from = knots[span]
  const to = knots[span + 1]
  for (let j = 0; j <= degree; j++) {
    d.set(control.subarray(3 * (span - degree), 3 * (span + 1)))
    for (let r = 1; r <= degree; r++) {
      const u = r <= degree - j ? from : to
      for (let k = degree; k >= r; k--) {
        const i = span - degree + k
        const alpha = (u - knots[i]) / (knots[i + degree + 1 - r] - knots[i])
        for (let c = 0; c < 3; c++) {
          const low = d[3 * (k - 1) + c]
          const high = d[3 * k + c]
          d[3 * k + c] = alpha === 1 ? high : alpha === 0 ? low : (1 - alpha) * low + alpha * high
        }
      }
    }
    piece.set(d.subarray(3 * degree), 3 * j)
  }
  return piece
}

/** The Bézier pieces of a B-spline on its domain [u_p, u_(n+1)], one a knot span that is not empty. */
export function* bezierPieces(degree: number, knots: ArrayLike<number>, control: Homogeneous): Generator<Homogeneous> {
  for (let span = degree; span < control.length / 3; span++) {
    if (knots[span] < knots[span + 1]) yield bezierPiece(degree, knots, control, span)
  }
}

/** Both halves of a Bézier piece, cut at t, by de Casteljau's scheme. */
export function cutBezier(piece: Homogeneous, t: number): [Homogeneous, Homogeneous] {
  const degree = piece.length / 3 - 1
  const d = piece.slice()
  const first = new Float64Array(piece.length)
  const second = new Float64Array(piece.length)
  for (let r = 0; r <= degree; r++) {
    first.set(d.subarray(0, 3), 3 * r)
    second.set(d.subarray(3 * (degree - r), 3 * (degree - r) + 3), 3 * (degree - r))
    for (let k = 0; k < 3 * (degree - r); k++) d[k] = (1 - t) * d[k] + t * d[k + 3]
  }
  return [first, second]
}

/** Cuts a rational piece in halves until no weight is more than twice another. */
export function evenWeights(piece: Homogeneous): Homogeneous[] {
  let low = Number.POSITIVE_INFINITY
  let high = 0
  for (let k = 2; k < piece.length; k += 3) {
    low = Math.min(low, piece[k])
    high = Math.max(high, piece[k])
  }
  if (high <= 2 * low) return [piece]
  return cutBezier(piece, 0.5).flatMap(evenWeights)
}
