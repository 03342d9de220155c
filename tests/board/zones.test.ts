import { expect, test } from 'vitest'
import { fitView } from '@/components/board/view'
import { sheetAround, zoneMarks, zoneOf } from '@/components/board/zones'

const tall = { minX: -25, minY: 0, maxX: 60, maxY: 118 }

test('an 85 × 118 mm profile lies on a sheet of 3 × 4 zones with an eighth of margin', () => {
  const sheet = sheetAround(tall)
  expect([sheet.columns, sheet.rows]).toEqual([3, 4])
  expect(sheet.box.minY).toBe(-118 / 8)
  expect(sheet.box.maxY).toBe(118 + 118 / 8)
})

test('letters run from the top, figures from the left (ISO 5457)', () => {
  const sheet = sheetAround(tall)
  expect(zoneOf(sheet, { x: sheet.box.minX + 1, y: sheet.box.maxY - 1 })).toBe('A1')
  expect(zoneOf(sheet, { x: sheet.box.maxX - 1, y: sheet.box.minY + 1 })).toBe('D3')
  expect(zoneOf(sheet, { x: 38, y: 90 })).toBe('B3')
})

test('a place beyond the sheet belongs to the zone at its edge', () => {
  const sheet = sheetAround(tall)
  expect(zoneOf(sheet, { x: 1e6, y: 1e6 })).toBe('A3')
  expect(zoneOf(sheet, { x: -1e6, y: -1e6 })).toBe('D1')
})

test('the zone of a place stays when the view is moved and zoomed; only its mark moves', () => {
  const sheet = sheetAround(tall)
  const viewport = { width: 900, height: 620 }
  const view = fitView(tall, viewport, { top: 60, right: 60, bottom: 60, left: 60 })
  const before = zoneMarks(sheet, view, viewport).columns
  const after = zoneMarks(sheet, { ...view, x: view.x + 20 }, viewport).columns
  expect(after.map(({ text }) => text)).toEqual(['1', '2', '3'])
  expect((after[0].end ?? 0) - (before[0].end ?? 0)).toBeWithin(20, { absolute: 1e-9 })
})

test('a zone out of view has no mark, and a zone that fills the board is named once in its middle', () => {
  const sheet = sheetAround(tall)
  const viewport = { width: 800, height: 600 }
  const inMiddle = { scale: 200, x: 400 - 200 * 17.5, y: 300 + 200 * 20 }
  const { columns } = zoneMarks(sheet, inMiddle, viewport)
  expect(columns.map(({ at }) => at)).toEqual([null, 400, null])
})
