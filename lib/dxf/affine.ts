/** x' = a x + c y + e, y' = b x + d y + f. */
export interface Affine {
  a: number
  b: number
  c: number
  d: number
  e: number
  f: number
}

export const IDENTITY: Affine = { a: 1, b: 0, c: 0, d: 1, e: 0, f: 0 }

/** First `inner`, then `outer`. */
export function after(outer: Affine, inner: Affine): Affine {
  return {
    a: outer.a * inner.a + outer.c * inner.b,
    b: outer.b * inner.a + outer.d * inner.b,
    c: outer.a * inner.c + outer.c * inner.d,
    d: outer.b * inner.c + outer.d * inner.d,
    e: outer.a * inner.e + outer.c * inner.f + outer.e,
    f: outer.b * inner.e + outer.d * inner.f + outer.f,
  }
}

const SAME_SCALE = 1e-12

/** The scale (> 0) where circles stay circles, else 0. */
export function similarityScale({ a, b, c, d }: Affine): number {
  const first = Math.hypot(a, b)
  const second = Math.hypot(c, d)
  const larger = Math.max(first, second)
  const even = Math.abs(first - second) <= SAME_SCALE * larger && Math.abs(a * c + b * d) <= SAME_SCALE * larger * larger
  return even ? first : 0
}

/** Cosine of an angle in degrees, exact at multiples of 90. */
export const cosDegrees = (degrees: number): number => sinDegrees(degrees + 90)

/** Sine of an angle in degrees, exact at multiples of 90. */
export function sinDegrees(degrees: number): number {
  const turn = ((degrees % 360) + 360) % 360
  if (turn % 180 === 0) return 0
  if (turn === 90) return 1
  if (turn === 270) return -1
  return Math.sin((turn * Math.PI) / 180)
}
