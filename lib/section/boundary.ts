import { ARC, BEZIER, ELLIPSE, LINE } from '../geometry/edges'
import { jetAt, lengthOf, newJet } from '../geometry/evaluate'
import type { Region } from '../geometry/region'
import { add, newSums, sumOf } from '../geometry/sum'

/**
 * Integrals along the boundary, about (x, y): what a figure moves by when the boundary moves out by δ is δ times one of these.
 * Lengths in mm; xx = ∮x² ds, yy = ∮y² ds, xy = ∮xy ds (mm³); `turning` = the angle the boundary turns through, all turns
 * counted as positive (a length changes by δ × turning).
 */
export interface Boundary {
  outer: number
  inner: number
  xx: number
  yy: number
  xy: number
  turning: number
  hasEllipse: boolean
  hasBezier: boolean
  hasRational: boolean
}

const jet = newJet()

/** Lengths compensated; the moments of arcs and splines by Simpson's rule (they serve bounds of uncertainty only). */
export function boundaryOf({ edges, loopStart, hole }: Region, x: number, y: number): Boundary {
  const lengths = newSums(2)
  let xx = 0
  let yy = 0
  let xy = 0
  let turning = 0
  let hasEllipse = false
  let hasBezier = false
  let hasRational = false
  const e = edges.ends
  for (let loop = 0; loop < hole.length; loop++) {
    let lastX = 0
    let lastY = 0
    for (let i = loopStart[loop]; i < loopStart[loop + 1]; i++) {
      const x0 = e[4 * i] - x
      const y0 = e[4 * i + 1] - y
      const x1 = e[4 * i + 2] - x
      const y1 = e[4 * i + 3] - y
      const dx = x1 - x0
      const dy = y1 - y0
      let length = Math.sqrt(dx * dx + dy * dy)
      let mx = 0.5 * (x0 + x1)
      let my = 0.5 * (y0 + y1)
      const kind = edges.kind[i]
      if (kind !== LINE) {
        hasEllipse ||= kind === ELLIPSE
        hasBezier ||= kind === BEZIER
        hasRational ||= kind === BEZIER && edges.shapes[edges.shape[i] + 1] === 1
        length = lengthOf(edges, i)
        jetAt(edges, i, 0.5, jet)
        mx = jet.x - x
        my = jet.y - y
        turning += kind === BEZIER ? Math.PI : Math.abs(edges.shapes[edges.shape[i] + (kind === ARC ? 4 : 7)])
      } else if (length > 0) {
        if (lastX !== 0 || lastY !== 0) turning += Math.abs(dx / length - lastX) + Math.abs(dy / length - lastY)
        lastX = dx / length
        lastY = dy / length
      }
      add(lengths, hole[loop], length)
      const sixth = length / 6
      xx += sixth * (x0 * x0 + 4 * mx * mx + x1 * x1)
      yy += sixth * (y0 * y0 + 4 * my * my + y1 * y1)
      xy += sixth * (x0 * y0 + 4 * mx * my + x1 * y1)
    }
    turning += 2
  }
  return { outer: sumOf(lengths, 0), inner: sumOf(lengths, 1), xx, yy, xy, turning, hasEllipse, hasBezier, hasRational }
}
