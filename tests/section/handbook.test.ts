import { readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, test } from 'vitest'
import { sectionOf } from '@/lib/section/section'
import type { Section } from '@/lib/section/types'
import { hole, outer, regionOfLoops, type Vertex } from '@/tests/support/region'

interface Printed {
  unit: string
  printed: number
  last_digit: number
  use: boolean
  use_tol?: number
}
interface Row {
  id: string
  material: 'steel' | 'aluminium'
  source: { publication: string }
  outline: { role: 'outer' | 'hole'; vertices: Vertex[] }[]
  computed_mm: Record<string, number> & { bounds: [number, number, number, number] }
  values: Record<string, Printed>
}

const { rows } = JSON.parse(readFileSync(path.join(import.meta.dirname, '../../fixtures/handbook/sections.json'), 'utf8')) as {
  rows: Row[]
}

function sectionFor({ outline }: Row): Section {
  const loops = outline.map(({ role, vertices }) => (role === 'outer' ? outer(vertices) : hole(vertices)))
  const { section } = sectionOf(regionOfLoops(loops), { lastDigit: 0, repairs: [] })
  if (!section) throw new Error('no section')
  return section
}

/** Figures under the names of the tables, in mm. Equal angles have their symmetry axis along axis 1. */
function tableFigures(s: Section): Record<string, number> {
  return {
    A: s.area,
    surface: s.perimeter.outer,
    Ix: s.ix,
    Iy: s.iy,
    Ixy: s.ixy,
    Wx: s.elastic.xTop,
    Wy: s.elastic.yRight,
    Wplx: s.plastic.x,
    Wply: s.plastic.y,
    ix: s.rx,
    iy: s.ry,
    Iu: s.i1,
    Iv: s.i2,
    iu: s.r1,
    iv: s.r2,
    xc: s.centroid.x,
    v: s.i1 / (s.elastic.axis1Left ?? Number.NaN),
    u1: s.i2 / (s.elastic.axis2Left ?? Number.NaN),
    u2: s.i2 / (s.elastic.axis2Right ?? Number.NaN),
  }
}

const UNIT_MM: Record<string, number> = {
  'm2/m': 1000,
  cm: 10,
  cm2: 10 ** 2,
  cm3: 10 ** 3,
  cm4: 10 ** 4,
  in: 25.4,
  in2: 25.4 ** 2,
  in3: 25.4 ** 3,
  in4: 25.4 ** 4,
}

/** 7850 kg/m³; in lb/ft 490 lb/ft³ for steel and 0.098 lb/in³ for aluminium, as the tables count. */
function massIn(unit: string, area: number, material: Row['material']): number {
  if (unit === 'kg/m') return area * 7850e-6
  const squareInches = area / 25.4 ** 2
  return material === 'steel' ? (squareInches / 144) * 490 : squareInches * 12 * 0.098
}

const LATER = new Set(['J', 'Iw', 'Ct', 'shear_centre_to_centroid'])

// Each row names its publication: ArcelorMittal catalogue, EN 10210-2, EN 10219-2, AISC Shapes Database, Aluminum Association
describe('printed section tables', () => {
  test.each(rows.map((row) => [row.id, row] as const))('%s: every figure rounds to the printed one', (_, row) => {
    const section = sectionFor(row)
    const figures = tableFigures(section)
    for (const [name, { unit, printed, last_digit, use, use_tol }] of Object.entries(row.values)) {
      if (!use || LATER.has(name)) continue
      const own = name === 'mass' ? massIn(unit, section.area, row.material) : figures[name] / UNIT_MM[unit]
      expect(use_tol, name).toBeUndefined()
      expect(own, `${name} of ${row.id}`).toBeWithin(printed, { absolute: last_digit * (1 + 1e-9) })
    }
  })

  test('840 printed figures are compared', () => {
    const used = rows.flatMap(({ values }) => Object.entries(values)).filter(([name, { use }]) => use && !LATER.has(name))
    expect(used.length).toBe(840)
  })

  test.each(rows.map((row) => [row.id, row] as const))('%s: exact figures agree with another program to 1e-9', (_, row) => {
    const s = sectionFor(row)
    const c = row.computed_mm
    const relative = 1e-9
    const size = s.circle.radius
    expect(s.area).toBeWithin(c.A, { relative })
    expect(s.centroid.x).toBeWithin(c.xc, { absolute: relative * size })
    expect(s.centroid.y).toBeWithin(c.yc, { absolute: relative * size })
    expect(s.ix).toBeWithin(c.Ix, { relative })
    expect(s.iy).toBeWithin(c.Iy, { relative })
    expect(s.ixy).toBeWithin(c.Ixy, { absolute: relative * s.ip })
    expect(s.i1).toBeWithin(c.Iu, { relative })
    expect(s.i2).toBeWithin(c.Iv, { relative })
    expect(s.rx).toBeWithin(c.ix, { relative })
    expect(s.ry).toBeWithin(c.iy, { relative })
    expect(s.r1).toBeWithin(c.iu, { relative })
    expect(s.r2).toBeWithin(c.iv, { relative })
    if (c.alpha_deg === null) expect(s.theta).toBeNull()
    else expect(s.theta).toBeWithin(c.alpha_deg, { absolute: 1e-7 })
    expect(s.elastic.xTop).toBeWithin(c.Wx_top, { relative })
    expect(s.elastic.xBottom).toBeWithin(c.Wx_bot, { relative })
    expect(s.elastic.yRight).toBeWithin(c.Wy_right, { relative })
    expect(s.elastic.yLeft).toBeWithin(c.Wy_left, { relative })
    expect(s.plastic.x).toBeWithin(c.Wplx, { relative })
    expect(s.plastic.y).toBeWithin(c.Wply, { relative })
    expect(s.centroid.y + s.plastic.at.x).toBeWithin(c.y_plastic, { absolute: relative * size })
    expect(s.centroid.x + s.plastic.at.y).toBeWithin(c.x_plastic, { absolute: relative * size })
    expect(s.perimeter.outer).toBeWithin(c.perimeter_outer, { relative })
    if (c.perimeter_inner !== undefined) expect(s.perimeter.inner).toBeWithin(c.perimeter_inner, { relative })
    const { minX, minY, maxX, maxY } = s.extents
    for (const [k, value] of [minX, minY, maxX, maxY].entries()) {
      expect(value).toBeWithin(c.bounds[k], { absolute: relative * size })
    }
  })
})
