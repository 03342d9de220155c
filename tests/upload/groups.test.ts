import { readFileSync } from 'node:fs'
import { expect, test } from 'vitest'
import { detailAt, detailsOf, likelyFrame, partInWindow } from '@/components/upload/flow/groups'
import { placeInDrawing } from '@/components/upload/flow/window'
import { DEFAULT_RECIPE, type Recipe } from '@/lib/geometry/recipe'
import { previewOf } from '@/lib/jobs/preview'
import { createTask, readTask } from '@/lib/jobs/tasks'

const bytes = readFileSync('fixtures/demo/facade-sheet.dxf')
const task = createTask(readTask(bytes), { name: 'facade-sheet.dxf', bytes: bytes.length, sha256: '' })
const preview = (change: Partial<Recipe> = {}) => previewOf(task, { ...DEFAULT_RECIPE, ...change }, {}, () => {})
const whole = preview()
const frame = likelyFrame(whole)
const details = detailsOf(whole, frame ? [frame.at] : [])

test('the façade sheet without its frame is 4 details: the title block 120 × 30 mm, a mullion 60 × 118 mm, an angle, a tube', () => {
  const sizes = details.map(({ width, height }) => `${Math.round(width)} × ${Math.round(height)}`)
  expect(sizes).toEqual(['120 × 30', '60 × 118', '60 × 60', '50 × 50'])
  expect(details.every(({ taken }) => !taken)).toBe(true)
})

test('taking the tube of the sheet gives the area of a ring 50 mm over all, and marks that detail alone as taken', () => {
  const tube = details.find(({ members, width, height }) => members.length === 2 && Math.abs(width - height) < 1e-9)
  const result = preview({ part: tube?.part ?? [] })
  const again = detailsOf(result, frame ? [frame.at] : [])
  expect(again.filter(({ taken }) => taken)).toHaveLength(1)
  expect(result.answer.section?.area).toBeWithin((Math.PI / 4) * (50 ** 2 - 44 ** 2), { relative: 1e-12 })
})

test('an outline picked on the board belongs to the detail that holds it', () => {
  for (const detail of details) for (const k of detail.members) expect(detailAt(details, k)).toBe(detail)
})

test('a window round the largest detail takes its outlines and no other', () => {
  const [{ at, width, height, members }] = details
  const corner = (sign: number): [number, number] => [at[0] + sign * (width / 2 + 1), at[1] + sign * (height / 2 + 1)]
  expect(partInWindow(whole, corner(-1), corner(1))).toHaveLength(members.length)
})

test('a place on the board turned by 90° and read in inches goes back to its drawing units', () => {
  const [x, y] = placeInDrawing({ x: -25.4, y: 50.8 }, { ...DEFAULT_RECIPE, unit: 'in', turn: 90 })
  expect(x).toBeWithin(2, { absolute: 1e-12 })
  expect(y).toBeWithin(1, { absolute: 1e-12 })
})
