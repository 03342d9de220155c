import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { SectionAnswer } from '@/lib/api/schemas/section'
import { unpackRegion } from '@/lib/geometry/pack'
import { DEFAULT_RECIPE, type Recipe } from '@/lib/geometry/recipe'
import { buffersOf, previewOf } from '@/lib/jobs/preview'
import type { Stage } from '@/lib/jobs/previewProtocol'
import { createSectionPool, type SectionPool } from '@/lib/jobs/server-pool'
import { createTask, readTask, sectionTask } from '@/lib/jobs/tasks'
import { caseBytes, casePath, references } from '../cases/reference'
import { bundle } from '../support/bundle'
import { circle, drawn as draw, line, read } from '../support/dxf'

const source = (file: string) => ({ name: file, bytes: caseBytes(file).length, sha256: '' })
const compute = (file: string, change: Partial<Recipe> = {}) =>
  sectionTask(readTask(caseBytes(file)), source(file), { ...DEFAULT_RECIPE, ...change }, { al: ALUMINIUM })
const ALUMINIUM = { name: 'aluminium', density: 2700, source: 'EN 1999-1-1, from memory' }
const entities = (text: string) => new TextEncoder().encode(`0\nSECTION\n2\nENTITIES\n${text}0\nENDSEC\n0\nEOF\n`)
const rectangle = (x: number, y: number, w: number, h: number) =>
  line(x, y, x + w, y) + line(x + w, y, x + w, y + h) + line(x + w, y + h, x, y + h) + line(x, y + h, x, y)
const circles = (count: number) =>
  Array.from({ length: count }, (_, k) => `0\nCIRCLE\n8\nA\n10\n${3 * k}.0\n20\n0.0\n40\n1.0\n`).join('')

describe('drawing and recipe to section', () => {
  let pool: SectionPool
  beforeAll(async () => {
    const [child] = await bundle('lib/jobs/section.child.ts', 'lib/jobs/watchdog.ts')
    pool = createSectionPool({ bundle: child, size: 1 })
  })
  afterAll(() => pool.close())

  it.each(references().map((reference) => [reference.file, reference] as const))(
    '%s: the child process gives the same answer and region as this process, to the last bit, and no opinion disagrees',
    async (file, { unit, tolerance, makeUp, layers }) => {
      const recipe: Recipe = { ...DEFAULT_RECIPE, unit: unit.drawing, tolerance, makeUp, layers: layers ?? null }
      const here = compute(file, recipe)
      const there = await pool.run({ path: casePath(file), source: source(file), recipe, materials: {} }, { person: 'ann' })
      if (!there.ok) throw new Error(there.why)
      expect(there.answer).toEqual(here.answer)
      expect(there.region && unpackRegion(there.region).edges.ends).toEqual(here.region?.edges.ends)
      const opinions = await there.opinions
      expect(opinions?.opinions.map(({ library }) => library)).toEqual(['dxf-parser', '@flatten-js/core', 'polygon-clipping'])
      expect(opinions?.opinions.filter(({ agrees }) => agrees === false)).toEqual([])
      expect(opinions?.findings).toEqual([])
    },
  )

  it('the answer fits the schema of the API', () => {
    const { answer } = compute('p21.dxf')
    expect(SectionAnswer.parse(JSON.parse(JSON.stringify(answer)))).toEqual(JSON.parse(JSON.stringify(answer)))
  })

  it('a 60 × 40 rectangle of aluminium has 6.48 kg/m; a material that is not known gives no mass but a finding', () => {
    expect(compute('p01.dxf', { material: 'al' }).answer.section?.mass).toBeWithin(6.48, { relative: 1e-12 })
    const unknown = compute('p01.dxf', { material: 'unobtainium' }).answer
    expect(unknown.section?.mass).toBeUndefined()
    expect(unknown.findings.map(({ code }) => code)).toContain('material-unknown')
  })

  it('a unit other than the declared one is a warning, and so are profiles of 0.06 mm and of 60 m', () => {
    const codes = (file: string, unit: Recipe['unit']) => compute(file, { unit }).answer.findings.map(({ code }) => code)
    expect(codes('p02.dxf', 'in')).toContain('unit-differs')
    expect(codes('p02.dxf', 'mm')).not.toContain('unit-differs')
    expect(codes('p01.dxf', 0.001)).toContain('unit-size')
    expect(codes('p01.dxf', 'm')).toContain('unit-size')
    expect(codes('p01.dxf', 'mm')).not.toContain('unit-size')
  })

  it('scale 2 and shrinkage 1.01 make the mm per unit 2 / 1.01, the area its square', () => {
    const { unit, section } = compute('p01.dxf', { scale: 2, shrinkage: 1.01 }).answer
    expect(unit.mmPerUnit).toBe(2 / 1.01)
    expect(section?.area).toBeWithin(2400 * (2 / 1.01) ** 2, { relative: 1e-12 })
  })

  it('turned by 90°, Ix and Iy change places and the extents turn with it; outlines stay as drawn', () => {
    const upright = compute('p03.dxf').answer
    const turned = compute('p03.dxf', { turn: 90 }).answer
    expect(turned.section?.ix).toBeWithin(upright.section?.iy ?? 0, { relative: 1e-12 })
    expect(turned.section?.extents.maxX).toBe(0 - (upright.section?.extents.minY ?? 0))
    expect(turned.outlines).toEqual(upright.outlines)
  })

  it.each([0, 1e-15])('a tolerance of %d mm joins what rounding joins, and leaves a gap of 0.004 mm open', (tolerance) => {
    const gapped = entities(line(0, 0, 60, 0) + line(60, 0, 60, 40) + line(60, 40, 0, 40) + line(0, 40, 0, 0.004))
    const run = (bytes: Uint8Array) =>
      sectionTask(readTask(bytes), source('p01.dxf'), { ...DEFAULT_RECIPE, tolerance }, {}).answer
    expect(run(entities(rectangle(0, 0, 60, 40))).section?.area).toBe(2400)
    expect(run(gapped).findings.map(({ code }) => code)).toContain('chain-open')
  })

  it('lists 2,000 of 2,100 outlines and counts them all', () => {
    const drawing = readTask(entities(circles(2100)))
    const { answer } = sectionTask(drawing, source('p01.dxf'), DEFAULT_RECIPE, {})
    expect([answer.outlines.length, answer.outlinesTotal]).toEqual([2000, 2100])
    expect(answer.section?.area).toBeWithin(2100 * Math.PI, { relative: 1e-12 })
  })

  it('a drawing without outlines gives no section but says what is missing', () => {
    const { answer, region } = sectionTask(readTask(entities('')), source('p01.dxf'), DEFAULT_RECIPE, {})
    expect([answer.section, region]).toEqual([null, null])
    expect(answer.findings.some(({ severity }) => severity === 'error')).toBe(true)
  })

  it.each([
    ['this is no drawing', ['file-not-dxf']],
    [draw(''), ['nothing-drawn']],
    [draw(circle(0, 0, -1)), ['radius-bad']],
    [draw(line(0, 0, 1, 0)), ['outlines-none']],
  ])('one error says why there is no outline in drawing %#', (text, errors) => {
    const { findings } = sectionTask(read(text), source('p01.dxf'), DEFAULT_RECIPE, {}).answer
    expect(findings.flatMap(({ code, severity }) => (severity === 'error' ? [code] : []))).toEqual(errors)
  })

  it('a gap closed at a corner says what a straight edge would change there: ΔA = ∓0.125 mm², ΔIx and ΔIy with it', () => {
    const cutCorner = (x: number, y: number, w: number, h: number) =>
      line(x, y, x + w - 0.5, y) + line(x + w, y + 0.5, x + w, y + h) + line(x + w, y + h, x, y + h) + line(x, y + h, x, y)
    const gapIn = (entities: string) => {
      const { section, findings } = sectionTask(
        read(draw(entities)),
        source('p01.dxf'),
        { ...DEFAULT_RECIPE, tolerance: 1 },
        {},
      ).answer
      const gap = findings.find(({ code }) => code === 'gap-closed')
      return {
        params: gap?.params,
        message: gap?.message,
        dIx: 0.125 * (0.25 - (section?.centroid.y ?? 0)) ** 2,
        dIy: 0.125 * (59.75 - 30) ** 2,
      }
    }
    const outer = gapIn(cutCorner(0, 0, 60, 40))
    expect(outer.params?.area).toBeWithin(-0.125, { relative: 1e-12 })
    expect(outer.params?.dIx).toBeWithin(-outer.dIx, { relative: 1e-12 })
    expect(outer.params?.dIy).toBeWithin(-outer.dIy, { relative: 1e-12 })
    expect(outer.message).toContain('the area by -0.125 mm², Ix by -48.7578 mm⁴ and Iy by -110.633 mm⁴')
    const hole = gapIn(rectangle(-10, -10, 80, 60) + cutCorner(0, 0, 60, 40))
    expect(hole.params?.area).toBeWithin(0.125, { relative: 1e-12 })
    expect(hole.params?.dIx).toBeWithin(hole.dIx, { relative: 1e-12 })
  })
})

describe('one drawing, one recipe after another', () => {
  it('a change of make-up chains nothing again, a change of tolerance does', () => {
    const task = createTask(readTask(caseBytes('p19.dxf')), source('p19.dxf'))
    const first = task.run(DEFAULT_RECIPE, {})
    const madeUp = task.run({ ...DEFAULT_RECIPE, makeUp: [{ at: [0, 25], does: 'add' }] }, {})
    expect(madeUp.outlines).toBe(first.outlines)
    expect(madeUp.answer.section?.pieces).toBe(1)
    expect(task.run({ ...DEFAULT_RECIPE, tolerance: 0.02 }, {}).outlines).not.toBe(first.outlines)
  })

  it('what the page gets is cut to length, and handing it over leaves the task whole', () => {
    const task = createTask(readTask(caseBytes('p10.dxf')), source('p10.dxf'))
    const stages: Stage[] = []
    const run = () => previewOf(task, DEFAULT_RECIPE, {}, (stage) => stages.push(stage))
    const first = run()
    expect(stages).toEqual(['chain', 'combine', 'figures'])
    expect(first.outlines.edges.ends).toHaveLength(4 * first.outlines.edges.count)
    const moved = structuredClone(first, { transfer: buffersOf(first) })
    expect(first.outlines.edges.ends).toHaveLength(0)
    expect(run()).toEqual(moved)
  })
})
