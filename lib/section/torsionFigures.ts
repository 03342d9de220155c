import { type Finding, makeFinding } from '../geometry/finding'
import type { Region } from '../geometry/region'
import { SECTION_FINDINGS } from './findings'
import { pieceRegions } from './pieceRegions'
import { type Torsion, torsionOf } from './torsion/torsion'
import type { Origin, Section } from './types'

/** Above these, elements would hold up every other figure. */
const MOST_EDGES = 1500
const MOST_PIECES = 4
const MOST_UNKNOWNS = 20_000
/** Bounds further apart than this say nothing that a person could use. */
const LEAST_SHARE = 0.9

export interface TorsionFigures {
  figures: Pick<Section, 'j' | 'shearCentre' | 'iw' | 'shearArea'>
  origin: Record<string, Origin>
  findings: Finding[]
}

const none = (code: 'torsion-not-sought' | 'torsion-not-found', region: Region): TorsionFigures => ({
  figures: {},
  origin: {},
  findings: [makeFinding(SECTION_FINDINGS, code, { edges: region.edges.count, pieces: region.pieces })],
})

const estimate = (numerics: number): Origin => ({ kind: 'element', estimate: true, plusMinus: { numerics } })

/**
 * Torsion constant between its bounds, shear centre, warping constant and shear areas, by finite elements. The torsion
 * constants of pieces that are not joined add (each turns by the same angle); the others mean nothing for them and are left out.
 */
export function torsionFigures(region: Region): TorsionFigures {
  if (region.edges.count > MOST_EDGES || region.pieces > MOST_PIECES) return none('torsion-not-sought', region)
  const parts: Torsion[] = []
  for (const piece of pieceRegions(region)) {
    const part = torsionOf(piece, { unknowns: MOST_UNKNOWNS })
    if (!part || part.lower < LEAST_SHARE * part.upper) return none('torsion-not-found', region)
    parts.push(part)
  }
  const lower = parts.reduce((sum, part) => sum + part.lower, 0)
  const upper = parts.reduce((sum, part) => sum + part.upper, 0)
  const j = { value: (lower + upper) / 2, lower, upper }
  const origin: Record<string, Origin> = { j: { kind: 'element', plusMinus: { numerics: (upper - lower) / 2 } } }
  const [first] = parts
  if (parts.length > 1 || !first.change) return { figures: { j }, origin, findings: [] }
  const { x, y, warping, shearXX, shearYY, change } = first
  return {
    figures: { j, shearCentre: { x, y }, iw: Math.max(0, warping), shearArea: { x: 1 / shearXX, y: 1 / shearYY } },
    origin: {
      ...origin,
      'shearCentre.x': estimate(change.x),
      'shearCentre.y': estimate(change.y),
      iw: estimate(change.warping),
      'shearArea.x': estimate(change.shearXX / shearXX ** 2),
      'shearArea.y': estimate(change.shearYY / shearYY ** 2),
    },
    findings: [],
  }
}
