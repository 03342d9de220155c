import {
  ARC,
  BEZIER,
  type Edge,
  edgeAt,
  type EdgeTable,
  ELLIPSE,
  emptyTable,
  LINE,
  type Point,
  pushEdge,
  reversed,
} from '@/lib/geometry/edges'
import { splitEdge } from '@/lib/geometry/splitEdge'

/** Random closed profiles of lines, arcs, elliptical arcs and Bézier pieces, from a seeded generator in [0, 1). */
export type Random = () => number

const between = (random: Random, low: number, high: number) => low + (high - low) * random()
const pick = <T>(random: Random, list: readonly T[]): T => list[Math.min(list.length - 1, Math.floor(random() * list.length))]

export const EDGE_KINDS = ['line', 'arc', 'ellipse', 'quadratic', 'cubic', 'rational'] as const
export type ProfileKind = (typeof EDGE_KINDS)[number]

/** An arc from a to b that bulges to the right of its chord by `rise` × half the chord (negative: to the left). */
export function arcBetween(a: Point, b: Point, rise: number, source = 0): Edge {
  const half = Math.hypot(b.x - a.x, b.y - a.y) / 2
  const sweep = 4 * Math.atan(rise)
  const radius = (half * (1 + rise * rise)) / (2 * Math.abs(rise))
  const off = (half * (1 - rise * rise)) / (2 * rise)
  const centre = {
    x: (a.x + b.x) / 2 - ((b.y - a.y) / (2 * half)) * off,
    y: (a.y + b.y) / 2 + ((b.x - a.x) / (2 * half)) * off,
  }
  return { kind: ARC, a, b, source, centre, radius, start: Math.atan2(a.y - centre.y, a.x - centre.x), sweep }
}

/** An elliptical arc from a to b: the arc of `arcBetween` stretched across its chord and sheared along it. */
export function ellipseBetween(a: Point, b: Point, rise: number, stretch: number, lean: number, source = 0): Edge {
  const arc = arcBetween(a, b, rise, source)
  if (arc.kind !== ARC) return arc
  const length = Math.hypot(b.x - a.x, b.y - a.y)
  const e = { x: (b.x - a.x) / length, y: (b.y - a.y) / length }
  const linear = (x: number, y: number): Point => {
    const across = e.x * y - e.y * x
    const along = e.x * x + e.y * y + lean * across
    return { x: along * e.x - stretch * across * e.y, y: along * e.y + stretch * across * e.x }
  }
  const c = linear(arc.centre.x - a.x, arc.centre.y - a.y)
  const { radius: r, start, sweep } = arc
  return { kind: ELLIPSE, a, b, source, centre: { x: a.x + c.x, y: a.y + c.y }, u: linear(r, 0), v: linear(0, r), start, sweep }
}

function bezierBetween(a: Point, b: Point, rise: number, degree: 2 | 3, weights: number[] | null, source: number): Edge {
  const n = { x: b.y - a.y, y: a.x - b.x }
  const inner = degree === 2 ? [0.5] : [0.3, 0.7]
  const control = inner.map((t) => ({
    x: a.x + t * (b.x - a.x) + 0.5 * rise * n.x,
    y: a.y + t * (b.y - a.y) + 0.5 * rise * n.y,
  }))
  return { kind: BEZIER, a, b, source, control: [a, ...control, b], weights }
}

function edgeBetween(random: Random, kind: ProfileKind, a: Point, b: Point, rise: number): Edge {
  switch (kind) {
    case 'line':
      return { kind: LINE, a, b, source: 0 }
    case 'arc':
      return arcBetween(a, b, rise)
    case 'ellipse':
      return ellipseBetween(a, b, rise, between(random, 0.5, 1.5), between(random, -0.3, 0.3))
    case 'quadratic':
      return bezierBetween(a, b, rise, 2, null, 0)
    case 'cubic':
      return bezierBetween(a, b, rise, 3, null, 0)
    case 'rational':
      return bezierBetween(a, b, rise, 2, [1, between(random, 0.5, 1.8), 1], 0)
  }
}

/**
 * A closed counter-clockwise outline round `centre` that does not cross itself: corners in rising angle at radii within
 * 0.7 to 1 of `size`, edges of random kinds that bulge by at most a tenth of their chord.
 */
export function randomOutline(random: Random, centre: Point, size: number, kinds: readonly ProfileKind[] = EDGE_KINDS): Edge[] {
  const corners = 5 + Math.floor(random() * 7)
  const points = Array.from({ length: corners }, (_, n) => {
    const angle = (2 * Math.PI * (n + between(random, -0.2, 0.2))) / corners
    const radius = size * between(random, 0.7, 1)
    return { x: centre.x + radius * Math.cos(angle), y: centre.y + radius * Math.sin(angle) }
  })
  return points.map((a, n) => {
    const rise = between(random, 0.02, 0.1) * (random() < 0.5 ? -1 : 1)
    return edgeBetween(random, pick(random, kinds), a, points[(n + 1) % corners], rise)
  })
}

/** A random profile: an outer outline, up to three holes in it, an island in some. Outlines with their nesting depth. */
export function randomProfile(
  random: Random,
  size = 50,
  kinds: readonly ProfileKind[] = EDGE_KINDS,
): { outline: Edge[]; depth: number }[] {
  const centre = { x: between(random, -size, size), y: between(random, -size, size) }
  const profile = [{ outline: randomOutline(random, centre, size, kinds), depth: 0 }]
  const turn = between(random, 0, 2 * Math.PI)
  const holes = Math.floor(random() * 4)
  for (let h = 0; h < holes; h++) {
    const angle = turn + (2 * Math.PI * h) / 3
    const at = { x: centre.x + 0.32 * size * Math.cos(angle), y: centre.y + 0.32 * size * Math.sin(angle) }
    profile.push({ outline: randomOutline(random, at, 0.2 * size, kinds), depth: 1 })
    if (random() < 0.5) profile.push({ outline: randomOutline(random, at, 0.08 * size, kinds), depth: 2 })
  }
  return profile
}

/** Cuts random edges in two or more, the same curve. */
export function splitRandomly(random: Random, edges: Edge[]): Edge[] {
  return edges.flatMap((edge) => {
    if (random() < 0.6) return [edge]
    const [first, second] = splitEdge(edge, between(random, 0.2, 0.8))
    return random() < 0.5 ? [first, second] : [first, ...splitEdge(second, between(random, 0.2, 0.8))]
  })
}

/** The edges in random order and sense, each an entity of its own. */
export function shuffled(random: Random, edges: Edge[]): Edge[] {
  const list = edges.map((edge) => (random() < 0.5 ? reversed(edge) : edge))
  for (let i = list.length - 1; i > 0; i--) {
    const j = Math.floor(random() * (i + 1))
    ;[list[i], list[j]] = [list[j], list[i]]
  }
  return list
}

/** Edges as a table, numbered by `source` in order. */
export function tableOf(edges: Edge[]): EdgeTable {
  const table = emptyTable(edges.length)
  for (const [source, edge] of edges.entries()) pushEdge(table, { ...edge, source })
  return table
}

/** Every row of a table. */
export const allRows = (table: EdgeTable): Uint32Array => new Uint32Array(table.count).map((_, i) => i)

/** The edges of a table as objects. */
export const edgesOf = (table: EdgeTable): Edge[] => Array.from({ length: table.count }, (_, i) => edgeAt(table, i))
