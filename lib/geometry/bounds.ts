import { valueAt } from './bernstein'
import { bezierXy, turnsOf } from './bezierXy'
import { ARC, ELLIPSE, type EdgeTable, LINE } from './edges'

const QUARTER = Math.PI / 2

function arcBounds(edges: EdgeTable, i: number, box: Float64Array, at: number): void {
  const s = edges.shapes
  const k = edges.shape[i]
  const a = s[k + 3]
  const b = a + s[k + 4]
  const last = Math.floor(Math.max(a, b) / QUARTER)
  for (let q = Math.ceil(Math.min(a, b) / QUARTER); q <= last; q++) {
    switch (((q % 4) + 4) % 4) {
      case 0:
        box[at + 2] = Math.max(box[at + 2], s[k] + s[k + 2])
        break
      case 1:
        box[at + 3] = Math.max(box[at + 3], s[k + 1] + s[k + 2])
        break
      case 2:
        box[at] = Math.min(box[at], s[k] - s[k + 2])
        break
      default:
        box[at + 1] = Math.min(box[at + 1], s[k + 1] - s[k + 2])
    }
  }
}

/** Extremes of c + u·cos t + v·sin t along one coordinate lie at atan2(v, u) + kπ, ±hypot(u, v) from c. */
function widen(box: Float64Array, low: number, c: number, u: number, v: number, from: number, to: number): void {
  const extreme = Math.atan2(v, u)
  const reach = Math.hypot(u, v)
  const last = Math.floor((Math.max(from, to) - extreme) / Math.PI)
  for (let q = Math.ceil((Math.min(from, to) - extreme) / Math.PI); q <= last; q++) {
    if (q % 2 === 0) box[low + 2] = Math.max(box[low + 2], c + reach)
    else box[low] = Math.min(box[low], c - reach)
  }
}

function bezierBounds(edges: EdgeTable, i: number, box: Float64Array, at: number): void {
  const curve = bezierXy(edges, i)
  for (const [offset, c] of [curve.x, curve.y].entries()) {
    for (const t of turnsOf(c, curve)) {
      const value = valueAt(c, t) / valueAt(curve.w, t)
      box[at + offset] = Math.min(box[at + offset], value)
      box[at + offset + 2] = Math.max(box[at + offset + 2], value)
    }
  }
}

/** Writes minX minY maxX maxY of edge i into `box` from `at`: exact over its curve, its ends included. */
export function edgeBounds(edges: EdgeTable, i: number, box: Float64Array, at: number): void {
  const e = edges.ends
  box[at] = Math.min(e[4 * i], e[4 * i + 2])
  box[at + 1] = Math.min(e[4 * i + 1], e[4 * i + 3])
  box[at + 2] = Math.max(e[4 * i], e[4 * i + 2])
  box[at + 3] = Math.max(e[4 * i + 1], e[4 * i + 3])
  switch (edges.kind[i]) {
    case LINE:
      break
    case ARC:
      arcBounds(edges, i, box, at)
      break
    case ELLIPSE: {
      const s = edges.shapes
      const k = edges.shape[i]
      const to = s[k + 6] + s[k + 7]
      widen(box, at, s[k], s[k + 2], s[k + 4], s[k + 6], to)
      widen(box, at + 1, s[k + 1], s[k + 3], s[k + 5], s[k + 6], to)
      break
    }
    default:
      bezierBounds(edges, i, box, at)
  }
}

/** Bounds of every edge, four numbers each. */
export function boundsOfEdges(edges: EdgeTable): Float64Array {
  const boxes = new Float64Array(4 * edges.count)
  for (let i = 0; i < edges.count; i++) edgeBounds(edges, i, boxes, 4 * i)
  return boxes
}

/** Bounds of every loop, four numbers each, from those of its edges; loop k is edges loopStart[k] … loopStart[k + 1] − 1. */
export function boundsOfLoops(edgeBoxes: Float64Array, loopStart: ArrayLike<number>): Float64Array {
  const bounds = new Float64Array(4 * (loopStart.length - 1))
  for (let k = 0; k + 1 < loopStart.length; k++) bounds.set(unionOfBoxes(edgeBoxes, loopStart[k], loopStart[k + 1]), 4 * k)
  return bounds
}

/** The box round boxes from … to − 1; [∞, ∞, −∞, −∞] for none. */
export function unionOfBoxes(boxes: Float64Array, from: number, to: number): [number, number, number, number] {
  let minX = Number.POSITIVE_INFINITY
  let minY = Number.POSITIVE_INFINITY
  let maxX = Number.NEGATIVE_INFINITY
  let maxY = Number.NEGATIVE_INFINITY
  for (let j = 4 * from; j < 4 * to; j += 4) {
    if (boxes[j] < minX) minX = boxes[j]
    if (boxes[j + 1] < minY) minY = boxes[j + 1]
    if (boxes[j + 2] > maxX) maxX = boxes[j + 2]
    if (boxes[j + 3] > maxY) maxY = boxes[j + 3]
  }
  return [minX, minY, maxX, maxY]
}
