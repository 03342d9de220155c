import type { Arrangement } from './arrange'
import { startVertex } from './loops'
import { aroundVertex, type Spoke } from './order'

/** Both half-edges of each sub-edge kept. */
export function halvesOf(kept: Uint8Array): number[] {
  const halves: number[] = []
  kept.forEach((is, u) => {
    if (is) halves.push(2 * u, 2 * u + 1)
  })
  return halves
}

/** The half-edges that leave each vertex, counter-clockwise. */
export function spokesOf(a: Arrangement, halves: number[]): Map<number, Spoke[]> {
  const spokes = new Map<number, Spoke[]>()
  for (const h of halves) {
    const v = startVertex(a, h)
    const own = spokes.get(v)
    if (own) own.push({ half: h, out: true })
    else spokes.set(v, [{ half: h, out: true }])
  }
  for (const [v, own] of spokes) if (own.length > 2) aroundVertex(a, v, own)
  return spokes
}

/** For each half-edge the next one round the face on its left: the first way out clockwise from where it came. */
export function nextRound(a: Arrangement, kept: Uint8Array): Int32Array {
  const next = new Int32Array(2 * a.count).fill(-1)
  for (const own of spokesOf(a, halvesOf(kept)).values()) {
    own.forEach(({ half }, n) => {
      next[half ^ 1] = own[(n + own.length - 1) % own.length].half
    })
  }
  return next
}
