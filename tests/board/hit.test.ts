import { expect, test } from 'vitest'
import { markAt, outlineAt } from '@/components/board/hit'
import { regionModel } from '@/components/board/regionModel'
import { answerWith } from './answer'
import { plateWithHole } from './shapes'

const answer = answerWith(plateWithHole(), [
  { id: 'o1', at: [10, 40] },
  { id: 'o2', at: [38, 40] },
])
const { outlines } = regionModel(plateWithHole(), answer)
const idAt = (x: number, y: number, reach = 1) => outlineAt(outlines, { x, y }, reach)?.id ?? null

test('within reach of an edge the nearest outline is picked, from either side', () => {
  expect(idAt(10.4, 30)).toBe('o1')
  expect(idAt(9.4, 30)).toBe('o1')
  expect(idAt(30, 48.6)).toBe('o2')
  expect(idAt(30, 47.2)).toBe('o2')
})

test('away from edges the smallest outline around the point is picked', () => {
  expect(idAt(30, 40)).toBe('o2')
  expect(idAt(60, 30)).toBe('o1')
})

test('outside of everything nothing is picked', () => {
  expect(idAt(5, 5)).toBe(null)
  expect(idAt(72, 40)).toBe(null)
})

test('an outline whose named point lies 30 mm away is not taken for the loop', () => {
  const strayed = regionModel(plateWithHole(), answerWith(plateWithHole(), [{ id: 'o9', at: [40, 90] }]))
  expect(strayed.outlines.map(({ id }) => id)).toEqual(['loop 1', 'loop 2'])
})

test('a finding is picked at its middle and on its ring of 50 px, not between, the smaller of two', () => {
  const view = { scale: 1, x: 0, y: 0 }
  const mark = (index: number, size: number) => ({ index, severity: 'note', at: { x: 100, y: -100 }, size, message: '' }) as const
  const at = (x: number, marks = [mark(0, 100)]) => markAt(marks, { x, y: 100 }, view)?.index ?? null
  expect([at(104), at(151), at(130), at(170)]).toEqual([0, 0, null, null])
  expect(at(100, [mark(0, 100), mark(1, 10)])).toBe(1)
})
