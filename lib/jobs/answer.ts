import type { Drawing } from '../dxf/drawing'
import type { Finding } from '../geometry/finding'
import type { OutlineSet } from '../geometry/outlineSet'
import { type Does, mmPerUnit, type Recipe } from '../geometry/recipe'
import { ENGINE_VERSION } from '../section/engineVersion'
import type { OutlineView, Section, SectionAnswer } from '../section/types'

export interface Source {
  name: string
  bytes: number
  sha256: string
}

/** A material as used: stored with the section, so that a later change of the material changes nothing. */
export interface UsedMaterial {
  name: string
  /** kg/m³ */
  density: number
  source: string
}

/** Outlines, and findings of one code, are listed up to this many; the totals stand beside. */
export const LISTED = 2000

export interface AnswerParts {
  source: Source
  recipe: Recipe
  drawing: Drawing
  outlines: OutlineSet | null
  /** what each outline does, in their order */
  roles: readonly (Does | null)[]
  findings: Finding[]
  /** where more were found than are listed */
  findingsTotal: number
  section: Section | null
}

/** The answer as API, command line and screens show it. */
export function answerOf({
  source,
  recipe,
  drawing,
  outlines,
  roles,
  findings,
  findingsTotal,
  section,
}: AnswerParts): SectionAnswer {
  return {
    engineVersion: ENGINE_VERSION,
    source,
    recipe,
    unit: { drawing: String(recipe.unit), mmPerUnit: mmPerUnit(recipe), declared: drawing.declared },
    outlines: outlines ? outlineViews(outlines, drawing, roles) : [],
    outlinesTotal: outlines?.count ?? 0,
    findings: listed(findings),
    findingsTotal,
    section,
  }
}

/** The same answer with further findings, listed and counted by the same rule. */
export function withFindings(answer: SectionAnswer, more: Finding[]): SectionAnswer {
  if (more.length === 0) return answer
  return { ...answer, findings: listed([...answer.findings, ...more]), findingsTotal: answer.findingsTotal + more.length }
}

function outlineViews(outlines: OutlineSet, drawing: Drawing, roles: readonly (Does | null)[]): OutlineView[] {
  const views: OutlineView[] = []
  for (let k = 0; k < Math.min(outlines.count, LISTED); k++) {
    const depth = outlines.depth[k]
    views.push({
      id: `o${k + 1}`,
      layer: drawing.layers[drawing.entities.layer[outlines.source[k]]]?.name ?? '0',
      edges: outlines.loopStart[k + 1] - outlines.loopStart[k],
      area: outlines.area[k],
      depth: depth < 0 ? null : depth,
      at: [outlines.at[2 * k], outlines.at[2 * k + 1]],
      does: roles[k] ?? undefined,
    })
  }
  return views
}

function listed(findings: Finding[]): Finding[] {
  const seen = new Map<string, number>()
  return findings.filter(({ code }) => {
    const count = (seen.get(code) ?? 0) + 1
    seen.set(code, count)
    return count <= LISTED
  })
}
