import type { Drawing } from '../dxf/drawing'
import type { Finding } from '../geometry/finding'
import type { OutlineSet } from '../geometry/outlineSet'
import { mmPerUnit, type Recipe } from '../geometry/recipe'
import type { Section } from '../section/types'
import { taskFinding } from './findings'

/** A profile outside these sizes (mm) is more likely read in the wrong unit. */
const SMALLEST = 0.5
const LARGEST = 20_000

/** Findings about the unit: another one than declared, or an unusual size. */
export function unitFindings(drawing: Drawing, recipe: Recipe, section: Section | null): Finding[] {
  const findings: Finding[] = []
  const taken = mmPerUnit({ unit: recipe.unit, scale: 1, shrinkage: 1 })
  if (drawing.declaredMm !== null && Math.abs(taken - drawing.declaredMm) > 1e-9 * taken) {
    findings.push(taskFinding('unit-differs', { declared: drawing.declared, taken: recipe.unit }))
  }
  if (section) {
    const { minX, minY, maxX, maxY } = section.extents
    const [width, height] = [maxX - minX, maxY - minY]
    const size = Math.max(width, height)
    if (size <= SMALLEST || size >= LARGEST) findings.push(taskFinding('unit-size', { width, height }))
  }
  return findings
}

/**
 * Without questions that a part or a make-up has answered: metal or void, also where outlines cross (else there would be no
 * metal), and what of the sheet is the profile, where neither frame, title block nor another group is taken.
 */
export function withoutMootQuestions(findings: Finding[], outlines: OutlineSet, taken: number[]): Finding[] {
  if (taken.length === 0) return findings
  const { frames, titleBlocks, group } = outlines
  const takes = new Set(taken)
  const moot = new Set(['face-metal-or-void', 'outlines-cross'])
  if (!frames.some((k) => takes.has(k))) moot.add('frame-found')
  if (!titleBlocks.flat().some((k) => takes.has(k))) moot.add('title-block-found')
  if (taken.every((k) => group[k] === group[taken[0]])) moot.add('groups-apart')
  return findings.filter(({ code }) => !moot.has(code))
}

/**
 * Where only some outlines of a sheet are taken, a fault that lies farther from them than their own size is another detail's:
 * it stays visible as a warning, and blocks nothing.
 */
export function withoutFarFaults(findings: Finding[], outlines: OutlineSet, taken: number[]): Finding[] {
  if (taken.length === 0 || taken.length === outlines.count) return findings
  const box = [Number.POSITIVE_INFINITY, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY, Number.NEGATIVE_INFINITY]
  for (const k of taken) {
    for (const side of [0, 1]) {
      box[side] = Math.min(box[side], outlines.bounds[4 * k + side])
      box[side + 2] = Math.max(box[side + 2], outlines.bounds[4 * k + side + 2])
    }
  }
  const reach = Math.max(box[2] - box[0], box[3] - box[1])
  const isFar = ([x, y]: [number, number]) => x < box[0] - reach || x > box[2] + reach || y < box[1] - reach || y > box[3] + reach
  return findings.map((finding) =>
    finding.severity === 'error' && finding.at && isFar(finding.at) ? { ...finding, severity: 'warning' } : finding,
  )
}
