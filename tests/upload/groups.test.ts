import { readFileSync } from 'node:fs'
import { expect, test } from 'vitest'
import { outlinesWithin } from '@/components/board/hit'
import { blocksOf, detailAt, detailsOf, likelyFrame, partOf } from '@/components/upload/flow/groups'
import { referencesOf } from '@/components/upload/flow/references'
import { previewModel } from '@/components/upload/previewModel'
import { DEFAULT_RECIPE, type Recipe } from '@/lib/geometry/recipe'
import { previewOf } from '@/lib/jobs/preview'
import type { PreviewResult } from '@/lib/jobs/previewProtocol'
import { createTask, readTask } from '@/lib/jobs/tasks'
import { facadeSheet } from './sheet'

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

test('a window round the largest detail takes its outlines and no other, also on a board turned by 30°', () => {
  const members = details[0].members.map((k) => `o${k + 1}`)
  const { outlines } = previewModel(preview({ turn: 30 }))
  const boxes = outlines.filter(({ id }) => members.includes(id)).map(({ box }) => box)
  const [minX, minY] = [Math.min(...boxes.map((box) => box.minX)) - 1, Math.min(...boxes.map((box) => box.minY)) - 1]
  const [maxX, maxY] = [Math.max(...boxes.map((box) => box.maxX)) + 1, Math.max(...boxes.map((box) => box.maxY)) + 1]
  const taken = outlinesWithin(outlines, { x: maxX, y: minY }, { x: minX, y: maxY }).map(({ id }) => id)
  expect(taken).toEqual(members)
  expect(partOf(whole, taken)).toEqual(details[0].part)
})

const sheet = Buffer.from(facadeSheet())
const sheetTask = createTask(readTask(sheet), { name: 'sheet.dxf', bytes: sheet.length, sha256: '' })
const sheetPreview = (part: Recipe['part'] = null) => previewOf(sheetTask, { ...DEFAULT_RECIPE, part }, {}, () => {})

test('a sheet of 20 profiles, 600 inserts and 300 dimensions offers the blocks TUBE, placed 5 times, and BOLT, 195 times', () => {
  const result = sheetPreview()
  expect(result.drawing.ignored).toMatchObject({ TEXT: 400, DIMENSION: 300 })
  expect(
    detailsOf(result)
      .slice(0, 20)
      .every(({ members }) => members.length === 2),
  ).toBe(true)
  const blocks = blocksOf(result).map(({ name, times, part }) => [name, times, part.length])
  expect(blocks).toEqual([
    ['TUBE', 5, 2],
    ['BOLT', 195, 1],
  ])
})

test('the block TUBE taken is one tube of 50 × 30 × 3 mm: A 444 mm²', () => {
  const [block] = blocksOf(sheetPreview())
  expect(sheetPreview(block.part).answer.section?.area).toBeWithin(50 * 30 - 44 * 24, { relative: 1e-12 })
})

test('the 300 equal dimensions of the sheet are offered once, and only beside what is taken', () => {
  const drawn = (result: PreviewResult) => referencesOf(result, null).filter(({ by }) => by === 'drawn')
  const whole = sheetPreview()
  expect(drawn(whole).map(({ name }) => name)).toEqual(['drawn dimension 60'])
  const [first] = detailsOf(whole)
  expect(drawn(sheetPreview(first.part))).toHaveLength(1)
  const bolt = detailsOf(whole).at(-1)
  expect(drawn(sheetPreview(bolt?.part ?? []))).toHaveLength(0)
})

const rail = readFileSync('fixtures/demo/guide-rail.dxf')
const railTask = createTask(readTask(rail), { name: 'guide-rail.dxf', bytes: rail.length, sha256: '' })

test('the domed back of the guide rail, 24 chords, is offered as an arc of R 18 with what it changes in A and I', () => {
  const asDrawn = previewOf(railTask, DEFAULT_RECIPE, {}, () => {})
  const [offer] = asDrawn.outlines.arcOffers
  expect([offer.chords, offer.radius]).toEqual([24, 18])
  const taken = previewOf(railTask, { ...DEFAULT_RECIPE, arcs: [offer.run] }, {}, () => {})
  const [before, after] = [asDrawn.answer.section, taken.answer.section]
  if (!before || !after) throw new Error('no section')
  // the drawing's vertices are rounded, and the offer is to first order
  expect(offer.dArea).toBeWithin(after.area - before.area, { relative: 1e-4 })
  expect(offer.dIx).toBeWithin(after.ix - before.ix, { relative: 2e-3 })
  expect(offer.dIy).toBeWithin(after.iy - before.iy, { relative: 2e-3 })
})
