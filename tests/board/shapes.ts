import { type EdgeTable, emptyTable, pushArc, pushLine } from '@/lib/geometry/edges'
import type { Region } from '@/lib/geometry/region'

function polygon(edges: EdgeTable, corners: [number, number][]): void {
  corners.forEach(([x, y], k) => {
    const [nextX, nextY] = corners[(k + 1) % corners.length]
    pushLine(edges, x, y, nextX, nextY, 0)
  })
}

/** A plate 60 × 40 from (10, 20) with a round hole of radius 8 at (30, 40). */
export function plateWithHole(): Region {
  const edges = emptyTable()
  polygon(edges, [
    [10, 20],
    [70, 20],
    [70, 60],
    [10, 60],
  ])
  pushArc(edges, 38, 40, 38, 40, 30, 40, 8, 0, -2 * Math.PI, 0)
  return {
    edges,
    loopStart: Uint32Array.from([0, 4, 5]),
    hole: Uint8Array.from([0, 1]),
    piece: Uint32Array.from([0, 0]),
    pieces: 1,
  }
}

/** A Z of three plates, 4 mm thick: unsymmetric, so that its principal axes turn. */
export function zShape(): Region {
  const edges = emptyTable()
  polygon(edges, [
    [0, 0],
    [40, 0],
    [40, 4],
    [4, 4],
    [4, 60],
    [-36, 60],
    [-36, 56],
    [0, 56],
  ])
  return { edges, loopStart: Uint32Array.from([0, 8]), hole: Uint8Array.from([0]), piece: Uint32Array.from([0]), pieces: 1 }
}

/** A rectangle with its corner at the origin. */
export function rectangle(width: number, height: number): Region {
  const edges = emptyTable()
  polygon(edges, [
    [0, 0],
    [width, 0],
    [width, height],
    [0, height],
  ])
  return { edges, loopStart: Uint32Array.from([0, 4]), hole: Uint8Array.from([0]), piece: Uint32Array.from([0]), pieces: 1 }
}
