import { readFileSync } from 'node:fs'
import path from 'node:path'
import { expect, type Page, test } from '@playwright/test'
import { drawn, line } from '../support/dxf'
import { facadeSheet } from '../upload/sheet'
import { enter, fresh, openJob } from './door'

const figures = (page: Page) => page.getByRole('list', { name: 'Figures as they stand' })
const demo = (name: string) => path.resolve('fixtures/demo', name)
const SHEET = { name: '<img src=x onerror=alert(3)>.dxf', mimeType: 'application/dxf', buffer: Buffer.from(facadeSheet()) }

/** 100 × 50 mm of lines with a partition at x = 40. */
const PARTITIONED = [
  [0, 0, 40, 0],
  [40, 0, 100, 0],
  [100, 0, 100, 50],
  [100, 50, 40, 50],
  [40, 50, 0, 50],
  [0, 50, 0, 0],
  [40, 0, 40, 50],
] as const
const square = (x: number, y: number, side: number) =>
  [
    line(x, y, x + side, y),
    line(x + side, y, x + side, y + side),
    line(x + side, y + side, x, y + side),
    line(x, y + side, x, y),
  ].join('')

async function dropOnJob(page: Page, ...files: Parameters<ReturnType<Page['getByLabel']>['setInputFiles']>): Promise<void> {
  await page.getByRole('link', { name: 'Drop drawings' }).first().click()
  await page.getByLabel('DXF file').setInputFiles(...files)
  await expect(figures(page)).toContainText('mm', { timeout: 20_000 })
}

async function confirm60(page: Page): Promise<void> {
  await page.getByLabel('A dimension you know').selectOption({ label: 'drawn dimension 60' })
  await page.getByRole('button', { name: 'Compare and confirm' }).click()
  await expect(page.getByText('It agrees.')).toBeVisible()
  await page.getByLabel('The finished profile').check()
}

async function open(page: Page, panel: string): Promise<void> {
  await page.locator('summary').filter({ hasText: panel }).click()
}

test.beforeEach(async ({ page }) => {
  page.on('dialog', () => {
    throw new Error('a name from the file was run')
  })
  await enter(page)
  await openJob(page, fresh('Harbour hall'))
})

test('a sheet of 20 profiles gives one by window, by block and by click, and two profiles with the same stored file', async ({
  page,
}) => {
  await dropOnJob(page, SHEET)
  await expect(page.getByText('220 details lie apart.').or(page.getByText('215 details lie apart.'))).toBeVisible()
  await expect(page.getByText(SHEET.name, { exact: true })).toBeVisible()
  await expect(page.getByText('<img src=x onerror=alert(1)>').first()).toBeVisible()

  await page.getByLabel('Or take a block').selectOption('TUBE')
  await expect(figures(page)).toContainText('444.00')
  await page.getByRole('button', { name: 'Undo', exact: true }).click()
  await expect(figures(page)).not.toContainText('444.00')

  const board = page.getByRole('application')
  await page.getByRole('button', { name: 'Window', exact: true }).click()
  await board.scrollIntoViewIfNeeded()
  const box = await board.boundingBox()
  if (!box) throw new Error('no board')
  // the lower left corner of the sheet: the first tube alone
  await page.mouse.move(box.x + 0.03 * box.width, box.y + 0.97 * box.height)
  await page.mouse.down()
  await page.mouse.move(box.x + 0.1 * box.width, box.y + 0.8 * box.height)
  await page.mouse.move(box.x + 0.165 * box.width, box.y + 0.7 * box.height)
  await page.mouse.up()
  await expect(figures(page)).toContainText('384.00')

  await confirm60(page)
  await page.getByLabel('Title of the profile').fill('First tube')
  await page.getByRole('button', { name: 'Save revision' }).click()
  await expect(page.getByText(/Revision A of P-\d+ is saved/)).toBeVisible({ timeout: 30_000 })
  await page.getByRole('button', { name: /^Another profile from this sheet/ }).click()
  await page.getByLabel('Take detail 3', { exact: true }).click()
  await expect(figures(page)).toContainText('392.00')
  await confirm60(page)
  await page.getByLabel('Title of the profile').fill('Third tube')
  await page.getByRole('button', { name: 'Save revision' }).click()
  await expect(page.getByText('The same file is also in')).toBeVisible({ timeout: 30_000 })
})

test('a click on the board takes the detail under it, and a quarter turn makes it upright', async ({ page }) => {
  await dropOnJob(page, demo('facade-sheet.dxf'))
  await page.getByRole('button', { name: 'It is a frame: leave it out' }).click()
  await expect(page.getByText('4 details lie apart.')).toBeVisible()
  await page.getByLabel('Show detail 2', { exact: true }).click()
  // what is shown stands in the middle of the board
  await page.getByRole('application').click()
  await expect(page.getByRole('columnheader', { name: 'Read in mm' }).locator('xpath=ancestor::table')).toContainText(
    '60.00 × 118.0',
  )
  await page.getByRole('button', { name: '↶ 90°' }).click()
  await expect(page.getByRole('columnheader', { name: 'Read in mm' }).locator('xpath=ancestor::table')).toContainText(
    '118.0 × 60.00',
  )
})

test('24 chords are taken as one arc of R 18 and the area grows by 1.45 mm²; declined they stay', async ({ page }) => {
  await dropOnJob(page, demo('guide-rail.dxf'))
  await expect(page.getByText(/24 chords; as an arc ΔA 1\.45/)).toBeVisible()
  await page.getByRole('button', { name: 'Take as arc' }).last().click()
  await expect(figures(page)).toContainText('1828.9')
  await expect(page.getByText('An arc taken for chords')).toBeVisible()
  await page.getByRole('button', { name: 'Undo', exact: true }).click()
  await expect(figures(page)).toContainText('1827.5')
  await page.getByRole('button', { name: 'Keep chords' }).click()
  await expect(page.getByText(/24 chords; as an arc/)).toHaveCount(0)
})

test('layers and line types stand with counts, and a switch changes picture and figures at once', async ({ page }) => {
  await dropOnJob(page, demo('facade-sheet.dxf'))
  await open(page, 'Layers and line types')
  await expect(page.getByLabel(/^PROFILE 6/)).toBeChecked()
  await expect(page.getByText(/No outlines: 1 TEXT, 1 DIMENSION/).first()).toBeVisible()
  const before = (await figures(page).textContent()) ?? ''
  await page.getByLabel(/^SHEET 2/).uncheck()
  await expect(figures(page)).not.toHaveText(before)
  await expect(page.getByText('3 details lie apart.')).toBeVisible()
})

test('a pasted file is taken like a dropped one, and the team that has it already is told where', async ({ page }) => {
  await dropOnJob(page, demo('hinge-leaf.dxf'))
  await page.getByLabel('A dimension you know').selectOption('width')
  const width = await page
    .getByRole('application')
    .getByText(/^\d+(\.\d+)? mm$/)
    .first()
    .textContent()
  await page.getByLabel('Known to be').fill(width ?? '')
  await page.getByRole('button', { name: 'Compare and confirm' }).click()
  await page.getByLabel('The finished profile').check()
  await page.getByRole('button', { name: 'Save revision' }).click()
  await expect(page.getByText(/Revision A of P-\d+ is saved/)).toBeVisible({ timeout: 30_000 })
  await page.reload()
  await expect(page.getByText('Drop one or several DXF files here')).toBeVisible({ timeout: 20_000 })
  await page.evaluate(
    (text) => {
      const clipboardData = new DataTransfer()
      clipboardData.items.add(new File([text], 'pasted.dxf'))
      document.dispatchEvent(new ClipboardEvent('paste', { clipboardData }))
    },
    readFileSync(demo('hinge-leaf.dxf'), 'utf8'),
  )
  await expect(figures(page)).toContainText('A212', { timeout: 20_000 })
  await expect(page.getByText('The team has this file already:')).toBeVisible()
})

test('“metal or void?” is answered on the picture: the chamber is void, the rest of 100 × 50 mm is metal, A 3000 mm²', async ({
  page,
}) => {
  const buffer = Buffer.from(drawn(PARTITIONED.map(([x0, y0, x1, y1]) => line(x0, y0, x1, y1)).join('')))
  await page.getByRole('link', { name: 'Drop drawings' }).first().click()
  await page.getByLabel('DXF file').setInputFiles({ name: 'partition.dxf', mimeType: 'application/dxf', buffer })
  await expect(page.getByText('1 to be solved')).toBeVisible()
  const rings = page
    .getByRole('application')
    .locator('circle')
    .filter({ has: page.locator('title') })
  for (const [place, answer] of [
    ['(15, 25)', 'It is void'],
    ['(70, 30)', 'It is metal'],
  ] as const) {
    const box = await rings.filter({ hasText: place }).boundingBox()
    if (!box) throw new Error(`no ring at ${place}`)
    await page.mouse.click(box.x + box.width / 2, box.y + box.height / 2)
    const asked = page.getByRole('region', { name: 'Board' }).getByRole('status')
    await expect(asked).toContainText(`${place}: metal or void?`)
    await asked.getByRole('button', { name: answer }).click()
    await expect(asked).toHaveCount(0)
  }
  await expect(figures(page)).toContainText('3000')
})

test('a drawing of 100,000 lines shows what is done to it, is cancelled, and goes on when asked', async ({ page }) => {
  const lines = Array.from({ length: 25_000 }, (_, i) => [(i % 250) * 30, Math.floor(i / 250) * 30] as const)
  const buffer = Buffer.from(drawn(lines.map(([x, y]) => square(x, y, 20)).join('')))
  await page.getByRole('link', { name: 'Drop drawings' }).first().click()
  await page.getByLabel('DXF file').setInputFiles({ name: 'large.dxf', mimeType: 'application/dxf', buffer })
  await page.getByRole('button', { name: 'Cancel' }).click({ timeout: 20_000 })
  await expect(page.getByText('Cancelled. What you chose is kept.')).toBeVisible()
  await page.getByRole('button', { name: 'Go on' }).click()
  await expect(figures(page)).toContainText('10\u2009000\u2009000', { timeout: 60_000 })
})

test('Ctrl+S saves nothing before the size is confirmed, and then only the drawing in view', async ({ page }) => {
  await dropOnJob(page, [demo('mullion-60x118.dxf'), demo('cover-cap.dxf')])
  const saves: string[] = []
  page.on('request', (request) => request.method() === 'POST' && saves.push(request.url()))
  await page.keyboard.press('Control+s')
  await page.getByLabel('A dimension you know').selectOption('width')
  await page.getByLabel('Known to be').fill('60')
  await page.getByRole('button', { name: 'Compare and confirm' }).click()
  await page.getByLabel('The finished profile').check()
  await page.getByRole('button', { name: 'cover-cap.dxf' }).click()
  await expect(page.getByRole('application').last()).toBeVisible({ timeout: 20_000 })
  await page.keyboard.press('Control+s')
  await page.getByRole('button', { name: 'mullion-60x118.dxf' }).click()
  expect(saves).toEqual([])
  await page.keyboard.press('Control+s')
  await expect(page.getByText(/Revision A of P-\d+ is saved/)).toBeVisible({ timeout: 30_000 })
  const count = saves.length
  await page.keyboard.press('Control+s')
  expect(saves).toHaveLength(count)
})
