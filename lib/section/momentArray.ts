/** Places of the six moments in a Moments array: ∫dA, ∫u dA, ∫v dA, ∫u² dA, ∫v² dA, ∫uv dA. */
export const AREA = 0
export const U = 1
export const V = 2
export const UU = 3
export const VV = 4
export const UV = 5

/**
 * Moments of the triangle between the frame's origin and the line (u0, v0) → (u0 + du, v0 + dv): ∫f dA = 1/(k + 2)·∮f(u dv − v du)
 * for f homogeneous of degree k. Source: Green's theorem; closed forms as in any text on polygon moments.
 */
export function lineMoments(u0: number, v0: number, du: number, dv: number, out: Float64Array): void {
  const c = u0 * dv - v0 * du
  const u1 = u0 + du
  const v1 = v0 + dv
  out[AREA] = c / 2
  out[U] = (c * (u0 + u1)) / 6
  out[V] = (c * (v0 + v1)) / 6
  out[UU] = (c * (u0 * u0 + u0 * u1 + u1 * u1)) / 12
  out[VV] = (c * (v0 * v0 + v0 * v1 + v1 * v1)) / 12
  out[UV] = (c * (u0 * (2 * v0 + v1) + u1 * (v0 + 2 * v1))) / 24
}

/** Adds a segment with moments about its own chord's middle (k, l): area a, (p, q) first, (pp, qq, pq) second moments. */
export function addShifted(
  out: Float64Array,
  k: number,
  l: number,
  a: number,
  p: number,
  q: number,
  pp: number,
  qq: number,
  pq: number,
): void {
  out[AREA] += a
  out[U] += p + k * a
  out[V] += q + l * a
  out[UU] += pp + k * (2 * p + k * a)
  out[VV] += qq + l * (2 * q + l * a)
  out[UV] += pq + k * q + l * p + k * l * a
}
