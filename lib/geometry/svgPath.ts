import { ARC, BEZIER, type EdgeTable, ELLIPSE, LINE, type Point } from './edges'
import { jetAt, newJet } from './evaluate'
import type { Region } from './region'

const ZERO: Point = { x: 0, y: 0 }
const FLAT = 48

/** Half axes and turn (degrees, counter-clockwise) of the ellipse c + u·cos t + v·sin t: the 2×2's singular values. */
export function ellipseAxes(ux: number, uy: number, vx: number, vy: number): { major: number; minor: number; angle: number } {
  const sum = Math.hypot(ux + vy, uy - vx)
  const apart = Math.hypot(ux - vy, uy + vx)
  const angle = 0.5 * (Math.atan2(uy - vx, ux + vy) + Math.atan2(uy + vx, ux - vy))
  return { major: 0.5 * (sum + apart), minor: 0.5 * Math.abs(sum - apart), angle: (angle * 180) / Math.PI }
}

/** How many steps to the drawing unit are written: a picture's width is some 1e7 of them. */
function stepsPerUnit(edges: EdgeTable, from: number, to: number, origin: Point): number {
  let size = 0
  for (let j = 4 * from; j < 4 * to; j += 2)
    size = Math.max(size, Math.abs(edges.ends[j] - origin.x), Math.abs(edges.ends[j + 1] - origin.y))
  return 10 ** (7 - Math.ceil(Math.log10(size || 1)))
}

interface Pen {
  x: (x: number) => string
  y: (y: number) => string
  length: (r: number) => string
}

function penOf(steps: number, origin: Point): Pen {
  const round = (value: number) => String(Math.round(value * steps) / steps + 0)
  return { x: (x) => round(x - origin.x), y: (y) => round(origin.y - y), length: round }
}

function arcTo(
  pen: Pen,
  edges: EdgeTable,
  i: number,
  rx: number,
  ry: number,
  angle: number,
  sweep: number,
  left: boolean,
): string {
  const e = edges.ends
  const half = Math.abs(sweep) > Math.PI
  const jet = jetAt(edges, i, 0.5, newJet())
  const head = `A${pen.length(rx)} ${pen.length(ry)} ${Number((-angle).toFixed(6)) + 0} 0 ${left ? 0 : 1} `
  const last = `${head}${pen.x(e[4 * i + 2])} ${pen.y(e[4 * i + 3])}`
  return half ? `${head}${pen.x(jet.x)} ${pen.y(jet.y)}${last}` : last
}

function bezierTo(pen: Pen, edges: EdgeTable, i: number): string {
  const s = edges.shapes
  const k = edges.shape[i]
  const degree = s[k]
  const end = `${pen.x(edges.ends[4 * i + 2])} ${pen.y(edges.ends[4 * i + 3])}`
  if (s[k + 1] === 0 && degree <= 3) {
    let points = ''
    for (let j = 1; j < degree; j++) points += `${pen.x(s[k + 2 + 3 * j])} ${pen.y(s[k + 3 + 3 * j])} `
    return `${['L', 'L', 'Q', 'C'][degree]}${points}${end}`
  }
  const jet = newJet()
  let path = ''
  for (let step = 1; step < FLAT; step++) {
    jetAt(edges, i, step / FLAT, jet)
    path += `L${pen.x(jet.x)} ${pen.y(jet.y)}`
  }
  return `${path}L${end}`
}

function edgeTo(pen: Pen, edges: EdgeTable, i: number): string {
  const s = edges.shapes
  const k = edges.shape[i]
  switch (edges.kind[i]) {
    case LINE:
      return `L${pen.x(edges.ends[4 * i + 2])} ${pen.y(edges.ends[4 * i + 3])}`
    case ARC:
      return arcTo(pen, edges, i, s[k + 2], s[k + 2], 0, s[k + 4], s[k + 4] > 0)
    case ELLIPSE: {
      const { major, minor, angle } = ellipseAxes(s[k + 2], s[k + 3], s[k + 4], s[k + 5])
      const left = s[k + 2] * s[k + 5] - s[k + 3] * s[k + 4] > 0 === s[k + 7] > 0
      return arcTo(pen, edges, i, major, minor, angle, s[k + 7], left)
    }
    case BEZIER:
      return bezierTo(pen, edges, i)
    default:
      return ''
  }
}

function written(pen: Pen, edges: EdgeTable, from: number, to: number, closed: boolean): string {
  if (to <= from) return ''
  let path = `M${pen.x(edges.ends[4 * from])} ${pen.y(edges.ends[4 * from + 1])}`
  for (let i = from; i < to; i++) path += edgeTo(pen, edges, i)
  return closed ? `${path}Z` : path
}

/**
 * SVG path of edges from … to − 1, each running into the next, drawn about `origin` with y turned down (SVG's sense).
 * Circles and ellipses as A, Bézier pieces as L, Q, C; rational pieces and degrees above 3 as 48 chords. Seven digits
 * of the size, for pictures only.
 */
export function pathOf(edges: EdgeTable, from: number, to: number, closed: boolean, origin: Point = ZERO): string {
  return written(penOf(stepsPerUnit(edges, from, to, origin), origin), edges, from, to, closed)
}

/** SVG path of a region, one subpath a loop; fill rule even-odd or nonzero alike. */
export function regionPath(region: Region, origin: Point = ZERO): string {
  const { edges, loopStart } = region
  const pen = penOf(stepsPerUnit(edges, 0, edges.count, origin), origin)
  let path = ''
  for (let k = 0; k + 1 < loopStart.length; k++) path += written(pen, edges, loopStart[k], loopStart[k + 1], true)
  return path
}
