import { type EdgeTable, pushBezier, pushLine } from '../../geometry/edges'
import type { Sheet } from '../sheet'
import { evenWeights, type Homogeneous } from './bezierPieces'
import { cutAtCusps } from './cusps'

/** Rounding of a joint against the curve's size, and against its distance from the origin. */
const ROUNDING = 1e-12
const LAST_BITS = 1e-14

/**
 * Appends Bézier pieces as edges: cut at cusps and until their weights are even; straight ones become lines, those
 * without length are left out. Joints between pieces are one point to the last bit. Answers how many edges came.
 */
export function pushPieces({ edges, entities }: Sheet, row: number, pieces: Iterable<Homogeneous>): number {
  const first = edges.count
  for (const piece of pieces) {
    for (const part of cutAtCusps(piece)) for (const even of evenWeights(part)) pushPiece(edges, row, plain(even))
  }
  const count = edges.count - first
  if (count > 0) {
    joinEnds(edges.ends, first, edges.count)
    const last = 4 * (edges.count - 1)
    const { ends } = edges
    if (ends[4 * first] === ends[last + 2] && ends[4 * first + 1] === ends[last + 3]) entities.closed[row] = 1
  }
  return count
}

function pushPiece(edges: EdgeTable, row: number, xyw: Float64Array): void {
  const end = xyw.length - 3
  if (isPoint(xyw)) return
  if (isStraight(xyw)) pushLine(edges, xyw[0], xyw[1], xyw[end], xyw[end + 1], row)
  else pushBezier(edges, end / 3, isRational(xyw), xyw, row)
}

/** Control points as x y w. */
function plain(piece: Homogeneous): Float64Array {
  const xyw = piece.slice()
  for (let k = 0; k < xyw.length; k += 3) {
    if (xyw[k + 2] === 1) continue
    xyw[k] /= xyw[k + 2]
    xyw[k + 1] /= xyw[k + 2]
  }
  return xyw
}

function isRational(xyw: Float64Array): boolean {
  for (let k = 2; k < xyw.length; k += 3) if (xyw[k] !== xyw[2]) return true
  return false
}

function isPoint(xyw: Float64Array): boolean {
  for (let k = 3; k < xyw.length; k += 3) if (xyw[k] !== xyw[0] || xyw[k + 1] !== xyw[1]) return false
  return true
}

/** Control points on one line, each at or beyond the one before: the piece draws the segment and nothing else. */
function isStraight(xyw: Float64Array): boolean {
  const end = xyw.length - 3
  const dx = xyw[end] - xyw[0]
  const dy = xyw[end + 1] - xyw[1]
  const square = dx * dx + dy * dy
  let along = 0
  for (let k = 3; k <= end; k += 3) {
    const px = xyw[k] - xyw[0]
    const py = xyw[k + 1] - xyw[1]
    const next = px * dx + py * dy
    if (next < along || Math.abs(px * dy - py * dx) > 1e-15 * square) return false
    along = next
  }
  return square > 0
}

/** Makes joints, and first and last end of a closed curve, one point to the last bit where only rounding parts them. */
function joinEnds(ends: Float64Array, from: number, to: number): void {
  const [x, y] = [ends[4 * from], ends[4 * from + 1]]
  let extent = 0
  for (let k = 4 * from; k < 4 * to; k += 2) extent = Math.max(extent, Math.abs(ends[k] - x), Math.abs(ends[k + 1] - y))
  const tolerance = ROUNDING * extent + LAST_BITS * Math.max(Math.abs(x), Math.abs(y))
  const close = (a: number, b: number) => Math.hypot(ends[a] - ends[b], ends[a + 1] - ends[b + 1]) <= tolerance
  for (let i = from + 1; i < to; i++) if (close(4 * i - 2, 4 * i)) ends.copyWithin(4 * i, 4 * i - 2, 4 * i)
  const [first, last] = [4 * from, 4 * to - 2]
  if (to - from > 1 && close(last, first)) ends.copyWithin(last, first, first + 2)
}
