import { describe, expect, it } from 'vitest'
import { type EdgeTable, emptyTable, pushArc, pushBezier, pushEllipse } from '@/lib/geometry/edges'
import { outlinesOf } from '@/lib/geometry/outlines'
import type { OutlineSet } from '@/lib/geometry/outlineSet'
import type { Combination } from '@/lib/opinions/combination'
import { flattenOpinion } from '@/lib/opinions/flatten'
import { polygonClippingOpinion } from '@/lib/opinions/polygonClipping'
import { pushLoop, type Vertex } from '../support/region'

const TOLERANCES = { lastDigit: 0, chaining: 0.01, duplicate: 1e-6, snap: 1e-7 }

function outlines(...push: ((table: EdgeTable) => void)[]): OutlineSet {
  const table = emptyTable()
  push.forEach((each, k) => {
    const before = table.count
    each(table)
    // edges of one entity that close are one outline, whatever touches it
    table.source.fill(k, before, table.count)
  })
  const take = Uint32Array.from({ length: table.count }, (_, i) => i)
  return outlinesOf(table, take, TOLERANCES, { arcs: [], mmPerUnit: 1 })
}

const loop =
  (...vertices: Vertex[]) =>
  (table: EdgeTable) =>
    pushLoop(table, vertices)
const rectangle = (x0: number, y0: number, x1: number, y1: number) => loop([x0, y0], [x1, y0], [x1, y1], [x0, y1])
const circle = (x: number, y: number, r: number) => (table: EdgeTable) => {
  pushArc(table, x + r, y, x + r, y, x, y, r, 0, 2 * Math.PI, 0)
}
const ellipse = (x: number, y: number, a: number, b: number) => (table: EdgeTable) => {
  pushEllipse(table, x + a, y, x + a, y, x, y, a, 0, 0, b, 0, 2 * Math.PI, 0)
}

/** In the order of the areas, greatest first, so that a step can be named by its place. */
function combination(set: OutlineSet, does: ('add' | 'cut' | 'common')[], area: number): Combination {
  const order = [...set.area.keys()].sort((a, b) => set.area[b] - set.area[a])
  return { outlines: set, steps: does.map((each, k) => ({ outline: order[k], does: each })), area }
}

describe('areas combined again by other libraries', () => {
  const plate = outlines(rectangle(0, 0, 60, 40), circle(20, 20, 8))
  const exact = 2400 - 64 * Math.PI

  it('both agree that a 60 × 40 plate with a hole of radius 8 has 2400 − 64π', () => {
    const question = combination(plate, ['add', 'cut'], exact)
    expect(flattenOpinion(question).agrees).toBe(true)
    expect(polygonClippingOpinion(question).agrees).toBe(true)
  })

  it('an area wrong by 1e-7 of itself is seen with arcs kept, by 1 % on chords too', () => {
    expect(flattenOpinion(combination(plate, ['add', 'cut'], exact * (1 + 1e-7))).agrees).toBe(false)
    const wrong = polygonClippingOpinion(combination(plate, ['add', 'cut'], exact * 1.01))
    expect(wrong.agrees).toBe(false)
    expect(wrong.sentence).toContain('and not')
  })

  it('an arc whose extreme point falls on a vertex of the other outline adds nothing twice', () => {
    // 24 × 24 plate with a half-disc bump of radius 3 whose foot is at (12, 4); the circle about (9, 4) lies in the plate
    const bumped = outlines(loop([-12, -12], [12, -12], [12, 4, 1], [12, 10], [12, 12], [-12, 12]), circle(9, 4, 3))
    const plateAlone = 24 * 24 + (9 * Math.PI) / 2
    expect(flattenOpinion(combination(bumped, ['add', 'add'], plateAlone)).agrees).toBe(true)
  })

  it('plates that share an edge, then kept in common with a circle', () => {
    const set = outlines(rectangle(0, 0, 30, 20), rectangle(30, 0, 50, 20), circle(30, 10, 5))
    const question = combination(set, ['add', 'add', 'common'], 25 * Math.PI)
    expect(flattenOpinion(question).agrees).toBe(true)
    expect(polygonClippingOpinion(question).agrees).toBe(true)
  })

  it('ellipses and splines are put to the chords only', () => {
    const spline = (table: EdgeTable) => {
      pushBezier(table, 2, false, [-3, 0, 1, 0, 6, 1, 3, 0, 1], 0)
      pushBezier(table, 2, false, [3, 0, 1, 0, -6, 1, -3, 0, 1], 0)
    }
    // a parabola's segment is two thirds of its box: 2 × ⅔ × 6 × 3
    const question = combination(outlines(ellipse(0, 0, 20, 10), spline), ['add', 'cut'], 200 * Math.PI - 24)
    expect(flattenOpinion(question)).toMatchObject({ agrees: null, sentence: expect.stringContaining('lines and circular arcs') })
    expect(polygonClippingOpinion(question).agrees).toBe(true)
  })

  it('nothing to combine is said, not agreed to', () => {
    expect(flattenOpinion({ outlines: plate, steps: [], area: 0 }).agrees).toBeNull()
    expect(polygonClippingOpinion({ outlines: plate, steps: [], area: 0 }).agrees).toBeNull()
  })
})
