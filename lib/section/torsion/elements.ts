import { jetAt, newJet } from '../../geometry/evaluate'
import type { Region } from '../../geometry/region'
import { gaussRule } from '../gauss'
import type { Mesh } from './mesh'

/** Second-order unknowns: one at each vertex, one at each side's middle. `dof` holds six a triangle: corners, then sides 01, 12, 20. */
export interface Unknowns {
  count: number
  dof: Uint32Array
  /** place of each unknown, for ordering */
  x: Float64Array
  y: Float64Array
}

export function unknownsOf({ x, y, corner }: Mesh): Unknowns {
  const vertex = new Int32Array(x.length).fill(-1)
  const side = new Map<number, number>()
  const place: number[] = []
  const dof = new Uint32Array(2 * corner.length)
  let count = 0
  const place2 = (px: number, py: number): number => {
    place.push(px, py)
    return count++
  }
  for (let t = 0; t < corner.length / 3; t++)
    for (let i = 0; i < 3; i++) {
      const a = corner[3 * t + i]
      const b = corner[3 * t + ((i + 1) % 3)]
      if (vertex[a] < 0) vertex[a] = place2(x[a], y[a])
      dof[6 * t + i] = vertex[a]
      const key = Math.min(a, b) * x.length + Math.max(a, b)
      let middle = side.get(key)
      if (middle === undefined) {
        middle = place2((x[a] + x[b]) / 2, (y[a] + y[b]) / 2)
        side.set(key, middle)
      }
      dof[6 * t + 3 + i] = middle
    }
  return {
    count,
    dof,
    x: Float64Array.from({ length: count }, (_, i) => place[2 * i]),
    y: Float64Array.from({ length: count }, (_, i) => place[2 * i + 1]),
  }
}

/** Quadrature of one triangle on the true domain: n points with place, weight, and the six shape functions' values and gradients. */
export interface Quadrature {
  n: number
  x: Float64Array
  y: Float64Array
  weight: Float64Array
  /** value, d/dx, d/dy of shape j at point q: [18 q + 3 j] */
  shape: Float64Array
}

/** Six points, exact to degree 4 (Dunavant, Int. J. Numer. Meth. Eng. 21 (1985) 1129–1148, from memory). */
const STRAIGHT = [
  [0.445948490915965, 0.223381589678011],
  [0.091576213509771, 0.109951743655322],
].flatMap(([a, w]) => [
  [a, a, 1 - 2 * a, w],
  [a, 1 - 2 * a, a, w],
  [1 - 2 * a, a, a, w],
])
const GAUSS = 5

const jet = newJet()

export const newQuadrature = (): Quadrature => ({
  n: 0,
  x: new Float64Array(GAUSS * GAUSS),
  y: new Float64Array(GAUSS * GAUSS),
  weight: new Float64Array(GAUSS * GAUSS),
  shape: new Float64Array(18 * GAUSS * GAUSS),
})

/**
 * Fills the quadrature of triangle t. A triangle with a curved side is the blended image of a flat one:
 * x = Σλᵢxᵢ + (λ₁ + λ₂)²·δ(s), s = λ₂/(λ₁ + λ₂), δ the true edge less its chord, so that the side lies on the edge
 * exactly and the map is smooth (after Gordon & Hall, Numer. Math. 21 (1973) 109–129, from memory).
 * Returns false where the map folds over.
 */
export function quadratureOf(region: Region, mesh: Mesh, t: number, out: Quadrature): boolean {
  const curved = curvedSide(mesh, t)
  return curved < 0 ? straight(mesh, t, out) : blended(region, mesh, t, curved, out)
}

function curvedSide({ piece, boundary }: Mesh, t: number): number {
  for (let i = 0; i < 3; i++) if (piece[3 * t + i] >= 0 && boundary.curved[piece[3 * t + i]]) return i
  return -1
}

function straight({ x, y, corner }: Mesh, t: number, out: Quadrature): boolean {
  const [a, b, c] = [corner[3 * t], corner[3 * t + 1], corner[3 * t + 2]]
  const [bx, by, cx, cy] = [x[b] - x[a], y[b] - y[a], x[c] - x[a], y[c] - y[a]]
  const twice = bx * cy - cx * by
  out.n = STRAIGHT.length
  STRAIGHT.forEach(([l0, l1, l2, w], q) => {
    out.x[q] = x[a] + l1 * bx + l2 * cx
    out.y[q] = y[a] + l1 * by + l2 * cy
    out.weight[q] = (w * twice) / 2
    shapes(out.shape, 18 * q, l0, l1, l2, 0, cy / twice, -by / twice, -cx / twice, bx / twice)
  })
  return twice > 0
}

/** Values and gradients of the six shape functions; d(λ₁, λ₂)/d(x, y) given, `from` turns which corner is first. */
function shapes(
  out: Float64Array,
  at: number,
  l0: number,
  l1: number,
  l2: number,
  from: number,
  l1x: number,
  l2x: number,
  l1y: number,
  l2y: number,
): void {
  const l = [l0, l1, l2]
  const dx = [-l1x - l2x, l1x, l2x]
  const dy = [-l1y - l2y, l1y, l2y]
  for (let i = 0; i < 3; i++) {
    const j = (i + 1) % 3
    const corner = at + 3 * ((i + from) % 3)
    const side = at + 9 + 3 * ((i + from) % 3)
    out[corner] = l[i] * (2 * l[i] - 1)
    out[corner + 1] = (4 * l[i] - 1) * dx[i]
    out[corner + 2] = (4 * l[i] - 1) * dy[i]
    out[side] = 4 * l[i] * l[j]
    out[side + 1] = 4 * (l[i] * dx[j] + l[j] * dx[i])
    out[side + 2] = 4 * (l[i] * dy[j] + l[j] * dy[i])
  }
}

function blended(region: Region, { x, y, corner, piece, boundary }: Mesh, t: number, side: number, out: Quadrature): boolean {
  // corners 0 and 1 are the ends of the curved side, 2 the one across
  const [a, b, c] = [0, 1, 2].map((i) => corner[3 * t + ((side + i) % 3)])
  const k = piece[3 * t + side]
  const { nodes, weights } = gaussRule(GAUSS)
  const [t0, t1, edge] = [boundary.t0[k], boundary.t1[k], boundary.edge[k]]
  let good = true
  let q = 0
  for (let i = 0; i < GAUSS; i++) {
    const s = nodes[i]
    jetAt(region.edges, edge, t0 + s * (t1 - t0), jet)
    const [ex, ey] = [jet.x - x[a] - s * (x[b] - x[a]), jet.y - y[a] - s * (y[b] - y[a])]
    const [fx, fy] = [jet.dx * (t1 - t0) - (x[b] - x[a]), jet.dy * (t1 - t0) - (y[b] - y[a])]
    for (let j = 0; j < GAUSS; j++) {
      // r from the corner across (0) to the side (1): λ0 = r(1 − s), λ1 = rs, λ2 = 1 − r
      const r = nodes[j]
      out.x[q] = r * ((1 - s) * x[a] + s * x[b]) + (1 - r) * x[c] + r * r * ex
      out.y[q] = r * ((1 - s) * y[a] + s * y[b]) + (1 - r) * y[c] + r * r * ey
      const [xr, yr] = [(1 - s) * x[a] + s * x[b] - x[c] + 2 * r * ex, (1 - s) * y[a] + s * y[b] - y[c] + 2 * r * ey]
      const [xs, ys] = [r * (x[b] - x[a]) + r * r * fx, r * (y[b] - y[a]) + r * r * fy]
      const jacobian = xr * ys - xs * yr
      if (!(jacobian > 0)) good = false
      out.weight[q] = weights[i] * weights[j] * jacobian
      // d(r, s)/d(x, y), then λ1 = rs, λ2 = 1 − r
      const [rx, ry, sx, sy] = [ys / jacobian, -xs / jacobian, -yr / jacobian, xr / jacobian]
      shapes(out.shape, 18 * q, r * (1 - s), r * s, 1 - r, side, s * rx + r * sx, -rx, s * ry + r * sy, -ry)
      q++
    }
  }
  out.n = q
  return good
}
