import { type Finding, makeFinding } from '../geometry/finding'
import type { Region } from '../geometry/region'
import { bendingFrame } from './bendingFrame'
import type { Bundles } from './bundles'
import { type Extremes, extremesOf } from './extremes'
import type { Response } from './figures/figure'
import { BENDING_AXES } from './figures/spread'
import { SECTION_FINDINGS } from './findings'
import type { Causes } from './origins'
import type { Moments } from './moments'
import { isCrossed, pieceSpans } from './pieces'
import { plasticBending } from './plastic'
import { plasticGap } from './plasticGap'
import type { Section } from './types'

export interface PlasticFigures {
  plastic: Section['plastic']
  widths: Response['widths']
  /** moment about the other axis that comes with x and y, mm³ */
  across: { x: number; y: number }
  shape: (elastic: Section['elastic']) => Section['plasticShape']
  findings: Finding[]
}

const lesser = (a: number | null, b: number | null): number | null => (a === null || b === null ? null : Math.min(a, b))
const over = (a: number | null, b: number | null): number | null => (a === null || b === null ? null : a / b)

/** A piece that reaches this many roots of the area's tolerance (of the whole height) past the line leaves no gap there. */
const NEAR_GAP = 30

/** Plastic figures about x, y and, unless every axis is principal, about axes 1 and 2; `pieces`: moments of each where there are several. */
export function plasticFigures(
  region: Region,
  bundles: Bundles,
  pieces: readonly Moments[],
  theta: number | null,
  causes: Causes,
): PlasticFigures {
  const plastic: Section['plastic'] = { x: 0, y: 0, axis1: null, axis2: null, at: { x: 0, y: 0, axis1: null, axis2: null } }
  const widths: Response['widths'] = { x: 0, y: 0, axis1: 0, axis2: 0 }
  const across = { x: 0, y: 0 }
  const findings: Finding[] = []
  const tolerance = Math.max(1e-9, (causes.digits?.area ?? 0) / bundles.moments.area)
  for (const axis of BENDING_AXES) {
    if (theta === null && (axis === 'axis1' || axis === 'axis2')) continue
    const turned = bendingFrame(bundles, theta, axis)
    const extremes: Extremes = extremesOf(bundles, turned)
    const bending = plasticBending(bundles, turned, extremes)
    plastic[axis] = bending.modulus
    plastic.at[axis] = bending.offset
    widths[axis] = bending.width
    if (axis === 'x' || axis === 'y') across[axis] = bending.across
    const margin = NEAR_GAP * Math.sqrt(tolerance) * (extremes.maxV - extremes.minV)
    if (region.pieces === 1 || isCrossed(region, turned, bending.offset, margin)) continue
    const gap = plasticGap(pieceSpans(region, bundles, turned, pieces), tolerance)
    if (!gap) continue
    const [from, to] = gap
    plastic.at[axis] = 0.5 * (from + to)
    plastic.atRange = { ...plastic.atRange, [axis]: gap }
    widths[axis] = 0
    const places = { axis: axis.replace('axis', 'axis '), from: Number(from.toFixed(3)), to: Number(to.toFixed(3)) }
    findings.push(makeFinding(SECTION_FINDINGS, 'plastic-axis-in-gap', places))
  }
  const shape = (elastic: Section['elastic']): Section['plasticShape'] => ({
    x: plastic.x / Math.min(elastic.xTop, elastic.xBottom),
    y: plastic.y / Math.min(elastic.yRight, elastic.yLeft),
    axis1: over(plastic.axis1, lesser(elastic.axis1Left, elastic.axis1Right)),
    axis2: over(plastic.axis2, lesser(elastic.axis2Left, elastic.axis2Right)),
  })
  return { plastic, widths, across, shape, findings }
}
