import type { Region } from '../../geometry/region'
import { eachTriangle } from './assemble'
import { type Factor, solve } from './cholesky'
import type { Unknowns } from './elements'
import type { Mesh } from './mesh'

/** What the warping function gives beside J. */
export interface Warping {
  /** shear centre after Trefftz (free of Poisson's ratio), region's coordinates */
  x: number
  y: number
  /** warping constant about the shear centre, mm⁶ */
  warping: number
  /** shear compliances ∫τᵢ·τⱼ dA for unit forces along x and y at ν = 0, mm⁻²: 1/shear area on the diagonal */
  shearXX: number
  shearYY: number
  shearXY: number
}

/** Moments of the metal and of the warping function about the mesh's origin. */
interface Integrals {
  area: number
  x: number
  y: number
  xx: number
  yy: number
  xy: number
  w: number
  wx: number
  wy: number
  ww: number
}

/**
 * Shear centre xs = (Ixy·Iωx − Iy·Iωy)/D, ys = (Ix·Iωx − Ixy·Iωy)/D about the centroid, D = IxIy − Ixy², and
 * Iw = ∫ω² − (∫ω)²/A − ys·Iωx + xs·Iωy (Trefftz, ZAMM 15 (1935); Gruttmann & Wagner, Comput. Mech. 27 (2001) 199–207).
 * Shear: ∇²Ψ = −(ax + by), (a, b) = [[Iy, Ixy], [Ixy, Ix]]⁻¹V, τ = ∇Ψ. `omega` and the factor leave unknown 0 out.
 */
export function warpingOf(region: Region, mesh: Mesh, { count, dof }: Unknowns, factor: Factor, omega: Float64Array): Warping {
  const total: Integrals = { area: 0, x: 0, y: 0, xx: 0, yy: 0, xy: 0, w: 0, wx: 0, wy: 0, ww: 0 }
  const loads = [new Float64Array(count), new Float64Array(count), new Float64Array(count)]
  eachTriangle(region, mesh, (t, { n, x, y, weight, shape }) => {
    for (let q = 0; q < n; q++) {
      let w = 0
      for (let i = 0; i < 6; i++) {
        const d = dof[6 * t + i]
        const value = shape[18 * q + 3 * i]
        w += d === 0 ? 0 : omega[d - 1] * value
        loads[0][d] += weight[q] * value
        loads[1][d] += weight[q] * value * x[q]
        loads[2][d] += weight[q] * value * y[q]
      }
      total.area += weight[q]
      total.x += weight[q] * x[q]
      total.y += weight[q] * y[q]
      total.xx += weight[q] * x[q] * x[q]
      total.yy += weight[q] * y[q] * y[q]
      total.xy += weight[q] * x[q] * y[q]
      total.w += weight[q] * w
      total.wx += weight[q] * w * x[q]
      total.wy += weight[q] * w * y[q]
      total.ww += weight[q] * w * w
    }
  })
  const { area } = total
  const [cx, cy] = [total.x / area, total.y / area]
  const [ix, iy, ixy] = [total.yy - area * cy * cy, total.xx - area * cx * cx, total.xy - area * cx * cy]
  // about the centroid the warping function is ω − cy·x + cx·y: the twist's centre moved there
  const wx = total.wx - cx * total.w - cy * iy + cx * ixy
  const wy = total.wy - cy * total.w - cy * ixy + cx * ix
  const d = ix * iy - ixy * ixy
  const [xs, ys] = [(ixy * wx - iy * wy) / d, (ix * wx - ixy * wy) / d]
  const [wMean, mx, my] = [total.w / area, total.wx - cx * total.w, total.wy - cy * total.w]
  const central = total.ww - area * wMean * wMean - 2 * (cy * mx - cx * my) + cy * cy * iy - 2 * cx * cy * ixy + cx * cx * ix
  const [left, right] = [
    [ix / d, -ixy / d],
    [-ixy / d, iy / d],
  ].map(([a, b]) => {
    const side = new Float64Array(count - 1)
    for (let i = 1; i < count; i++) side[i - 1] = a * (loads[1][i] - cx * loads[0][i]) + b * (loads[2][i] - cy * loads[0][i])
    return { side, psi: solve(factor, side) }
  })
  const energy = (side: Float64Array, psi: Float64Array) => side.reduce((sum, value, i) => sum + value * psi[i], 0)
  return {
    x: cx + xs,
    y: cy + ys,
    warping: central - ys * wx + xs * wy,
    shearXX: energy(left.side, left.psi),
    shearYY: energy(right.side, right.psi),
    shearXY: energy(left.side, right.psi),
  }
}
