import { type EdgeTable, LINE } from '../geometry/edges'
import { type Curve, curvePoint, loadCurve, newCurve, newCurvePoint, reachOf, turnsInV } from './curve'
import type { Frame } from './frame'

/** Extents in a frame's axes. */
export interface Extremes {
  minU: number
  maxU: number
  minV: number
  maxV: number
}

const curve = newCurve()
const point = newCurvePoint()

/** Quarter turn: v of the turned curve is u of this one, so one search serves both axes. */
function swapAxes(c: Curve): Curve {
  return {
    ...c,
    ku: c.kv,
    kv: c.ku,
    eu: c.ev,
    ev: c.eu,
    fu: c.fv,
    fv: c.fu,
    controls: c.controls && { ...c.controls, u: c.controls.v, v: c.controls.u },
  }
}

/** Extreme fibres of edges from … to − 1 along both axes of `frame`: ends, and the turning points of every curve. */
export function extremesOf(edges: EdgeTable, from: number, to: number, frame: Frame): Extremes {
  const { cos, sin } = frame
  const e = edges.ends
  let minU = Number.POSITIVE_INFINITY
  let maxU = Number.NEGATIVE_INFINITY
  let minV = Number.POSITIVE_INFINITY
  let maxV = Number.NEGATIVE_INFINITY
  for (let i = from; i < to; i++) {
    const x = e[4 * i] - frame.x
    const y = e[4 * i + 1] - frame.y
    const u = x * cos + y * sin
    const v = y * cos - x * sin
    if (u < minU) minU = u
    if (u > maxU) maxU = u
    if (v < minV) minV = v
    if (v > maxV) maxV = v
  }
  for (let i = from; i < to; i++) {
    if (edges.kind[i] === LINE) continue
    loadCurve(edges, i, frame, curve)
    const reach = reachOf(curve)
    if (curve.kv - reach < minV || curve.kv + reach > maxV) {
      for (const t of turnsInV(curve)) {
        const { v } = curvePoint(curve, t, point)
        minV = Math.min(minV, v)
        maxV = Math.max(maxV, v)
      }
    }
    if (curve.ku - reach < minU || curve.ku + reach > maxU) {
      const swapped = swapAxes(curve)
      for (const t of turnsInV(swapped)) {
        const { v } = curvePoint(swapped, t, point)
        minU = Math.min(minU, v)
        maxU = Math.max(maxU, v)
      }
    }
  }
  return { minU, maxU, minV, maxV }
}
