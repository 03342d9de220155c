import { type EdgeTable, LINE } from './edges'
import type { OutlineSet } from './outlineSet'
import type { ArcRun } from './recipe'

/**
 * Chords of one outline whose ends lie on one circle: likely an arc that another program exploded. ΔA and ΔI are what
 * taking the arc would add to the outline's figures (drawing units, ΔI about the outline's centroid, to first order).
 */
export interface ArcOffer {
  outline: number
  run: ArcRun
  centre: { x: number; y: number }
  radius: number
  chords: number
  dArea: number
  dIx: number
  dIy: number
}

interface Circle {
  x: number
  y: number
  r: number
}

/** Circle through three points; null where they lie on a line. */
export function circleThrough(ax: number, ay: number, bx: number, by: number, cx: number, cy: number): Circle | null {
  const ux = bx - ax
  const uy = by - ay
  const vx = cx - ax
  const vy = cy - ay
  const det = 2 * (ux * vy - uy * vx)
  if (det === 0) return null
  const u2 = ux * ux + uy * uy
  const v2 = vx * vx + vy * vy
  const x = (vy * u2 - uy * v2) / det
  const y = (ux * v2 - vx * u2) / det
  return { x: ax + x, y: ay + y, r: Math.hypot(x, y) }
}

const FEWEST = 4
/** A chord that turns by more than this is a side of a polygon. */
const MOST_TURN = Math.PI / 8 + 1e-6

/** A run of lines in walking order: vertices first … last (last − first chords), on one circle. */
interface Run {
  first: number
  last: number
  circle: Circle
}

type Vertex = (n: number) => [number, number]

function circleOf(vertex: Vertex, first: number, last: number): Circle | null {
  const [ax, ay] = vertex(first)
  const [bx, by] = vertex(last)
  const third = Math.floor((last - first) / 3)
  if (ax === bx && ay === by) return circleThrough(ax, ay, ...vertex(first + third), ...vertex(last - third))
  return circleThrough(ax, ay, ...vertex((first + last) >> 1), bx, by)
}

/** Whether the vertices lie on the circle far closer than the chords do, turning one way in steps of like size. */
function fits(vertex: Vertex, first: number, last: number, circle: Circle, digit: number): boolean {
  let longest = 0
  let shortest = Number.POSITIVE_INFINITY
  let side = 0
  for (let n = first; n < last; n++) {
    const [ax, ay] = vertex(n)
    const [bx, by] = vertex(n + 1)
    const length = Math.hypot(bx - ax, by - ay)
    longest = Math.max(longest, length)
    // the first and the last chord of a run are often cut short
    if (n > first && n + 1 < last) shortest = Math.min(shortest, length)
    const turn = Math.sign((ax - circle.x) * (by - circle.y) - (ay - circle.y) * (bx - circle.x))
    if (side !== 0 && turn !== side) return false
    side = turn
  }
  if (longest > 2 * circle.r * Math.sin(MOST_TURN / 2) || shortest < 0.8 * longest) return false
  const sagitta = (longest * longest) / (8 * circle.r)
  const allowed = Math.max(0.002 * sagitta, 3 * digit)
  if (allowed > 0.25 * sagitta) return false
  for (let n = first; n <= last; n++) {
    const [x, y] = vertex(n)
    if (Math.abs(Math.hypot(x - circle.x, y - circle.y) - circle.r) > allowed) return false
  }
  return true
}

/** Runs among `chords` consecutive lines. A run grows by doubling steps back to single ones, refitted each time. */
function runsOf(vertex: Vertex, chords: number, digit: number): Run[] {
  const runs: Run[] = []
  for (let first = 0; first + FEWEST <= chords; ) {
    let last = first + FEWEST
    let circle = circleOf(vertex, first, last)
    if (!circle || !fits(vertex, first, last, circle, digit)) {
      first++
      continue
    }
    for (let step = FEWEST; step >= 1; ) {
      const next = last + step <= chords ? circleOf(vertex, first, last + step) : null
      if (next && fits(vertex, first, last + step, next, digit)) {
        last += step
        circle = next
        step *= 2
      } else step >>= 1
    }
    runs.push({ first, last, circle })
    first = last
  }
  return runs
}

/** Length of chord n, and by how much the walk turns from chord n to the next. */
function stepAt(vertex: Vertex, n: number): { length: number; turn: number } {
  const [[ax, ay], [bx, by], [cx, cy]] = [vertex(n), vertex(n + 1), vertex(n + 2)]
  const [ux, uy, vx, vy] = [bx - ax, by - ay, cx - bx, cy - by]
  return { length: Math.hypot(ux, uy), turn: Math.atan2(ux * vy - uy * vx, ux * vx + uy * vy) }
}

const alike = (a: number, b: number) => a * b > 0 && a / b > 0.7 && b / a > 0.7

/** Whether the chords go on beyond either end of a run much as within: then they follow a free curve, not an arc. */
function goesOn(vertex: Vertex, isLine: (n: number) => boolean, { first, last }: Run): boolean {
  const inside = stepAt(vertex, (first + last) >> 1)
  const before = stepAt(vertex, first - 1)
  const after = stepAt(vertex, last - 1)
  const beyond = stepAt(vertex, last).length
  return (
    (isLine(first - 1) && alike(before.length, inside.length) && alike(before.turn, inside.turn)) ||
    (isLine(last) && alike(beyond, inside.length) && alike(after.turn, inside.turn))
  )
}

function offer(outline: number, vertex: Vertex, { first, last, circle }: Run, [mx, my]: [number, number]): ArcOffer {
  let [dArea, dIx, dIy] = [0, 0, 0]
  for (let n = first; n < last; n++) {
    const [ax, ay] = vertex(n)
    const [bx, by] = vertex(n + 1)
    const angle = Math.atan2(
      (ax - circle.x) * (by - circle.y) - (ay - circle.y) * (bx - circle.x),
      (ax - circle.x) * (bx - circle.x) + (ay - circle.y) * (by - circle.y),
    )
    const sliver = 0.5 * circle.r ** 2 * (angle - Math.sin(angle))
    // the middle of the chord, pushed out to two fifths of the sliver's height: where its centroid lies, to first order
    const chord = Math.cos(angle / 2)
    const out = (chord + 0.4 * (1 - chord)) / chord
    const x = circle.x + out * ((ax + bx) / 2 - circle.x)
    const y = circle.y + out * ((ay + by) / 2 - circle.y)
    dArea += sliver
    dIx += sliver * (y - my) ** 2
    dIy += sliver * (x - mx) ** 2
  }
  return {
    outline,
    run: { from: vertex(first), through: vertex((first + last) >> 1), to: vertex(last) },
    centre: { x: circle.x, y: circle.y },
    radius: circle.r,
    chords: last - first,
    dArea,
    dIx,
    dIy,
  }
}

/** Centroid of the polygon of an outline's ends. */
function centroid(edges: EdgeTable, from: number, to: number): [number, number] {
  const e = edges.ends
  const [ox, oy] = [e[4 * from], e[4 * from + 1]]
  let [a, x, y] = [0, 0, 0]
  for (let i = from; i < to; i++) {
    const [px, py, qx, qy] = [e[4 * i] - ox, e[4 * i + 1] - oy, e[4 * i + 2] - ox, e[4 * i + 3] - oy]
    const cross = px * qy - py * qx
    a += cross
    x += (px + qx) * cross
    y += (py + qy) * cross
  }
  return a === 0 ? [ox, oy] : [ox + x / (3 * a), oy + y / (3 * a)]
}

/** All runs of at least four chords on one circle, outline by outline; a whole circle comes as two halves. */
export function chordRuns(set: Pick<OutlineSet, 'edges' | 'loopStart' | 'count' | 'area'>, lastDigit: number): ArcOffer[] {
  const { edges, loopStart } = set
  const offers: ArcOffer[] = []
  for (let k = 0; k < set.count; k++) {
    const from = loopStart[k]
    const size = loopStart[k + 1] - from
    if (size <= FEWEST) continue
    const turn = firstBreak(edges, from, size)
    const row = (n: number) => from + ((n + turn + size) % size)
    let middle: [number, number] | null = null
    for (let start = 0; start < size; ) {
      if (edges.kind[row(start)] !== LINE) {
        start++
        continue
      }
      let chords = 1
      while (start + chords < size && edges.kind[row(start + chords)] === LINE) chords++
      const first = start
      const vertex: Vertex = (n) => {
        const i = row(first + n)
        return [edges.ends[4 * i], edges.ends[4 * i + 1]]
      }
      for (const run of chords >= FEWEST ? runsOf(vertex, chords, lastDigit) : []) {
        const closed = isClosed(vertex, run)
        if (!closed && goesOn(vertex, (n) => edges.kind[row(first + n)] === LINE, run)) continue
        middle ??= centroid(edges, from, from + size)
        for (const part of closed ? halves(run) : [run]) offers.push(offer(k, vertex, part, middle))
      }
      start += chords
    }
  }
  return offers
}

function isClosed(vertex: Vertex, { first, last }: Run): boolean {
  const [a, b] = [vertex(first), vertex(last)]
  return a[0] === b[0] && a[1] === b[1]
}

/** A run that closes on itself has no ends of its own: two halves. */
function halves(run: Run): Run[] {
  const middle = (run.first + run.last) >> 1
  return [
    { ...run, last: middle },
    { ...run, first: middle },
  ]
}

/** Where to begin walking a loop, so that no run is cut: after a curve, else after the sharpest corner. */
function firstBreak(edges: EdgeTable, from: number, size: number): number {
  const e = edges.ends
  let best = 0
  let sharpest = -2
  for (let n = 0; n < size; n++) {
    const i = from + n
    const before = from + ((n + size - 1) % size)
    if (edges.kind[before] !== LINE) return n
    const [ux, uy] = [e[4 * before + 2] - e[4 * before], e[4 * before + 3] - e[4 * before + 1]]
    const [vx, vy] = [e[4 * i + 2] - e[4 * i], e[4 * i + 3] - e[4 * i + 1]]
    const bend = -(ux * vx + uy * vy) / (Math.hypot(ux, uy) * Math.hypot(vx, vy))
    if (bend > sharpest + 1e-9) {
      sharpest = bend
      best = n
    }
  }
  return best
}
