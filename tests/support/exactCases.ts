import { pushArc, pushLine } from '@/lib/geometry/edges'
import type { Region } from '@/lib/geometry/region'
import { circle, ellipse, hole, outer, rectangle, regionOf, regionOfLoops, type Vertex } from './region'

const BULGE = Math.SQRT2 - 1

/** A rectangle from (0, 0) with corner radius r; clockwise for a hole. */
export function rounded(x: number, y: number, w: number, h: number, r: number): Vertex[] {
  return [
    [x + r, y],
    [x + w - r, y, BULGE],
    [x + w, y + r],
    [x + w, y + h - r, BULGE],
    [x + w - r, y + h],
    [x + r, y + h, BULGE],
    [x, y + h - r],
    [x, y + r, BULGE],
  ]
}

/** The loop walked the other way (bulges change sign and edge). */
export function backwards(loop: readonly Vertex[]): Vertex[] {
  const n = loop.length
  return loop.map((_, i): Vertex => {
    const [x, y] = loop[(n - i) % n]
    const bulge = loop[(2 * n - 1 - i) % n][2]
    return bulge ? [x, y, -bulge] : [x, y]
  })
}

const turned = (degrees: number, loop: readonly Vertex[]): Vertex[] => {
  const c = Math.cos((degrees * Math.PI) / 180)
  const s = Math.sin((degrees * Math.PI) / 180)
  return loop.map(([x, y, bulge]): Vertex => [x * c - y * s, x * s + y * c, bulge])
}

const sector = (r: number, from: number, to: number): Region =>
  regionOfLoops([
    {
      push: (t) => {
        const at = (a: number): [number, number] => [r * Math.cos(a), r * Math.sin(a)]
        pushLine(t, 0, 0, ...at(from), 0)
        pushArc(t, ...at(from), ...at(to), 0, 0, r, from, to - from, 0)
        pushLine(t, ...at(to), 0, 0, 0)
      },
    },
  ])

/** Shapes with exact figures, sharp corners unless said, corner or centre at (0, 0), mm. */
export const EXACT_SHAPES = {
  R1: regionOf(rectangle(0, 0, 60, 100)),
  R2: regionOf(rectangle(0, 0, 50, 100)),
  R3: regionOf(rectangle(0, 0, 100, 50)),
  R4: regionOf(turned(30, rectangle(0, 0, 50, 100))),
  O1: regionOfLoops([circle(0, 0, 50), circle(0, 0, 40, true)]),
  C1: regionOf([
    [-50, 0],
    [50, 0, 1],
  ]),
  C2: sector(50, 0, Math.PI / 2),
  E1: regionOfLoops([ellipse(0, 0, 40, 20)]),
  T1: regionOf([
    [0, 0],
    [100, 0],
    [50, 50 * Math.sqrt(3)],
  ]),
  T2: regionOf([
    [0, 0],
    [90, 0],
    [0, 60],
  ]),
  U: regionOf([
    [0, 0],
    [50, 0],
    [50, 5],
    [5, 5],
    [5, 95],
    [50, 95],
    [50, 100],
    [0, 100],
  ]),
  T: regionOf([
    [46, 0],
    [54, 0],
    [54, 88],
    [100, 88],
    [100, 100],
    [0, 100],
    [0, 88],
    [46, 88],
  ]),
  L: regionOf([
    [0, 0],
    [60, 0],
    [60, 10],
    [10, 10],
    [10, 80],
    [0, 80],
  ]),
  Z: regionOf([
    [-44, 0],
    [6, 0],
    [6, 94],
    [50, 94],
    [50, 100],
    [0, 100],
    [0, 6],
    [-44, 6],
  ]),
  I: regionOf([
    [0, 0],
    [100, 0],
    [100, 10],
    [53, 10],
    [53, 190],
    [100, 190],
    [100, 200],
    [0, 200],
    [0, 190],
    [47, 190],
    [47, 10],
    [0, 10],
  ]),
  B: regionOfLoops([outer(rounded(0, 0, 100, 60, 8)), hole(backwards(rounded(4, 4, 92, 52, 4)))]),
  K: sector(50, -Math.PI / 6, Math.PI / 6),
} satisfies Record<string, Region>

export type ExactShape = keyof typeof EXACT_SHAPES
