import { readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, it } from 'vitest'
import { DEFAULT_RECIPE, type Recipe } from '@/lib/geometry/recipe'
import { readTask, sectionTask } from '@/lib/jobs/tasks'
import type { Section, SectionAnswer } from '@/lib/section/types'

interface Value {
  area?: number
  centroid?: [number, number]
  ix?: number
  iy?: number
  ixy?: number
  i1?: number
  i2?: number
  theta?: number | null
  outer?: number
  inner?: number
  pieces?: number
}

interface Workshop {
  file: string
  title: string
  recipe?: Partial<Recipe>
  expect: 'section' | 'finding'
  value?: Value
  tolerance?: number
  /** codes of all warnings and errors, each once, sorted */
  codes: string[]
}

const FOLDER = path.resolve(import.meta.dirname, '../../fixtures/workshop')
const drawings: Workshop[] = JSON.parse(readFileSync(path.join(FOLDER, 'expected.json'), 'utf8'))

function answerTo({ file, recipe }: Workshop): SectionAnswer {
  const bytes = readFileSync(path.join(FOLDER, file))
  return sectionTask(readTask(bytes), { name: file, bytes: bytes.length, sha256: '' }, { ...DEFAULT_RECIPE, ...recipe }, {})
    .answer
}

/** Figures further from the expected value than the tolerance × their scale. */
function wrong(section: Section, value: Value, tolerance: number): string[] {
  const { area, ix, iy, ixy, i1, i2, perimeter, centroid, circle, pieces } = section
  const found: string[] = []
  const check = (name: string, got: number, wanted: number | undefined, scale: number) => {
    if (wanted !== undefined && !(Math.abs(got - wanted) <= tolerance * scale))
      found.push(`${name}: got ${got}, wanted ${wanted}`)
  }
  check('area', area, value.area, area)
  check('centroid.x', centroid.x, value.centroid?.[0], circle.radius)
  check('centroid.y', centroid.y, value.centroid?.[1], circle.radius)
  check('ix', ix, value.ix, ix)
  check('iy', iy, value.iy, iy)
  check('ixy', ixy, value.ixy, ix + iy)
  check('i1', i1, value.i1, i1)
  check('i2', i2, value.i2, i2)
  check('outer', perimeter.outer, value.outer, perimeter.outer)
  check('inner', perimeter.inner, value.inner, perimeter.outer)
  check('pieces', pieces, value.pieces, 0)
  return found
}

/** Axes have no sense: angles are compared modulo 180°. */
const between = (a: number, b: number) => Math.abs(((((a - b + 90) % 180) + 180) % 180) - 90)

describe('drawings as workshops have them, with values of another program or in closed form', () => {
  it.each(drawings.map((drawing) => [drawing.title, drawing.file, drawing] as const))('%s (%s)', (_, __, drawing) => {
    const { section, findings } = answerTo(drawing)
    const codes = findings.filter(({ severity }) => severity !== 'note').map(({ code }) => code)
    expect([...new Set(codes)].sort()).toEqual(drawing.codes)
    const { value, tolerance = 0 } = drawing
    if (!value || !section) {
      expect(section === null).toBe(drawing.expect === 'finding')
      return
    }
    expect(wrong(section, value, tolerance)).toEqual([])
    if (value.theta === undefined) return
    if (value.theta === null || section.theta === null) expect(section.theta).toBe(value.theta)
    else expect(between(section.theta, value.theta)).toBeWithin(0, { absolute: 1e-3 })
  })
})
