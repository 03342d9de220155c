import { jetAt, newJet } from './evaluate'
import type { Loops } from './nest'

/**
 * A point on each loop by which a recipe names it (x y each): the middle of the edge with the longest chord, of like ones
 * the lowest in x, then y, whatever the order of drawing; of loops that meet others, on an edge of theirs alone.
 */
export function namesOf({ edges, loopStart, count }: Loops, touched: Uint8Array): Float64Array {
  const at = new Float64Array(2 * count)
  const jet = newJet()
  const e = edges.ends
  for (let k = 0; k < count; k++) {
    let best = -1
    let score = -1
    for (let i = loopStart[k]; i < loopStart[k + 1]; i++) {
      const chord = Math.sqrt((e[4 * i + 2] - e[4 * i]) ** 2 + (e[4 * i + 3] - e[4 * i + 1]) ** 2)
      const own = touched[i] ? -1 : chord
      if (best >= 0 && own < score * (1 - 1e-9)) continue
      // off the middle where the edge meets others, for the middle is where circles are often tangent
      jetAt(edges, i, touched[i] ? 0.4142 : 0.5, jet)
      const like = best >= 0 && own <= score * (1 + 1e-9)
      if (like && (jet.x > at[2 * k] || (jet.x === at[2 * k] && jet.y >= at[2 * k + 1]))) continue
      best = i
      score = own
      at[2 * k] = jet.x
      at[2 * k + 1] = jet.y
    }
  }
  return at
}
