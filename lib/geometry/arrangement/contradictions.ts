import type { Arrangement } from './arrange'
import { halvesOf, spokesOf } from './round'

/**
 * Vertices round which the sides of neighbouring sub-edges disagree under `full` (by set: inside or not). The rays and
 * the order round a vertex are found independently; where they contradict, edges run too close to tell what is inside.
 */
export function contradictions(a: Arrangement, full: boolean[]): number[] {
  const kept = Uint8Array.from({ length: a.count }, (_, u) => (a.countStart[u + 1] > a.countStart[u] ? 1 : 0))
  const left = (h: number) => full[h & 1 ? a.right[h >> 1] : a.left[h >> 1]]
  const found: number[] = []
  for (const [v, spokes] of spokesOf(a, halvesOf(kept))) {
    if (spokes.length < 3) {
      if (spokes.length === 2 && left(spokes[0].half) !== left(spokes[1].half ^ 1)) found.push(v)
      continue
    }
    const wrong = spokes.some(({ half }, n) => left(half) !== left(spokes[(n + 1) % spokes.length].half ^ 1))
    if (wrong) found.push(v)
  }
  return found
}
