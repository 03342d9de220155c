import type { Boundary } from './boundary'
import type { Change } from './change'
import type { Figure, Response } from './figures/figure'
import { FIGURES } from './figures/index'
import type { Origin, OriginKind, PlusMinus, Section } from './types'

/** What can change a section's figures, cause by cause; null where a cause is absent. */
export interface Causes {
  digits: Change | null
  repairs: Change | null
  numerics: Change
}

function kindOf({ origin, iteratedOn = [] }: Figure, { hasEllipse, hasBezier, hasRational }: Boundary): OriginKind {
  if (origin !== 'exact') return origin
  const iterated = hasRational || (hasEllipse && iteratedOn.includes('ellipse')) || (hasBezier && iteratedOn.includes('bezier'))
  return iterated ? 'iterated' : 'exact'
}

/** Origin of every figure that has a value: the weakest of its edges', and its three ± in its own unit. */
export function originsOf(section: Section, boundary: Boundary, causes: Causes, response: Response): Record<string, Origin> {
  const origins: Record<string, Origin> = {}
  for (const figure of FIGURES) {
    const value = figure.value(section)
    if (value === null || value === undefined) continue
    const { spread } = figure
    if (!spread) {
      origins[figure.key] = { kind: figure.origin }
      continue
    }
    const plusMinus: PlusMinus = {}
    if (causes.digits) plusMinus.digits = spread(section, causes.digits, response)
    if (causes.repairs) plusMinus.repairs = spread(section, causes.repairs, response)
    plusMinus.numerics = spread(section, causes.numerics, response)
    origins[figure.key] = { kind: kindOf(figure, boundary), plusMinus }
  }
  return origins
}
