import type { Region } from '../geometry/region'
import type { Bundles } from './bundles'
import { extremesOf } from './extremes'
import type { Frame } from './frame'
import { type Moments, momentsOf } from './moments'
import type { PieceSpan } from './plasticGap'

/** Moments of one loop (holes are negative) about (x, y). */
const loopMoments = ({ edges, loopStart }: Region, loop: number, frame: Frame): Moments =>
  momentsOf(edges, loopStart[loop], loopStart[loop + 1], frame)

/** Moments of every piece in `frame`. */
export function piecesMoments(region: Region, frame: Frame): Moments[] {
  const pieces = Array.from({ length: region.pieces }, (): Moments => ({ area: 0, u: 0, v: 0, uu: 0, vv: 0, uv: 0 }))
  for (let loop = 0; loop < region.piece.length; loop++) {
    const part = loopMoments(region, loop, frame)
    const piece = pieces[region.piece[loop]]
    piece.area += part.area
    piece.u += part.u
    piece.v += part.v
    piece.uu += part.uu
    piece.vv += part.vv
    piece.uv += part.uv
  }
  return pieces
}

/**
 * Sums over the pieces of their second moments about their own centroids, without Steiner terms; `frame` along x and y, `pieces`
 * as of `piecesMoments` in it.
 */
export function ownMoments(region: Region, frame: Frame, pieces: readonly Moments[]): { ix: number; iy: number; ixy: number } {
  const centres = pieces.map(({ area, u, v }) => ({
    ...frame,
    x: frame.x + u / area,
    y: frame.y + v / area,
  }))
  const own = { ix: 0, iy: 0, ixy: 0 }
  for (let loop = 0; loop < region.piece.length; loop++) {
    const { uu, vv, uv } = loopMoments(region, loop, centres[region.piece[loop]])
    own.ix += vv
    own.iy += uu
    own.ixy += uv
  }
  return own
}

/** What every piece spans along v of `frame`. */
export function pieceSpans(region: Region, bundles: Bundles, frame: Frame, pieces: readonly Moments[]): PieceSpan[] {
  const spans = pieces.map(({ area }): PieceSpan => ({ min: Number.POSITIVE_INFINITY, max: Number.NEGATIVE_INFINITY, area }))
  for (let loop = 0; loop < region.piece.length; loop++) {
    if (region.hole[loop]) continue
    const { minV, maxV } = extremesOf(bundles, frame, bundles.loopRun[loop], bundles.loopRun[loop + 1])
    const span = spans[region.piece[loop]]
    span.min = Math.min(span.min, minV)
    span.max = Math.max(span.max, maxV)
  }
  return spans
}

/** Whether a loop has vertices more than `margin` above and below v = c: no gap between pieces can lie there. */
export function isCrossed({ edges, loopStart }: Region, { x, y, cos, sin }: Frame, c: number, margin: number): boolean {
  const { ends } = edges
  for (let loop = 0; loop + 1 < loopStart.length; loop++) {
    let isAbove = false
    let isBelow = false
    for (let i = loopStart[loop]; i < loopStart[loop + 1]; i++) {
      const v = (ends[4 * i + 1] - y) * cos - (ends[4 * i] - x) * sin
      isAbove ||= v > c + margin
      isBelow ||= v < c - margin
      if (isAbove && isBelow) return true
    }
  }
  return false
}
