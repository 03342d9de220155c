import { rootsOf } from '../geometry/bernstein'
import { turning } from '../geometry/bezierXy'
import { ARC, BEZIER, type EdgeTable } from '../geometry/edges'
import {
  addControlsSegment,
  type Controls,
  chordCentred,
  controlsFromChord,
  controlsPoint,
  partOfControls,
} from './bezierSegment'
import type { Frame } from './frame'
import { addShifted } from './momentArray'
import { newUnitSegment, unitSegment } from './unitSegment'

/**
 * A curved edge in a frame's axes, placed so that its chord's middle is that of the snapped ends. t runs from `from` to `to`.
 * Circular and elliptical arcs: P(t) = k + e·(cos t − cos to) + f·sin t with to = sweep/2 = −from: the affine image of a unit
 * arc, written from the chord so that shallow arcs of great radius keep their digits. Bézier pieces: `controls` from the chord.
 * Reused, never kept.
 */
export interface Curve {
  ku: number
  kv: number
  eu: number
  ev: number
  fu: number
  fv: number
  from: number
  to: number
  controls: Controls | null
}
export const newCurve = (): Curve => ({ ku: 0, kv: 0, eu: 0, ev: 0, fu: 0, fv: 0, from: 0, to: 0, controls: null })

/** Loads curved edge i. */
export function loadCurve(edges: EdgeTable, i: number, frame: Frame, curve: Curve): Curve {
  const { cos, sin } = frame
  const e = edges.ends
  const x = e[4 * i] - frame.x + 0.5 * (e[4 * i + 2] - e[4 * i])
  const y = e[4 * i + 1] - frame.y + 0.5 * (e[4 * i + 3] - e[4 * i + 1])
  curve.ku = x * cos + y * sin
  curve.kv = y * cos - x * sin
  if (edges.kind[i] === BEZIER) {
    curve.controls = controlsFromChord(edges, i, frame)
    curve.from = 0
    curve.to = 1
    return curve
  }
  curve.controls = null
  const s = edges.shapes
  const at = edges.shape[i]
  const arc = edges.kind[i] === ARC
  const start = s[at + (arc ? 3 : 6)]
  const sweep = s[at + (arc ? 4 : 7)]
  const c = Math.cos(start + 0.5 * sweep)
  const d = Math.sin(start + 0.5 * sweep)
  const ux = s[at + 2]
  const uy = arc ? 0 : s[at + 3]
  const vx = arc ? 0 : s[at + 4]
  const vy = arc ? ux : s[at + 5]
  const ex = ux * c + vx * d
  const ey = uy * c + vy * d
  const fx = vx * c - ux * d
  const fy = vy * c - uy * d
  curve.eu = ex * cos + ey * sin
  curve.ev = ey * cos - ex * sin
  curve.fu = fx * cos + fy * sin
  curve.fv = fy * cos - fx * sin
  curve.from = -0.5 * sweep
  curve.to = 0.5 * sweep
  return curve
}

/** Point and derivative by t; reused, never kept. */
export interface CurvePoint {
  u: number
  v: number
  du: number
  dv: number
}
export const newCurvePoint = (): CurvePoint => ({ u: 0, v: 0, du: 0, dv: 0 })

export function curvePoint(curve: Curve, t: number, point: CurvePoint): CurvePoint {
  if (curve.controls) {
    controlsPoint(curve.controls, t, point)
    point.u += curve.ku
    point.v += curve.kv
    return point
  }
  const c = Math.cos(t)
  const s = Math.sin(t)
  const sagitta = -2 * Math.sin(0.5 * (t + curve.to)) * Math.sin(0.5 * (t - curve.to))
  point.u = curve.ku + curve.eu * sagitta + curve.fu * s
  point.v = curve.kv + curve.ev * sagitta + curve.fv * s
  point.du = curve.fu * c - curve.eu * s
  point.dv = curve.fv * c - curve.ev * s
  return point
}

function conicTurns(e: number, f: number, from: number, to: number, turns: number[]): void {
  const low = Math.min(from, to)
  const high = Math.max(from, to)
  const first = Math.atan2(f, e)
  for (let k = Math.ceil((low - first) / Math.PI); k <= Math.floor((high - first) / Math.PI); k++) {
    const t = first + k * Math.PI
    if (t > low && t < high) turns.push(t)
  }
  if (to < from) turns.reverse()
}

/** Parameters between `from` and `to`, in running order, where v has an extreme: between them v is monotone. */
export function turnsInV(curve: Curve): number[] {
  const { controls } = curve
  if (controls) {
    const v = Array.from(controls.v)
    return rootsOf(turning(v, { x: v, y: v, w: Array.from(controls.w), rational: controls.rational }))
  }
  const turns: number[] = []
  conicTurns(curve.ev, curve.fv, curve.from, curve.to, turns)
  return turns
}

const unit = newUnitSegment()

/**
 * Adds the moments of the segment between the part t0 … t1 of the curve and its chord, whose middle is (k, l).
 * Conics: the affine image of a unit arc's segment; moments map by the matrix [e f], times its determinant.
 */
export function addSegment(curve: Curve, t0: number, t1: number, k: number, l: number, out: Float64Array): void {
  const { controls } = curve
  if (controls) {
    const whole = t0 === 0 && t1 === 1
    addControlsSegment(whole ? controls : chordCentred(partOfControls(controls, t0, t1)), k, l, out)
    return
  }
  const { area, p, pp, qq } = unitSegment(t1 - t0, unit)
  const middle = 0.5 * (t0 + t1)
  const c = middle === 0 ? 1 : Math.cos(middle)
  const s = middle === 0 ? 0 : Math.sin(middle)
  const eu = curve.eu * c + curve.fu * s
  const ev = curve.ev * c + curve.fv * s
  const fu = curve.fu * c - curve.eu * s
  const fv = curve.fv * c - curve.ev * s
  const det = eu * fv - ev * fu
  addShifted(
    out,
    k,
    l,
    det * area,
    det * p * eu,
    det * p * ev,
    det * (pp * eu * eu + qq * fu * fu),
    det * (pp * ev * ev + qq * fv * fv),
    det * (pp * eu * ev + qq * fu * fv),
  )
}

/** Farthest that a curve can reach from its chord's middle: cheap, so that most curves need no search. */
export function reachOf({ controls, eu, ev, fu, fv, to }: Curve): number {
  if (!controls) {
    const along = Math.abs(to) < Math.PI / 2 ? Math.sin(Math.abs(to)) : 1
    return (1 - Math.cos(to)) * (Math.abs(eu) + Math.abs(ev)) + along * (Math.abs(fu) + Math.abs(fv))
  }
  let reach = 0
  for (let j = 0; j < controls.w.length; j++) {
    reach = Math.max(reach, (Math.abs(controls.u[j]) + Math.abs(controls.v[j])) / controls.w[j])
  }
  return reach
}
