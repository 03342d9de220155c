import { type EdgeTable, LINE } from '../edges'
import { jetAt, lengthOf, newJet } from '../evaluate'
import { nearestOn } from '../nearest'
import type { XY } from '../recipe'

/** What lies between two edges that run opposite to each other, with metal on the left of both. */
export type Between = 'void' | 'metal'

export interface Across {
  gap: number
  length: number
  at: XY
  /** what lies between and a little more on either side, so that nothing is left there once it is added or cut */
  patch: XY[]
}

const SAMPLES = [1 / 6, 0.5, 5 / 6]
const GOLDEN = (Math.sqrt(5) - 1) / 2
const NARROWINGS = 40
const HALVINGS = 40
/** sides of a patch along a curve */
const PIECES = 24

const jet = newJet()
const jetThere = newJet()

interface Facing {
  distance: number
  here: XY
  there: XY
  isFacing: boolean
}

/** From the point t of `edge`, what lies across on `other`. */
function look(edges: EdgeTable, edge: number, t: number, other: number, limit: number, between: Between): Facing {
  const { x, y, dx, dy } = jetAt(edges, edge, t, jet)
  const near = nearestOn(edges, other, x, y)
  const ends = { distance: near.distance, here: [x, y] as XY, there: [near.x, near.y] as XY }
  const isNear = near.distance < limit && near.t > 0 && near.t < 1
  if (!isNear) return { ...ends, isFacing: false }
  const left = dx * (near.y - y) - dy * (near.x - x)
  jetAt(edges, other, near.t, jetThere)
  const dot = dx * jetThere.dx + dy * jetThere.dy
  const isOpposite = dot < -0.9 * Math.hypot(dx, dy) * Math.hypot(jetThere.dx, jetThere.dy)
  return { ...ends, isFacing: isOpposite && (between === 'void' ? left < 0 : left > 0) }
}

/** How near two edges come to one another within the limit, and over what length of the shorter one; null where they do not. */
export function across(edges: EdgeTable, i: number, j: number, limit: number, between: Between): Across | null {
  const bothLines = edges.kind[i] === LINE && edges.kind[j] === LINE
  const e = edges.ends
  if (bothLines) {
    const dot =
      (e[4 * i + 2] - e[4 * i]) * (e[4 * j + 2] - e[4 * j]) + (e[4 * i + 3] - e[4 * i + 1]) * (e[4 * j + 3] - e[4 * j + 1])
    if (dot >= 0) return null
  }
  const lengths = [lengthOf(edges, i), lengthOf(edges, j)]
  const [edge, other] = lengths[0] <= lengths[1] ? [i, j] : [j, i]
  const length = Math.min(...lengths)
  const from = (t: number) => look(edges, edge, t, other, limit, between)
  const sampled = SAMPLES.map((t) => ({ t, ...from(t) }))
  const facing = sampled.filter(({ isFacing }) => isFacing)
  let best = (facing.length > 0 ? facing : sampled).reduce((a, b) => (b.distance < a.distance ? b : a))
  // between samples a curve comes no nearer than its length there allows
  if (!bothLines && best.distance - length / 3 < limit) {
    const t = nearestBetween(from, Math.max(0, best.t - 1 / 3), Math.min(1, best.t + 1 / 3))
    const closer = from(t)
    if (closer.isFacing && !(best.isFacing && best.distance <= closer.distance)) best = { t, ...closer }
  }
  if (!best.isFacing) return null
  const [first, last] = [reach(from, best.t, 0), reach(from, best.t, 1)]
  const reached = (last - first) * length
  const middle = from((first + last) / 2)
  return {
    gap: best.distance,
    length: reached,
    at: [(middle.here[0] + middle.there[0]) / 2, (middle.here[1] + middle.there[1]) / 2],
    patch: patchOf(from, first, last, Math.min(0.25, best.distance / reached), bothLines ? 1 : PIECES),
  }
}

function nearestBetween(from: (t: number) => Facing, low: number, high: number): number {
  let [a, b] = [low, high]
  let [c, d] = [b - GOLDEN * (b - a), a + GOLDEN * (b - a)]
  let [atC, atD] = [from(c).distance, from(d).distance]
  for (let n = 0; n < NARROWINGS; n++) {
    if (atC < atD) {
      b = d
      d = c
      atD = atC
      c = b - GOLDEN * (b - a)
      atC = from(c).distance
    } else {
      a = c
      c = d
      atC = atD
      d = a + GOLDEN * (b - a)
      atD = from(d).distance
    }
  }
  return (a + b) / 2
}

/** How far towards `end` the edges face one another, from t where they do. */
function reach(from: (t: number) => Facing, t: number, end: 0 | 1): number {
  let [inside, outside] = [t, end as number]
  for (let n = 0; n < HALVINGS; n++) {
    const middle = (inside + outside) / 2
    if (from(middle).isFacing) inside = middle
    else outside = middle
  }
  return inside
}

/**
 * Rows across from first to last: those at the ends as they are, so that nothing stands out at a mouth; those between
 * reach as much beyond the edges as these are apart.
 */
function patchOf(from: (t: number) => Facing, first: number, last: number, inset: number, pieces: number): XY[] {
  const near: XY[] = []
  const far: XY[] = []
  const row = (share: number, beyond: number) => {
    const { here, there } = from(first + (last - first) * share)
    const [dx, dy] = [beyond * (there[0] - here[0]), beyond * (there[1] - here[1])]
    near.push([here[0] - dx, here[1] - dy])
    far.unshift([there[0] + dx, there[1] + dy])
  }
  row(0, 0)
  for (let n = 0; n <= pieces; n++) row(inset + ((1 - 2 * inset) * n) / pieces, 1)
  row(1, 0)
  return [...near, ...far]
}
