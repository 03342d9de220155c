import {
  type Edge,
  type EdgeTable,
  emptyTable,
  pushArc,
  pushBezier,
  pushEdge,
  pushEllipse,
  pushLine,
  reversed,
} from '@/lib/geometry/edges'
import type { Region } from '@/lib/geometry/region'

/** A vertex as DXF polylines have it: x, y and the bulge of the edge that starts there (tan of a quarter of its sweep). */
export type Vertex = readonly [x: number, y: number, bulge?: number]

/** The arc from (x0, y0) to (x1, y1) with a bulge, pushed as an ARC with its exact ends. */
export function pushBulge(table: EdgeTable, x0: number, y0: number, x1: number, y1: number, bulge: number): void {
  const sweep = 4 * Math.atan(bulge)
  const off = (1 - bulge * bulge) / (4 * bulge)
  const cx = 0.5 * (x0 + x1) - off * (y1 - y0)
  const cy = 0.5 * (y0 + y1) + off * (x1 - x0)
  const r = (Math.hypot(x1 - x0, y1 - y0) * (1 + bulge * bulge)) / (4 * Math.abs(bulge))
  pushArc(table, x0, y0, x1, y1, cx, cy, r, Math.atan2(y0 - cy, x0 - cx), sweep, 0)
}

export function pushLoop(table: EdgeTable, loop: readonly Vertex[]): void {
  loop.forEach(([x, y, bulge], i) => {
    const [nextX, nextY] = loop[(i + 1) % loop.length]
    if (bulge) pushBulge(table, x, y, nextX, nextY, bulge)
    else pushLine(table, x, y, nextX, nextY, 0)
  })
}

export interface LoopSpec {
  push: (table: EdgeTable) => void
  hole?: boolean
  piece?: number
}

/** A region from loops that are already turned the right way (outer counter-clockwise, holes clockwise). */
export function regionOfLoops(loops: readonly LoopSpec[]): Region {
  const edges = emptyTable()
  const loopStart = [0]
  for (const loop of loops) {
    loop.push(edges)
    loopStart.push(edges.count)
  }
  const piece = Uint32Array.from(loops, (loop) => loop.piece ?? 0)
  return {
    edges,
    loopStart: Uint32Array.from(loopStart),
    hole: Uint8Array.from(loops, (loop) => (loop.hole ? 1 : 0)),
    piece,
    pieces: Math.max(...piece) + 1,
  }
}

export const outer = (vertices: readonly Vertex[], piece = 0): LoopSpec => ({ push: (t) => pushLoop(t, vertices), piece })
export const hole = (vertices: readonly Vertex[], piece = 0): LoopSpec => ({ ...outer(vertices, piece), hole: true })

/** Region of one outer loop and holes, each as [x, y, bulge] vertices. */
export const regionOf = (vertices: readonly Vertex[], ...holes: readonly Vertex[][]): Region =>
  regionOfLoops([outer(vertices), ...holes.map((h) => hole(h))])

export const rectangle = (x: number, y: number, width: number, height: number): Vertex[] => [
  [x, y],
  [x + width, y],
  [x + width, y + height],
  [x, y + height],
]

/** A circle as one ARC edge; clockwise for a hole. */
export const circle = (cx: number, cy: number, r: number, clockwise = false): LoopSpec => ({
  push: (t) => pushArc(t, cx + r, cy, cx + r, cy, cx, cy, r, 0, clockwise ? -2 * Math.PI : 2 * Math.PI, 0),
  hole: clockwise,
})

/** An ellipse of half axes a, b turned by `turn` degrees, as one ELLIPSE edge; clockwise for a hole. */
export function ellipse(cx: number, cy: number, a: number, b: number, turn = 0, clockwise = false): LoopSpec {
  const c = Math.cos((turn * Math.PI) / 180)
  const s = Math.sin((turn * Math.PI) / 180)
  const sweep = clockwise ? -2 * Math.PI : 2 * Math.PI
  return {
    push: (t) => pushEllipse(t, cx + a * c, cy + a * s, cx + a * c, cy + a * s, cx, cy, a * c, a * s, -b * s, b * c, 0, sweep, 0),
    hole: clockwise,
  }
}

/** A closed chain of Bézier pieces, each as control points [x, y, weight]. */
export const beziers = (pieces: readonly (readonly (readonly [number, number, number])[])[], isHole = false): LoopSpec => ({
  push: (t) => {
    for (const piece of pieces)
      pushBezier(
        t,
        piece.length - 1,
        piece.some(([, , w]) => w !== 1),
        piece.flat(),
        0,
      )
  },
  hole: isHole,
})

/** Region of a random profile (support/profiles.ts): outlines by their nesting depth; every island is a piece of its own. */
export function regionOfProfile(profile: readonly { outline: Edge[]; depth: number }[]): Region {
  let pieces = 0
  return regionOfLoops(
    profile.map(({ outline, depth }) => {
      const solid = depth % 2 === 0
      const edges = solid ? outline : outline.map(reversed).reverse()
      return {
        push: (t: EdgeTable) => {
          for (const edge of edges) pushEdge(t, edge)
        },
        hole: !solid,
        piece: solid ? pieces++ : 0,
      }
    }),
  )
}
