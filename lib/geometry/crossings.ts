import { intersectEdges, type Meeting } from './arrangement/intersect'
import { visitBoxPairs } from './boxPairs'
import { ARC, edgeAt, type EdgeTable, ELLIPSE } from './edges'
import { jetAt, newJet } from './evaluate'
import { mayMeet, mayMeetAgain } from './mayMeet'
import { nearestOn } from './nearest'
import type { Loops } from './nest'

/** Pairs of boxes looked at and meetings worked out at most: some seconds of work, far past any drawing that is meant. */
const MOST_PAIRS = 200_000_000
const MOST_MEETINGS = 200_000

/** How two loops meet. */
export interface Contact {
  a: number
  b: number
  /** true: each has parts inside and outside the other; false: they only touch or share edges */
  crosses: boolean
  at: [number, number]
}

export interface Crossings {
  contacts: Contact[]
  /** loops that meet themselves, with the place */
  selfMeeting: { loop: number; at: [number, number] }[]
  /** 1 for each edge that meets another loop */
  touched: Uint8Array
  /** true where the search was given up */
  tooMany: boolean
}

/** Where edge `edge` of one loop meets edge `other` of another: parameters in [0, 1] on `edge`. */
interface EdgeContact {
  edge: number
  other: number
  from: number
  to: number
}

interface PairOfLoops {
  a: number
  b: number
  at: [number, number]
  onA: EdgeContact[]
  onB: EdgeContact[]
}

/** The parameter of a meeting as a fraction of the edge. */
function fraction(edges: EdgeTable, i: number, t: number): number {
  if (edges.kind[i] !== ARC && edges.kind[i] !== ELLIPSE) return t
  const k = edges.shape[i] + (edges.kind[i] === ARC ? 3 : 6)
  return (t - edges.shapes[k]) / edges.shapes[k + 1]
}

/** The joint that edges i and j of one loop share, if they follow one another. */
function joint(edges: EdgeTable, i: number, j: number, first: number, last: number): [number, number] | null {
  const e = edges.ends
  if (j === i + 1) return [e[4 * j], e[4 * j + 1]]
  return i === first && j === last - 1 ? [e[4 * i], e[4 * i + 1]] : null
}

/** Meetings of two edges of one loop other than at their shared joints. */
function meetsItself(edges: EdgeTable, i: number, j: number, first: number, last: number, tolerance: number): Meeting | null {
  const shared = joint(edges, i, j, first, last)
  if (shared) {
    if (!mayMeetAgain(edges, i, j, shared[0], shared[1], tolerance)) return null
  } else if (!mayMeet(edges, i, j, tolerance)) return null
  const joints = shared ? [shared] : []
  if (last - first === 2) joints.push([edges.ends[4 * i], edges.ends[4 * i + 1]], [edges.ends[4 * j], edges.ends[4 * j + 1]])
  const atJoint = ({ at, to }: Meeting) => !to && joints.some(([x, y]) => Math.hypot(at.x - x, at.y - y) <= 4 * tolerance)
  return intersectEdges(edgeAt(edges, i), edgeAt(edges, j), tolerance).find((meeting) => !atJoint(meeting)) ?? null
}

/**
 * Finds loops whose boundaries meet one another or themselves within `tolerance` (the snap), other than at the joints
 * of a loop. Boxes first, then quick tests, then the exact intersection, within limits on both.
 */
export function crossingsOf(
  loops: Loops,
  boxes: Float64Array,
  tolerance: number,
  inside: (loop: number, x: number, y: number) => boolean,
): Crossings {
  const { edges, loopStart } = loops
  const loopOf = new Uint32Array(edges.count)
  for (let k = 0; k < loops.count; k++) loopOf.fill(k, loopStart[k], loopStart[k + 1])
  const pairs = new Map<number, PairOfLoops>()
  const self = new Map<number, [number, number]>()
  let met = 0
  let looked = 0
  const touched = new Uint8Array(edges.count)
  let tooMany = false
  visitBoxPairs(boxes, edges.count, tolerance, (i, j) => {
    const a = loopOf[i]
    const b = loopOf[j]
    if (++looked > MOST_PAIRS || met > MOST_MEETINGS) {
      tooMany = true
      return false
    }
    if (a === b) {
      if (self.has(a)) return true
      const meeting = meetsItself(edges, i, j, loopStart[a], loopStart[a + 1], tolerance)
      if (meeting) self.set(a, [meeting.at.x, meeting.at.y])
      return true
    }
    if (!mayMeet(edges, i, j, tolerance)) return true
    for (const meeting of intersectEdges(edgeAt(edges, i), edgeAt(edges, j), tolerance)) {
      met++
      touched[i] = 1
      touched[j] = 1
      const key = a * loops.count + b
      let pair = pairs.get(key)
      if (!pair) {
        pair = { a, b, at: [meeting.at.x, meeting.at.y], onA: [], onB: [] }
        pairs.set(key, pair)
      }
      const end = meeting.to ?? meeting
      pair.onA.push({ edge: i, other: j, from: fraction(edges, i, meeting.te), to: fraction(edges, i, end.te) })
      pair.onB.push({ edge: j, other: i, from: fraction(edges, j, meeting.tf), to: fraction(edges, j, end.tf) })
    }
    return true
  })
  const contacts = [...pairs.values()].map((pair) => ({
    a: pair.a,
    b: pair.b,
    at: pair.at,
    crosses: sidesOf(edges, pair.a, pair.onB, tolerance, inside) === 3,
  }))
  return {
    contacts: contacts.sort((p, q) => p.a - q.a || p.b - q.b),
    selfMeeting: [...self].map(([loop, at]) => ({ loop, at })).sort((p, q) => p.loop - q.loop),
    touched,
    tooMany,
  }
}

/** On which sides of loop `other` the pieces of edges between their contacts lie: bit 1 inside, bit 2 outside. */
function sidesOf(
  edges: EdgeTable,
  other: number,
  contacts: EdgeContact[],
  tolerance: number,
  inside: (loop: number, x: number, y: number) => boolean,
): number {
  const sorted = contacts.toSorted((p, q) => p.edge - q.edge)
  const jet = newJet()
  let sides = 0
  for (let first = 0, last = 0; first < sorted.length; first = last) {
    const { edge } = sorted[first]
    while (last < sorted.length && sorted[last].edge === edge) last++
    const own = sorted.slice(first, last)
    const knots = [0, ...own.flatMap(({ from, to }) => [from, to]), 1].sort((p, q) => p - q)
    for (let n = 1; n < knots.length && sides !== 3; n++) {
      if (knots[n] - knots[n - 1] <= 1e-12) continue
      const { x, y } = jetAt(edges, edge, 0.5 * (knots[n] + knots[n - 1]), jet)
      if (own.some((contact) => nearestOn(edges, contact.other, x, y).distance <= 4 * tolerance)) continue
      sides |= inside(other, x, y) ? 1 : 2
    }
    if (sides === 3) return sides
  }
  return sides
}
