import { LINE } from '../geometry/edges'
import type { Bundles } from './bundles'
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

/** The same curve with its axes swapped, so that one search for turning points serves both. */
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

function widen(found: Extremes, u: number, v: number): void {
  if (u < found.minU) found.minU = u
  if (u > found.maxU) found.maxU = u
  if (v < found.minV) found.minV = v
  if (v > found.maxV) found.maxV = v
}

function widenByCurve(found: Extremes): void {
  const reach = reachOf(curve)
  const inV = curve.kv - reach < found.minV || curve.kv + reach > found.maxV
  const inU = curve.ku - reach < found.minU || curve.ku + reach > found.maxU
  if (inV) {
    for (const t of turnsInV(curve)) {
      curvePoint(curve, t, point)
      widen(found, point.u, point.v)
    }
  }
  if (inU) {
    const swapped = swapAxes(curve)
    for (const t of turnsInV(swapped)) {
      curvePoint(swapped, t, point)
      widen(found, point.v, point.u)
    }
  }
}

/** Extreme fibres of edges from … to − 1 along both axes of `frame`: ends, and the turning points of every curve. */
function widenByEdges({ edges }: Bundles, from: number, to: number, frame: Frame, found: Extremes): void {
  const { x, y, cos, sin } = frame
  const { ends, kind } = edges
  for (let i = from; i < to; i++) {
    const dx = ends[4 * i] - x
    const dy = ends[4 * i + 1] - y
    widen(found, dx * cos + dy * sin, dy * cos - dx * sin)
    if (kind[i] === LINE) continue
    loadCurve(edges, i, frame, curve)
    widenByCurve(found)
  }
}

/** Extreme fibres of runs from … to − 1 along both axes of `frame`; runs whose box lies within what is found are passed over. */
export function extremesOf(bundles: Bundles, frame: Frame, from = 0, to = bundles.count): Extremes {
  const { start, boxes, edges } = bundles
  const { x, y, cos, sin } = frame
  const c = Math.abs(cos)
  const s = Math.abs(sin)
  const found: Extremes = {
    minU: Number.POSITIVE_INFINITY,
    maxU: Number.NEGATIVE_INFINITY,
    minV: Number.POSITIVE_INFINITY,
    maxV: Number.NEGATIVE_INFINITY,
  }
  for (let k = from; k < to; k++) {
    const dx = edges.ends[4 * start[k]] - x
    const dy = edges.ends[4 * start[k] + 1] - y
    widen(found, dx * cos + dy * sin, dy * cos - dx * sin)
  }
  for (let k = from; k < to; k++) {
    const dx = 0.5 * (boxes[4 * k] + boxes[4 * k + 2]) - x
    const dy = 0.5 * (boxes[4 * k + 1] + boxes[4 * k + 3]) - y
    const width = 0.5 * (boxes[4 * k + 2] - boxes[4 * k])
    const height = 0.5 * (boxes[4 * k + 3] - boxes[4 * k + 1])
    const u = dx * cos + dy * sin
    const v = dy * cos - dx * sin
    const halfU = width * c + height * s
    const halfV = height * c + width * s
    const within = u - halfU >= found.minU && u + halfU <= found.maxU && v - halfV >= found.minV && v + halfV <= found.maxV
    if (!within) widenByEdges(bundles, start[k], start[k + 1], frame, found)
  }
  return found
}
