import { createHash } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { DEFAULT_RECIPE, type Recipe } from '@/lib/geometry/recipe'
import { readTask, sectionTask, type TaskResult } from '@/lib/jobs/tasks'
import { deviations } from './deviations'
import { caseBytes, type Reference, references } from './reference'

function compute({ file, unit, tolerance, makeUp, layers }: Reference, change: Partial<Recipe> = {}): TaskResult {
  const bytes = caseBytes(file)
  const sha256 = createHash('sha256').update(bytes).digest('hex')
  const recipe = { ...DEFAULT_RECIPE, unit: unit.drawing, tolerance, makeUp, layers: layers ?? null, ...change }
  return sectionTask(readTask(bytes), { name: file, bytes: bytes.length, sha256 }, recipe, {})
}

const all = references()
const named = (file: string): Reference => {
  const found = all.find((reference) => reference.file === file)
  if (!found) throw new Error(`${file} is not in fixtures/cases`)
  return found
}

describe('drawings with reference values, every figure within its accepted error', () => {
  it.each(all.map((reference) => [`${reference.file}: ${reference.title}`, reference] as const))('%s', (_, reference) => {
    const { answer } = compute(reference)
    if (!answer.section) throw new Error(answer.findings.map(({ message }) => message).join('\n'))
    expect(deviations(answer.section, reference.expected_mm, reference.accept_rel)).toEqual([])
    expect(answer.section.pieces).toBe(reference.pieces)
    expect(answer.unit).toEqual({
      drawing: reference.unit.drawing,
      mmPerUnit: reference.unit.mmPerUnit,
      declared: reference.unit.declared,
    })
  })

  const variants = all.flatMap((reference) => (reference.variants ?? []).map((variant) => [reference, variant] as const))
  it.each(variants)('$file read with a tolerance of $tolerance mm', (reference, { tolerance, makeUp, expected_mm }) => {
    const { section } = compute(reference, { tolerance, makeUp }).answer
    expect(section && deviations(section, expected_mm, reference.accept_rel)).toEqual([])
  })
})

describe('torsion and warping of the drawings that hold a reference', () => {
  const held = all.flatMap((reference) =>
    reference.torsion_mm ? [[reference.file, reference, reference.torsion_mm] as const] : [],
  )
  it.each(held)(
    '%s: J between bounds a 500th apart, shear centre and Iw within a hundredth',
    (_, reference, { j, shearCentre, iw }) => {
      const { section } = compute(reference).answer
      if (!section?.j || !section.shearCentre || section.iw === undefined) throw new Error('no torsion')
      expect(section.j.lower).toBeLessThanOrEqual(j.value * (1 + j.accept_rel))
      expect(section.j.upper).toBeGreaterThanOrEqual(j.value * (1 - j.accept_rel))
      expect(section.j.upper / section.j.lower - 1).toBeLessThan(0.002)
      const near = 0.01 * section.circle.radius + shearCentre.accept_abs
      expect(section.shearCentre.x).toBeWithin(shearCentre.x, { absolute: near })
      expect(section.shearCentre.y).toBeWithin(shearCentre.y, { absolute: near })
      // a closed tube of circles does not warp: what is left is measured by the metal's own size
      expect(section.iw).toBeWithin(iw.value, {
        relative: 0.01 + (iw.accept_rel ?? 0),
        absolute: 1e-4 * section.ip * section.area,
      })
    },
  )
})

describe('what the drawings must be told about', () => {
  const codesOf = (file: string) => compute(named(file)).answer.findings.map(({ code }) => code)

  it('p21: layers off and frozen, paper space, kinds without edges, two open centre lines, two pieces', () => {
    expect(codesOf('p21.dxf')).toEqual(expect.arrayContaining(['pieces-not-joined']))
  })

  it('p22: two gaps of 0.004 mm closed near (70, 21.302) and (33, 40), and one chain open near (105, 40)', () => {
    const { findings } = compute(named('p22.dxf')).answer
    const at = (code: string) => findings.filter((finding) => finding.code === code).map((finding) => finding.at)
    expect(at('gap-closed')).toHaveLength(2)
    expect(at('chain-open')).toHaveLength(1)
  })

  it('p23: doubled and overlapping lines and arcs, and a circle drawn twice, are counted once', () => {
    expect(codesOf('p23.dxf')).toEqual(expect.arrayContaining(['edges-doubled']))
  })
})

describe('torsion constants of the references', () => {
  const withTorsion = all.filter(({ torsion_mm }) => torsion_mm)
  it.each(withTorsion.map((reference) => [reference.file, reference] as const))(
    '%s: J lies within its bounds',
    (_, reference) => {
      const { section } = compute(reference).answer
      const { value, accept_rel } = reference.torsion_mm?.j ?? { value: 0, accept_rel: 0 }
      expect(section?.j?.lower).toBeLessThanOrEqual(value * (1 + accept_rel))
      expect(section?.j?.upper).toBeGreaterThanOrEqual(value * (1 - accept_rel))
    },
  )
})
