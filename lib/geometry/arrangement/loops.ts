import { ARC, type EdgeTable, ELLIPSE, emptyTable } from '../edges'
import { loopArea } from '../edgeArea'
import type { Arrangement } from './arrange'
import { endOf, startOf } from './curve'
import { aroundVertex, type Spoke } from './order'
import { pushStretch } from './split'

/** Closed loops, metal on the left: area > 0 for outer loops, < 0 for holes. */
export interface Loops {
  edges: EdgeTable
  loopStart: number[]
  area: number[]
}

export const noLoops = (edges?: number, shapes?: number): Loops => ({
  edges: emptyTable(edges, shapes),
  loopStart: [0],
  area: [],
})

/**
 * Joins the sub-edges that `side` keeps (1: metal on its left, −1: on its right, 0: not kept) into loops
 * and appends them to `to`. At a vertex with several ways on, the sharpest left turn; a loop that comes
 * to a vertex twice is split there. Pieces of one edge that follow each other are one edge again, except
 * across a vertex where loops touch. Returns the vertices where ways in and out did not match (a fault).
 */
export function joinLoops(a: Arrangement, side: (u: number) => number, to: Loops): number[] {
  const halves: number[] = []
  for (let u = 0; u < a.count; u++) {
    const s = side(u)
    if (s !== 0) halves.push(s > 0 ? 2 * u : 2 * u + 1)
  }
  const { next, degree, faults } = follow(a, halves)
  traceLoops(a, halves, next, degree, to)
  return faults
}

/**
 * Walks the half-edges along `next` and appends the closed ways, split at each vertex met twice. Edges are joined
 * again across vertices of degree 1.
 */
export function traceLoops(a: Arrangement, halves: number[], next: Int32Array, degree: Uint16Array, to: Loops): void {
  const done = new Uint8Array(2 * a.count)
  const placeOf = new Int32Array(a.vertices).fill(-1)
  for (const first of halves) {
    if (done[first]) continue
    const path: number[] = []
    for (let h = first; h >= 0 && !done[h]; h = next[h]) {
      done[h] = 1
      placeOf[startVertex(a, h)] = path.length
      path.push(h)
      const end = endVertex(a, h)
      if (placeOf[end] < 0) continue
      const loop = path.splice(placeOf[end])
      for (const g of loop) placeOf[startVertex(a, g)] = -1
      emit(a, loop, degree, to)
    }
    for (const g of path) placeOf[startVertex(a, g)] = -1
  }
}

/** The vertex half-edge h leaves: 2u runs along sub-edge u, 2u + 1 against it. */
export const startVertex = (a: Arrangement, h: number) => (h & 1 ? a.to[h >> 1] : a.from[h >> 1])
const endVertex = (a: Arrangement, h: number) => (h & 1 ? a.from[h >> 1] : a.to[h >> 1])

/** For each kept half-edge the one that follows it round the same side. */
function follow(a: Arrangement, halves: number[]) {
  const next = new Int32Array(2 * a.count).fill(-1)
  const degree = new Uint16Array(a.vertices)
  const into = new Uint16Array(a.vertices)
  const firstOut = new Int32Array(a.vertices).fill(-1)
  for (const h of halves) {
    degree[startVertex(a, h)]++
    into[endVertex(a, h)]++
    firstOut[startVertex(a, h)] = h
  }
  const busy = new Map<number, Spoke[]>()
  const faults: number[] = []
  const spokesAt = (v: number): Spoke[] => {
    const spokes = busy.get(v) ?? []
    if (spokes.length === 0) busy.set(v, spokes)
    return spokes
  }
  for (const h of halves) {
    const start = startVertex(a, h)
    if (degree[start] > 1 || into[start] > 1) spokesAt(start).push({ half: h, out: true })
    const v = endVertex(a, h)
    if (degree[v] > 1 || into[v] > 1) spokesAt(v).push({ half: h, out: false })
    else if (degree[v] === 1) next[h] = firstOut[v]
    else faults.push(v)
  }
  for (const [v, spokes] of busy) {
    aroundVertex(a, v, spokes)
    if (!pair(spokes, next)) faults.push(v)
  }
  return { next, degree, faults }
}

/**
 * Each way in goes on by the first way out met clockwise from it, which bounds the wedge on its left.
 * Paired like brackets, so that a tie in the order cannot make loops cross.
 */
function pair(spokes: Spoke[], next: Int32Array): boolean {
  const waiting: number[] = []
  const taken = new Set<Spoke>()
  for (let n = 2 * spokes.length - 1; n >= 0; n--) {
    const s = spokes[n % spokes.length]
    if (taken.has(s)) continue
    if (!s.out) {
      if (n >= spokes.length) waiting.push(s.half)
      continue
    }
    const into = waiting.pop()
    if (into === undefined) continue
    next[into] = s.half
    taken.add(s)
  }
  return waiting.length === 0 && 2 * taken.size === spokes.length
}

/** A stretch of one edge in a loop, from half-edge `first` to half-edge `last`. */
interface Run {
  first: number
  last: number
  ta: number
  tb: number
  /** turns added to the edge's own parameter after its seam, rad */
  shift: number
}

/** Appends one simple loop, pieces of one edge joined. */
function emit(a: Arrangement, loop: number[], degree: Uint16Array, to: Loops): void {
  const free = (h: number) => degree[startVertex(a, h)] === 1
  const begin = Math.max(
    0,
    loop.findIndex((h, i) => !free(h) || !runsOn(a, loop[(i + loop.length - 1) % loop.length], h)),
  )
  const runs: Run[] = []
  for (let i = 0; i < loop.length; i++) {
    const h = loop[(begin + i) % loop.length]
    const run = runs[runs.length - 1]
    if (run && free(h) && runsOn(a, run.last, h)) {
      run.last = h
      run.tb = tEnd(a, h) + run.shift
    } else if (run && free(h) && overSeam(a, run.last, h)) {
      run.shift += tEnd(a, run.last) - tStart(a, h)
      run.last = h
      run.tb = tEnd(a, h) + run.shift
    } else runs.push({ first: h, last: h, ta: tStart(a, h), tb: tEnd(a, h), shift: 0 })
  }
  const [head, tail] = [runs[0], runs[runs.length - 1]]
  if (runs.length > 1 && free(head.first) && overSeam(a, tail.last, head.first)) {
    runs.pop()
    runs[0] = { first: tail.first, last: head.last, ta: tail.ta, tb: tail.tb + (head.tb - head.ta), shift: 0 }
  }
  for (const { first, last, ta, tb } of runs) {
    const [v, w] = [startVertex(a, first), endVertex(a, last)]
    pushStretch(to.edges, a.edges, a.row[first >> 1], ta, tb, a.x[v], a.y[v], a.x[w], a.y[w])
  }
  to.area.push(loopArea(to.edges, to.loopStart[to.loopStart.length - 1], to.edges.count))
  to.loopStart.push(to.edges.count)
}

const tStart = (a: Arrangement, h: number) => (h & 1 ? a.t1[h >> 1] : a.t0[h >> 1])
const tEnd = (a: Arrangement, h: number) => (h & 1 ? a.t0[h >> 1] : a.t1[h >> 1])
const sense = (a: Arrangement, h: number) => Math.sign(tEnd(a, h) - tStart(a, h))

function runsOn(a: Arrangement, before: number, h: number): boolean {
  return a.row[before >> 1] === a.row[h >> 1] && tEnd(a, before) === tStart(a, h) && sense(a, before) === sense(a, h)
}

/** Whether h goes on where a full circle or ellipse closes on itself. */
function overSeam(a: Arrangement, before: number, h: number): boolean {
  const row = a.row[h >> 1]
  if (a.row[before >> 1] !== row || sense(a, before) !== sense(a, h)) return false
  if (a.edges.kind[row] !== ARC && a.edges.kind[row] !== ELLIPSE) return false
  const [start, end] = [startOf(a.edges, row), endOf(a.edges, row)]
  if (Math.abs(Math.abs(end - start) - 2 * Math.PI) > 1e-12) return false
  return (tEnd(a, before) === end && tStart(a, h) === start) || (tEnd(a, before) === start && tStart(a, h) === end)
}
