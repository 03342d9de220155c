import type { EdgeTable } from './edges'
import { jetAt, newJet } from './evaluate'
import { insideLoop } from './inside'
import { nearestOn } from './nearest'

/**
 * A point inside a counter-clockwise loop (edges from … to − 1), well off its boundary: from the middle of its longest
 * chord inwards, half as far until the point lies inside and no other edge is much nearer. Null for loops without inside.
 */
export function interiorPoint(edges: EdgeTable, from: number, to: number): [number, number] | null {
  const e = edges.ends
  const length = (i: number) => Math.hypot(e[4 * i + 2] - e[4 * i], e[4 * i + 3] - e[4 * i + 1])
  let longest = from
  let size = 0
  for (let i = from; i < to; i++) {
    if (length(i) > length(longest)) longest = i
    size = Math.max(size, Math.abs(e[4 * i] - e[4 * from]), Math.abs(e[4 * i + 1] - e[4 * from + 1]))
  }
  const jet = jetAt(edges, longest, 0.5, newJet())
  const { x, y } = jet
  const speed = Math.hypot(jet.dx, jet.dy)
  if (speed === 0) return null
  for (let step = Math.max(size, speed) / 2; step > 1e-12 * (Math.abs(x) + Math.abs(y) + size); step /= 2) {
    const px = x - (step * jet.dy) / speed
    const py = y + (step * jet.dx) / speed
    if (!insideLoop(edges, from, to, px, py)) continue
    let near = step
    for (let i = from; i < to && near >= 0.3 * step; i++) near = Math.min(near, nearestOn(edges, i, px, py).distance)
    if (near >= 0.3 * step) return [px, py]
  }
  return null
}
