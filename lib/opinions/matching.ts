import type { Curve } from './curves'

/** The curves of `theirs` that have no partner in `ours`, and the other way round; either sense counts as the same. */
export function unmatched(ours: Curve[], theirs: Curve[], tolerance: number): { ours: Curve[]; theirs: Curve[] } {
  const cell = 4 * tolerance
  const cells = new Map<string, Curve[]>()
  for (const curve of ours) {
    const key = `${Math.floor(curve[2] / cell)} ${Math.floor(curve[3] / cell)}`
    const there = cells.get(key)
    if (there) there.push(curve)
    else cells.set(key, [curve])
  }
  const left = theirs.filter((curve) => !take(cells, curve, cell, tolerance))
  return { ours: [...cells.values()].flat(), theirs: left }
}

function take(cells: Map<string, Curve[]>, curve: Curve, cell: number, tolerance: number): boolean {
  const column = Math.floor(curve[2] / cell)
  const row = Math.floor(curve[3] / cell)
  for (let i = column - 1; i <= column + 1; i++) {
    for (let j = row - 1; j <= row + 1; j++) {
      const there = cells.get(`${i} ${j}`)
      const at = there?.findIndex((other) => isSame(other, curve, tolerance)) ?? -1
      if (there && at >= 0) {
        there.splice(at, 1)
        return true
      }
    }
  }
  return false
}

function isSame(p: Curve, q: Curve, tolerance: number): boolean {
  const near = (i: number, j: number) => Math.hypot(p[i] - q[j], p[i + 1] - q[j + 1]) <= tolerance
  return near(2, 2) && ((near(0, 0) && near(4, 4)) || (near(0, 4) && near(4, 0)))
}
