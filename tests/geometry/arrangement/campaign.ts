import { expect } from 'vitest'
import { loopArea } from '@/lib/geometry/edgeArea'
import { lengthOf } from '@/lib/geometry/evaluate'
import { asBeziers, mapped, type Shape, tableOf } from './shapes'

/** How many random cases: few in `npm test`, many in the campaign. */
export const RUNS = Number(process.env.CAMPAIGN_RUNS ?? 300)

export const VARIANTS = ['arcs', 'elliptical arcs', 'rational Béziers', 'cubic Béziers', 'arcs with Béziers'] as const
export type Variant = (typeof VARIANTS)[number]

/** Rational curves have no closed area and take ten times as long. */
export const runsOf = (variant: Variant): number => (variant === 'rational Béziers' ? Math.ceil(RUNS / 5) : RUNS)

/** The same pair with its arcs as another kind of edge; the affine map and the Béziers keep what touches touching. */
export function varied([a, b]: [Shape, Shape], variant: Variant, next: () => number): [Shape, Shape] {
  switch (variant) {
    case 'arcs':
      return [a, b]
    case 'elliptical arcs': {
      const by: [number, number, number, number, number, number] = [1, 0.2 * next(), 0.4 * next(), 0.5 + next(), 0, 0]
      return [mapped(a, by), mapped(b, by)]
    }
    case 'rational Béziers':
      return [asBeziers(a, true), asBeziers(b, true)]
    case 'cubic Béziers':
      return [asBeziers(a, false), asBeziers(b, false)]
    case 'arcs with Béziers':
      return [asBeziers(a, true), b]
  }
}

export function areaOf(shape: Shape): number {
  const { edges } = tableOf([shape])
  return loopArea(edges, 0, edges.count)
}

export function perimeterOf(shape: Shape): number {
  const { edges } = tableOf([shape])
  let sum = 0
  for (let i = 0; i < edges.count; i++) sum += lengthOf(edges, i)
  return sum
}

/** Collects what went wrong with its seed, so that a failure can be run again alone. */
export class Failures {
  private readonly list: string[] = []
  check(seed: number, what: string, off: number, allowed: number): void {
    if (!(off <= allowed)) this.list.push(`seed ${seed}: ${what} off by ${off}, allowed ${allowed}`)
  }
  expectNone(): void {
    expect(this.list.slice(0, 10)).toEqual([])
  }
}
