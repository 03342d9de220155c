import { expect, test } from 'vitest'
import { DEFAULT_RECIPE, type Recipe } from '@/lib/geometry/recipe'
import { sectionTask } from '@/lib/jobs/tasks'
import { drawn, line, read } from '../support/dxf'

const closed = (...points: [number, number][]) =>
  points.map(([x, y], i) => line(x, y, ...points[(i + 1) % points.length])).join('')
const answer = (entities: string, recipe: Partial<Recipe> = {}) =>
  sectionTask(read(drawn(entities)), { name: 'narrow.dxf', bytes: 0, sha256: '' }, { ...DEFAULT_RECIPE, ...recipe }, {})

/** a tube of 100 × 50 × 5, slit by 5 µm in its upper wall */
const slit = closed(
  [0, 0],
  [100, 0],
  [100, 50],
  [50.005, 50],
  [50.005, 45],
  [95, 45],
  [95, 5],
  [5, 5],
  [5, 45],
  [50, 45],
  [50, 50],
  [0, 50],
)
/** the same closed */
const whole = closed([0, 0], [100, 0], [100, 50], [0, 50]) + closed([5, 5], [95, 5], [95, 45], [5, 45])

test('a slit of 5 µm in a tube says J open and J closed, 115 times as much; a person closes it in the recipe', () => {
  const open = answer(slit).answer
  const tube = answer(whole).answer.section
  const { params, message, at } = open.findings.find(({ code }) => code === 'slit') ?? {}
  expect(params?.j).toBe(open.section?.j?.value)
  expect(params?.jOther).toBeWithin(tube?.j?.value ?? 0, { relative: 1e-6 })
  expect(message).toContain('J = 11720 mm⁴; closed, J = 1353000 mm⁴')
  const asked = answer(slit, { bonds: [{ at: at ?? [0, 0], is: 'metal' }] })
  const { section, findings } = asked.answer
  expect(section?.area).toBeWithin(1400, { relative: 1e-10 })
  expect(section?.ix).toBeWithin(tube?.ix ?? 0, { relative: 1e-10 })
  expect(section?.j?.value).toBeWithin(tube?.j?.value ?? 0, { relative: 1e-6 })
  expect(findings.map(({ code }) => code)).toEqual(['gap-answered', 'narrow-changed'])
  expect(findings[1].params.area).toBeWithin(0.025, { relative: 1e-6 })
  // the other libraries are asked about the outlines as drawn
  expect(asked.combination?.area).toBeWithin(1399.975, { relative: 1e-10 })
})

test('a seam of 30 µm says J with and without it; cut by a person, the tube is open', () => {
  const seam =
    closed([0, 0], [100, 0], [100, 50], [0, 50]) +
    closed([5, 5], [95, 5], [95, 45], [50.2, 45], [50.2, 49.97], [50, 49.97], [50, 45], [5, 45])
  const drawnSo = answer(seam).answer
  const { params, at } = drawnSo.findings.find(({ code }) => code === 'wall-thin') ?? {}
  expect(params?.j).toBe(drawnSo.section?.j?.value)
  const { section, findings } = answer(seam, { bonds: [{ at: at ?? [0, 0], is: 'void' }] }).answer
  expect(section?.area).toBeWithin(1399, { relative: 1e-9 })
  expect(section?.j?.value).toBeWithin(Number(params?.jOther), { relative: 1e-6 })
  expect(Number(params?.j) / Number(params?.jOther)).toBeGreaterThan(1.1)
  expect(findings.map(({ code }) => code)).toEqual(['wall-answered', 'narrow-changed'])
})

test('two bars 0.02 mm apart are two pieces until a person says that they are bonded; in contact they stay two', () => {
  const bars = closed([0, 0], [60, 0], [60, 40], [0, 40]) + closed([60.02, 0], [120.02, 0], [120.02, 40], [60.02, 40])
  const pieces = (is?: 'bonded' | 'contact') => answer(bars, { bonds: is ? [{ at: [60.01, 20], is }] : [] }).answer.section
  expect(pieces()?.pieces).toBe(2)
  expect(pieces('contact')?.area).toBe(4800)
  expect(pieces('contact')?.shearCentre).toBeUndefined()
  expect(pieces('bonded')?.pieces).toBe(1)
  expect(pieces('bonded')?.area).toBeWithin(4800.8, { relative: 1e-10 })
  expect(pieces('bonded')?.shearCentre?.x).toBeWithin(60.01, { absolute: 0.01 })
})
