import { chordLength } from './chordLength'
import { insertPoint, newGrid, visitNear } from './endGrid'
import { jetAt, newJet } from './evaluate'
import { nearestOn } from './nearest'
import type { Loops } from './nest'

/** Whether ends and middles of loop a lie on loop b; both run the same way round, so each search starts at the last hit. */
function liesOn({ edges, loopStart }: Loops, a: number, b: number, tolerance: number): boolean {
  const jet = newJet()
  const close = (x: number, y: number, start: number): number => {
    const from = loopStart[b]
    const size = loopStart[b + 1] - from
    for (let n = 0; n < size; n++) {
      const i = from + ((start + n) % size)
      if (nearestOn(edges, i, x, y).distance <= tolerance) return (start + n) % size
    }
    return -1
  }
  let last = 0
  for (let i = loopStart[a]; i < loopStart[a + 1]; i++)
    for (const t of [0, 0.5]) {
      jetAt(edges, i, t, jet)
      last = close(jet.x, jet.y, last)
      if (last < 0) return false
    }
  return true
}

/** 1 for each loop that lies on an earlier one within the tolerance: same bounds, same area, boundary on boundary. */
export function coincidentLoops(loops: Loops, tolerance: number): Uint8Array {
  const doubled = new Uint8Array(loops.count)
  if (loops.count < 2) return doubled
  const { bounds, area, edges, loopStart } = loops
  const grid = newGrid(loops.count, Math.max(4 * tolerance, 1e-300), bounds[0], bounds[1])
  for (let k = 0; k < loops.count; k++) {
    const box = 4 * k
    const from = loopStart[k]
    const allowed = tolerance * (chordLength(edges, from, loopStart[k + 1]) + 4 * (bounds[box + 2] - bounds[box]))
    visitNear(grid, bounds[box], bounds[box + 1], tolerance, (other) => {
      if (doubled[k] || Math.abs(area[other] - area[k]) > allowed) return
      for (let c = 0; c < 4; c++) if (Math.abs(bounds[4 * other + c] - bounds[box + c]) > tolerance) return
      if (liesOn(loops, k, other, tolerance) && liesOn(loops, other, k, tolerance)) doubled[k] = 1
    })
    if (!doubled[k]) insertPoint(grid, k, bounds[box], bounds[box + 1])
  }
  return doubled
}
