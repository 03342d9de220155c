import { splitPiece } from './boundary'
import type { Mesh, Workpiece } from './mesh'

/** Share of the whole difference of the bounds that the refined triangles make up. */
const SHARE = 0.8

/**
 * Splits the triangles that make most of the difference between the bounds: a vertex in the middle of each of
 * their sides, on the true edge where the side is a boundary piece.
 */
export function refine(work: Workpiece, mesh: Mesh, error: Float64Array): void {
  const order = Uint32Array.from(error, (_, t) => t).sort((a, b) => error[b] - error[a] || a - b)
  let total = 0
  for (const value of error) total += value
  const done = new Set<number>()
  const n = mesh.x.length
  let reached = 0
  for (const t of order) {
    if (reached > SHARE * total) break
    reached += error[t]
    for (let i = 0; i < 3; i++) {
      const [a, b] = [mesh.corner[3 * t + i], mesh.corner[3 * t + ((i + 1) % 3)]]
      const key = Math.min(a, b) * n + Math.max(a, b)
      if (done.has(key)) continue
      done.add(key)
      if (Math.hypot(mesh.x[a] - mesh.x[b], mesh.y[a] - mesh.y[b]) < 2 * work.floor) continue
      const k = mesh.piece[3 * t + i]
      if (k >= 0) splitPiece(work.region, work.boundary, work.points, k)
      else {
        work.points.x.push((mesh.x[a] + mesh.x[b]) / 2)
        work.points.y.push((mesh.y[a] + mesh.y[b]) / 2)
      }
    }
  }
}
