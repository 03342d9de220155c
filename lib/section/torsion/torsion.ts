import type { Region } from '../../geometry/region'
import { assemble, eachTriangle, tied } from './assemble'
import { factor, solve } from './cholesky'
import { dissect } from './dissection'
import { type Unknowns, unknownsOf } from './elements'
import { loopArea } from '../../geometry/edgeArea'
import { localRegion } from './localRegion'
import { type Mesh, meshOf, workpieceOf } from './mesh'
import { refine } from './refine'
import { type Warping, warpingOf } from './warping'

/** Torsion, shear and warping of one connected region; mm⁴, mm, mm⁶. */
export interface Torsion extends Warping {
  /** torsion constant: lower bound (stress function) and upper bound (warping function) over all meshes, rounded outwards */
  lower: number
  upper: number
  /** greatest change of each estimate from the mesh before to the last one; null with one mesh only */
  change: Record<keyof Warping, number> | null
  unknowns: number
  meshes: number
}

export interface TorsionOptions {
  /** wanted (upper − lower)/upper; 0.002 unless said */
  bracket?: number
  /** no mesh larger than this is made; 70,000 unless said */
  unknowns?: number
}

/**
 * Saint-Venant's torsion constant between two bounds. Prandtl's stress function (0 on the outer rim, a constant on each
 * hole) bounds J from below, the warping function from above (Pólya & Szegő, Isoperimetric Inequalities in Mathematical
 * Physics, 1951, from memory); both on the true domain, energies by quadrature. Their local difference says where to refine
 * (Prager & Synge, Q. Appl. Math. 5 (1947) 241–269, from memory). Shear centre, warping constant and shear compliances are
 * estimates: two meshes at least, with the change between the last two. The region must be one piece, in mm; null where no
 * mesh of it can be solved.
 */
export function torsionOf(region: Region, { bracket = 0.002, unknowns: cap = 70_000 }: TorsionOptions = {}): Torsion | null {
  const { local, size, origin } = localRegion(region)
  const work = workpieceOf(local, size)
  let best: Torsion | null = null
  for (let meshes = 1; meshes <= 16; meshes++) {
    // a second-order mesh has about four unknowns a vertex
    const mesh = meshOf(work, cap / 4)
    if (!mesh) return best
    const unknowns = unknownsOf(mesh)
    const solution = solveOn(local, mesh, unknowns)
    if (!solution) return best
    best = better(best, solution, origin, unknowns.count, meshes)
    const done = meshes > 1 && best.upper - best.lower <= bracket * best.upper
    if (done || unknowns.count * 2 > cap) return best
    refine(work, mesh, solution.error)
  }
  return best
}

function better(
  before: Torsion | null,
  { lower, upper, warping }: Solution,
  origin: { x: number; y: number },
  unknowns: number,
  meshes: number,
): Torsion {
  const rounding = 1e-12 * upper
  const now: Warping = { ...warping, x: warping.x + origin.x, y: warping.y + origin.y }
  const change = before && {
    x: Math.abs(now.x - before.x),
    y: Math.abs(now.y - before.y),
    warping: Math.abs(now.warping - before.warping),
    shearXX: Math.abs(now.shearXX - before.shearXX),
    shearYY: Math.abs(now.shearYY - before.shearYY),
    shearXY: Math.abs(now.shearXY - before.shearXY),
  }
  return {
    ...now,
    change,
    unknowns,
    meshes,
    lower: Math.max(before?.lower ?? 0, lower - rounding),
    upper: Math.min(before?.upper ?? Number.POSITIVE_INFINITY, upper + rounding),
  }
}

interface Solution {
  warping: Warping
  lower: number
  upper: number
  /** ∫|τφ − τω|² of each triangle */
  error: Float64Array
}

function solveOn(region: Region, mesh: Mesh, unknowns: Unknowns): Solution | null {
  // a piece too small or thin for its numbers has no element
  if (unknowns.count < 2) return null
  const { stiffness, area, twist } = assemble(region, mesh, unknowns)
  const { to, count, holes } = stressUnknowns(region, mesh, unknowns)
  const side = new Float64Array(count)
  to.forEach((k, i) => {
    if (k >= 0) side[k] += 2 * area[i]
  })
  for (const [loop, k] of holes)
    side[k] += 2 * Math.abs(loopArea(region.edges, region.loopStart[loop], region.loopStart[loop + 1]))
  const reduced = tied(stiffness, to, count)
  const [px, py] = [new Float64Array(count), new Float64Array(count)]
  to.forEach((k, i) => {
    if (k < 0) return
    px[k] = unknowns.x[i]
    py[k] = unknowns.y[i]
  })
  const stressFactor = factor(reduced, dissect(reduced, px, py, new Set(holes.values())))
  // the warping function is free up to a constant: one unknown is held
  const pinned = Int32Array.from({ length: unknowns.count }, (_, i) => i - 1)
  const free = tied(stiffness, pinned, unknowns.count - 1)
  const warpingFactor = factor(free, dissect(free, unknowns.x.subarray(1), unknowns.y.subarray(1), new Set()))
  if (!stressFactor || !warpingFactor) return null
  const phi = solve(stressFactor, side)
  const omega = solve(warpingFactor, twist.subarray(1))
  const both = bounds(region, mesh, unknowns, {
    phi: (i) => (to[i] < 0 ? 0 : phi[to[i]]),
    omega: (i) => (i === 0 ? 0 : omega[i - 1]),
    load: side.reduce((sum, value, k) => sum + value * phi[k], 0),
  })
  return { ...both, warping: warpingOf(region, mesh, unknowns, warpingFactor, omega) }
}

/**
 * Rim unknowns: held at 0 on the outer rim, tied to one unknown a hole. Holes that touch share theirs; one that touches the
 * outer rim encloses nothing and is held too.
 */
function stressUnknowns(
  region: Region,
  mesh: Mesh,
  { count, dof }: Unknowns,
): { to: Int32Array; count: number; holes: Map<number, number> } {
  const rim = rims(region, mesh, count, dof)
  const to = new Int32Array(count)
  const unknownOf = new Map<number, number>()
  let next = 0
  for (let i = 0; i < count; i++) if (rim.of[i] < 0) to[i] = next++
  for (let i = 0; i < count; i++) {
    if (rim.of[i] < 0) continue
    const loop = rim.root(rim.of[i])
    if (rim.isOuter(loop)) {
      to[i] = -1
      continue
    }
    const unknown = unknownOf.get(loop) ?? next++
    unknownOf.set(loop, unknown)
    to[i] = unknown
  }
  const holes = new Map<number, number>()
  region.hole.forEach((isHole, loop) => {
    const unknown = isHole ? unknownOf.get(rim.root(loop)) : undefined
    if (unknown !== undefined) holes.set(loop, unknown)
  })
  return { to, count: next, holes }
}

interface Rims {
  /** a loop that the unknown lies on, −1 inside the metal */
  of: Int32Array
  /** one loop for all that touch each other */
  root: (loop: number) => number
  isOuter: (root: number) => boolean
}

function rims(region: Region, { piece, boundary }: Mesh, count: number, dof: Uint32Array): Rims {
  const of = new Int32Array(count).fill(-1)
  const parent = Int32Array.from(region.hole, (_, loop) => loop)
  const root = (loop: number): number => {
    let at = loop
    while (parent[at] !== at) at = parent[at]
    return at
  }
  piece.forEach((k, at) => {
    if (k < 0) return
    const [t, i] = [Math.floor(at / 3), at % 3]
    for (const d of [dof[6 * t + i], dof[6 * t + ((i + 1) % 3)], dof[6 * t + 3 + i]]) {
      const loop = boundary.loop[k]
      if (of[d] >= 0) parent[root(of[d])] = root(loop)
      of[d] = loop
    }
  })
  const outer = new Set<number>()
  region.hole.forEach((isHole, loop) => {
    if (!isHole) outer.add(root(loop))
  })
  return { of, root, isOuter: (loop) => outer.has(loop) }
}

interface Fields {
  phi: (unknown: number) => number
  omega: (unknown: number) => number
  /** 2∫φ, holes filled */
  load: number
}

/** Both energies, and where they differ. */
function bounds(region: Region, mesh: Mesh, { dof }: Unknowns, { phi, omega, load }: Fields): Omit<Solution, 'warping'> {
  const count = mesh.corner.length / 3
  // ∫|τφ|², ∫|τω|² and ∫τφ·τω of each triangle: the stress function's best scale is known only at the end
  const [stress, strain, both] = [new Float64Array(count), new Float64Array(count), new Float64Array(count)]
  const [p, w] = [new Float64Array(6), new Float64Array(6)]
  eachTriangle(region, mesh, (t, { n, x, y, weight, shape }) => {
    for (let i = 0; i < 6; i++) {
      p[i] = phi(dof[6 * t + i])
      w[i] = omega(dof[6 * t + i])
    }
    for (let q = 0; q < n; q++) {
      let px = 0
      let py = 0
      let wx = -y[q]
      let wy = x[q]
      for (let i = 0; i < 6; i++) {
        const k = 18 * q + 3 * i
        px += p[i] * shape[k + 1]
        py += p[i] * shape[k + 2]
        wx += w[i] * shape[k + 1]
        wy += w[i] * shape[k + 2]
      }
      stress[t] += weight[q] * (px * px + py * py)
      strain[t] += weight[q] * (wx * wx + wy * wy)
      both[t] += weight[q] * (py * wx - px * wy)
    }
  })
  const total = (values: Float64Array) => values.reduce((sum, value) => sum + value, 0)
  const scale = load / total(stress)
  // the sum of the squares, and what rounding could take below zero
  const error = stress.map((s, t) => Math.max(0, scale * scale * s - 2 * scale * both[t] + strain[t]))
  return { lower: scale * load, upper: total(strain), error }
}
