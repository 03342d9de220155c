import { readFileSync } from 'node:fs'
import path from 'node:path'
import AxeBuilder from '@axe-core/playwright'
import { expect, type Page, test } from '@playwright/test'
import { enter, fresh } from './door'

const drawing = path.join(import.meta.dirname, '../../fixtures/cases/p05.dxf')
const EXPECTED_IX = 692776.725264335

/** A profile with the turned angle p05 saved through the API; answers the path of its page. */
async function profileWithSection(page: Page): Promise<string> {
  const origin = new URL(page.url()).origin
  const headers = { origin }
  const job = await (await page.request.post('/api/v1/jobs', { headers, data: { title: 'North face' } })).json()
  const fields = { jobId: job.id, title: fresh('Angle, turned'), drawingNumber: 'D-05' }
  const profile = await (await page.request.post('/api/v1/profiles', { headers, data: fields })).json()
  const saved = await page.request.post(`/api/v1/profiles/${profile.id}/revisions`, {
    headers: { ...headers, 'idempotency-key': `profile-spec-${profile.id}` },
    multipart: {
      recipe: JSON.stringify({ unit: 'mm' }),
      fields: JSON.stringify({}),
      file: { name: 'p05.dxf', mimeType: 'application/dxf', buffer: readFileSync(drawing) },
    },
  })
  expect(saved.status()).toBe(201)
  return `/profiles/${profile.id}`
}

const board = (page: Page) => page.getByRole('application')
const row = (page: Page, name: string) => page.getByRole('row', { name })

test.beforeEach(async ({ page }) => {
  await enter(page)
  await page.goto(await profileWithSection(page))
  await expect(board(page)).toBeVisible()
})

test('the sheet shows Ix of the turned angle as 692 780 mm⁴ and, on one press, with every digit and its ±', async ({ page }) => {
  const ix = row(page, 'second moment about x')
  await expect(ix.getByRole('button')).toHaveText('692\u2009780')
  await ix.getByRole('button').click()
  const digits = await page.getByRole('button', { name: /^Copy 69277/ }).getAttribute('aria-label')
  expect(Math.abs(Number(digits?.split(' ')[1]) - EXPECTED_IX) / EXPECTED_IX).toBeLessThan(1e-9)
  await expect(page.getByText(/±/)).toBeVisible()
})

test('pointing at a modulus draws its fibre with the distance, and leaving takes it away', async ({ page }) => {
  await row(page, 'elastic modulus about x, top fibre').hover()
  await expect(board(page).getByText('fibre', { exact: true })).toBeVisible()
  await expect(board(page).getByText('54.727 mm')).toBeVisible()
  await page.getByRole('heading', { level: 1 }).hover()
  await expect(board(page).getByText('fibre', { exact: true })).toHaveCount(0)
})

test('by keys alone the board moves, zooms, fits and measures', async ({ page }) => {
  await board(page).focus()
  // the picture comes with the page; its keys work once the page is alive
  await expect(async () => {
    await page.keyboard.press('m')
    await expect(page.getByRole('button', { name: 'Measure' })).toHaveAttribute('aria-pressed', 'true', { timeout: 500 })
  }).toPass()
  await page.keyboard.press('Escape')
  const metal = board(page).locator('clipPath path')
  const fitted = await metal.getAttribute('transform')
  await page.keyboard.press('ArrowRight')
  await page.keyboard.press('+')
  expect(await metal.getAttribute('transform')).not.toBe(fitted)
  await page.keyboard.press('f')
  await expect(metal).toHaveAttribute('transform', fitted ?? '')
  await page.keyboard.press('m')
  await page.keyboard.press('Enter')
  for (let k = 0; k < 4; k++) await page.keyboard.press('ArrowRight')
  await page.keyboard.press('Enter')
  await expect(page.getByText('distance')).toBeVisible()
  await expect(page.getByRole('button', { name: /Copy distance/ })).toBeVisible()
})

test('an axis typed through the centroid at θ gives I1 again', async ({ page }) => {
  await page.getByRole('button', { name: 'Place it at the centroid' }).click()
  await page.getByLabel('turned by').fill('40,6697822492835')
  await page.getByLabel('turned by').press('Enter')
  const own = page.getByRole('region', { name: 'About an axis of your own' })
  await expect(own.getByRole('row', { name: 'about the axis' })).toContainText('1\u2009063\u2009000')
})

test('an axis dragged by its ring turns, and its figures follow', async ({ page }) => {
  await page.getByRole('button', { name: 'Place it at the centroid' }).click()
  const own = page.getByRole('region', { name: 'About an axis of your own' })
  await expect(own.getByRole('row', { name: 'about the axis' })).toContainText('692\u2009780')
  await board(page).scrollIntoViewIfNeeded()
  const [square, ring] = await Promise.all(
    ['rect', 'circle'].map((shape) => board(page).locator(`${shape}.stroke-accent`).boundingBox()),
  )
  if (!square || !ring) throw new Error('no axis on the board')
  const middle = (box: typeof ring) => ({ x: box.x + box.width / 2, y: box.y + box.height / 2 })
  const [centre, from] = [middle(square), middle(ring)]
  await page.mouse.move(from.x, from.y)
  await page.mouse.down()
  await page.mouse.move(centre.x, centre.y - 90, { steps: 5 })
  await page.mouse.up()
  expect(Number(await page.getByLabel('turned by').inputValue())).toBeCloseTo(90, 0)
  await expect(own.getByRole('row', { name: 'about the axis' })).not.toContainText('692\u2009780')
})

test('the shares about x come in words and as bars', async ({ page }) => {
  const strip = page.getByRole('region', { name: 'Which metal makes it' })
  await strip.getByRole('button').first().click()
  await expect(strip).toContainText(/Half of Ix comes from 1\d\u2009% of the metal, beyond 3\d\.\d+ mm/)
})

test('C on a figure copies it with every digit, also where the page has no clipboard of its own', async ({ page }) => {
  await page.evaluate(() => Object.defineProperty(window, 'isSecureContext', { value: false }))
  await row(page, 'second moment about x').getByRole('button').press('c')
  await expect(page.getByText(/^Copied 692776\.725/)).toBeVisible()
})

test('units, symbols and axis names switch on the page', async ({ page }) => {
  const choose = async (name: string) => {
    await page.getByRole('button', { name: 'Units, symbols and axis names' }).click()
    await page.getByRole('menuitemradio', { name }).click()
  }
  await choose('inch and pound')
  await expect(row(page, 'second moment about x')).toContainText('1.6644')
  await choose('Axes y–z, principal u–v')
  await expect(row(page, 'second moment about y')).toContainText('1.6644')
  await expect(board(page).getByText('u', { exact: true })).toBeVisible()
})

test('axe finds nothing on the page, at 1440 and at 390 px', async ({ page }) => {
  for (const width of [1440, 390]) {
    await page.setViewportSize({ width, height: 900 })
    const { violations } = await new AxeBuilder({ page }).analyze()
    expect(violations.map(({ id, nodes }) => [id, nodes[0]?.html])).toEqual([])
  }
})

test('the picture leaves as SVG and PNG, the figures as CSV', async ({ page }) => {
  for (const [item, name] of [
    ['Picture as SVG', /\.svg$/],
    ['Picture as PNG', /\.png$/],
    ['Figures as CSV', /\.csv$/],
  ] as const) {
    await page.getByRole('button', { name: 'Export this revision' }).click()
    const arriving = page.waitForEvent('download')
    await page.getByRole('menuitem', { name: item }).click()
    expect((await arriving).suggestedFilename()).toMatch(name)
  }
})
