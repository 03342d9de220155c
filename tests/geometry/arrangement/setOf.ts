import { type RegionAnswer, regionOf } from '@/lib/geometry/arrangement/regionOf'
import { loopArea } from '@/lib/geometry/edgeArea'
import { lengthOf } from '@/lib/geometry/evaluate'
import { outlinesOf } from '@/lib/geometry/outlines'
import type { OutlineSet, Tolerances } from '@/lib/geometry/outlineSet'
import type { Bond, MakeUpStep, XY } from '@/lib/geometry/recipe'
import type { Region } from '@/lib/geometry/region'
import { type Shape, sizeOf, tableOf } from './shapes'

/** Shapes as the outlines of a drawing in mm, each shape one closed entity. */
export function setOf(shapes: Shape[]): { set: OutlineSet; tolerances: Tolerances } {
  const { edges } = tableOf(shapes)
  const size = sizeOf(shapes)
  const tolerances = { lastDigit: 0, chaining: 0.01, duplicate: 1e-6 * size, snap: 1e-9 * size }
  const take = new Uint32Array(edges.count).map((_, i) => i)
  return { set: outlinesOf(edges, take, tolerances, { arcs: [], mmPerUnit: 1 }), tolerances }
}

export interface Asked {
  makeUp?: MakeUpStep[] | null
  part?: XY[] | null
  bonds?: Bond[]
}

/** The region of shapes under a make-up. */
export function combined(shapes: Shape[], { makeUp = null, part = null, bonds = [] }: Asked = {}): RegionAnswer {
  const { set, tolerances } = setOf(shapes)
  return regionOf(set, { makeUp, part, bonds }, tolerances)
}

export function measured(region: Region): { area: number; outer: number; inner: number } {
  const sums = { area: 0, outer: 0, inner: 0 }
  for (let k = 0; k < region.hole.length; k++) {
    sums.area += loopArea(region.edges, region.loopStart[k], region.loopStart[k + 1])
    for (let i = region.loopStart[k]; i < region.loopStart[k + 1]; i++)
      sums[region.hole[k] ? 'inner' : 'outer'] += lengthOf(region.edges, i)
  }
  return sums
}

/** The region of an answer that must have one. */
export function metalOf(answer: RegionAnswer): Region {
  if (!answer.region) throw new Error(`no region: ${answer.findings.map((f) => f.message).join(' ')}`)
  return answer.region
}

export const codes = (answer: RegionAnswer): string[] => answer.findings.map(({ code }) => code)
