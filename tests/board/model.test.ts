import { expect, test } from 'vitest'
import { boxOfRegion, marksOf, placeInSection, regionModel } from '@/components/board/regionModel'
import { DEFAULT_RECIPE } from '@/lib/geometry/recipe'
import { answerWith } from './answer'
import { plateWithHole } from './shapes'

test('the extents of a plate from (10, 20) are 60 × 40 mm, its arc included', () => {
  expect(boxOfRegion(plateWithHole())).toEqual({ minX: 10, minY: 20, maxX: 70, maxY: 60 })
})

test('outer loops and holes are told apart, and both make the metal', () => {
  const { outer, inner, metal } = regionModel(plateWithHole(), answerWith(plateWithHole()))
  expect(outer.match(/M/g)).toHaveLength(1)
  expect(inner).toContain('A8 8')
  expect(metal.match(/M/g)).toHaveLength(2)
})

test('a place in inches, turned by 90°, lies in the section at (−25.4 y, 25.4 x) mm', () => {
  const recipe = { ...DEFAULT_RECIPE, unit: 'in' as const, turn: 90 }
  const { x, y } = placeInSection([2, 1], { recipe })
  expect(x).toBeWithin(-25.4, { relative: 1e-12 })
  expect(y).toBeWithin(50.8, { relative: 1e-12 })
})

test('a finding without a place has no mark; one with a place keeps its number in the list', () => {
  const finding = { code: 'gap', severity: 'warning' as const, message: 'A gap was closed.', params: {} }
  const marks = marksOf([finding, { ...finding, at: [1, 2], size: 0.5 }], { recipe: { ...DEFAULT_RECIPE, unit: 'cm' } })
  expect(marks).toEqual([{ index: 1, severity: 'warning', message: 'A gap was closed.', at: { x: 10, y: 20 }, size: 5 }])
})
