import path from 'node:path'
import { expect, type Page, test } from '@playwright/test'
import { addProfile, enter, fresh, openJob } from './door'

const drawing = (name: string) => path.resolve('fixtures/demo', name)

async function drop(page: Page, ...names: string[]): Promise<void> {
  await page.getByLabel('DXF file').setInputFiles(names.map(drawing))
  await expect(page.getByRole('list', { name: 'Figures as they stand' })).toContainText('mm', { timeout: 20_000 })
}

async function confirm(page: Page, what: string, known: string): Promise<void> {
  await page.getByLabel('A dimension you know').selectOption(what)
  await page.getByLabel('Known to be').fill(known)
  await page.getByRole('button', { name: 'Compare and confirm' }).click()
}

test.beforeEach(async ({ page }) => {
  await enter(page)
  await openJob(page, fresh('Harbour hall'))
})

test('a DXF dropped, confirmed by 60 mm and saved gives a section sheet with its area', async ({ page }) => {
  await addProfile(page, fresh('Mullion'))
  await drop(page, 'mullion-60x118.dxf')
  await expect(page.getByRole('button', { name: 'Save revision' })).toBeDisabled()
  await confirm(page, 'overall width', '60')
  await expect(page.getByText('It agrees.')).toBeVisible()
  await page.getByLabel('The finished profile').check()
  await page.getByRole('button', { name: 'Save revision' }).click()
  await expect(page.getByText(/Revision A of P-\d+ is saved/)).toBeVisible({ timeout: 30_000 })
  await page.getByRole('link', { name: 'Open the section sheet' }).click()
  await expect(page.getByText('1214.7')).toBeVisible({ timeout: 20_000 })
})

test('a drawing read in inches is refused by a known 60 mm, which names the cure', async ({ page }) => {
  await addProfile(page, fresh('Mullion'))
  await drop(page, 'mullion-60x118.dxf')
  await page.getByLabel('Drawing unit').selectOption('in')
  await expect(page.getByRole('list', { name: 'Figures as they stand' })).toContainText('783', { timeout: 20_000 })
  await confirm(page, 'overall width', '60')
  await expect(page.getByText('It does not agree.')).toBeVisible()
  await page.getByRole('button', { name: 'It is drawn in mm' }).click()
  await expect(page.getByText('It agrees.')).toBeVisible()
})

test('a hole left out adds its area at once, and undo takes it back', async ({ page }) => {
  await addProfile(page, fresh('Mullion'))
  await drop(page, 'mullion-60x118.dxf')
  const figures = page.getByRole('list', { name: 'Figures as they stand' })
  await expect(figures).toContainText('1214.7')
  await page.getByLabel('What outline 2 does').selectOption('out')
  await expect(figures).toContainText('3427.7')
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(figures).toContainText('1214.7')
})

test('two files dropped on a job make two profiles with titles from their names', async ({ page }) => {
  await page.getByRole('link', { name: 'Drop drawings' }).first().click()
  await drop(page, 'cover-cap.dxf', 'handrail.dxf')
  await expect(page.getByLabel('Title of the profile')).toHaveValue('cover cap')
  await page.getByRole('button', { name: 'handrail.dxf' }).click()
  await expect(page.getByLabel('Title of the profile').nth(1)).toHaveValue('handrail')
})

test('a file that is no drawing is told so, and nothing can be saved', async ({ page }) => {
  await addProfile(page, fresh('Nothing'))
  await page
    .getByLabel('DXF file')
    .setInputFiles({ name: 'order.dxf', mimeType: 'application/dxf', buffer: Buffer.from('%PDF-1.7\n') })
  await expect(page.getByText(/not a DXF/)).toBeVisible({ timeout: 20_000 })
  await expect(page.getByRole('button', { name: 'Save revision' })).toBeDisabled()
})

test('from sign-in to a saved revision by keys alone', async ({ page }) => {
  await page.keyboard.press('Tab')
  await page.getByRole('link', { name: 'New profile' }).focus()
  await page.keyboard.press('Enter')
  await expect(page.getByLabel('Title', { exact: true })).toBeFocused({ timeout: 20_000 })
  await page.keyboard.type(fresh('Keys'))
  await page.keyboard.press('Enter')
  await expect(page.getByText('Drop the DXF here')).toBeVisible({ timeout: 20_000 })
  await expect(async () => {
    // the page may not be alive yet: the window is awaited before the key is pressed, each time
    const choosing = page.waitForEvent('filechooser', { timeout: 2000 })
    await page.keyboard.press('o')
    await (await choosing).setFiles(drawing('mullion-60x118.dxf'))
  }).toPass({ timeout: 30_000 })
  await page.getByLabel('A dimension you know').focus()
  await page.keyboard.press('Tab')
  await expect(page.getByLabel('Known to be')).toBeFocused()
  await page.keyboard.type('60')
  await page.keyboard.press('Enter')
  await expect(page.getByText('It agrees.')).toBeVisible()
  await page.keyboard.press('Tab')
  await page.keyboard.press('Tab')
  await expect(page.getByLabel('The finished profile')).toBeFocused()
  await page.keyboard.press('Space')
  await page.keyboard.press('Control+s')
  await expect(page.getByText(/Revision A of P-\d+ is saved/)).toBeVisible({ timeout: 30_000 })
  await page.keyboard.press('Tab')
  await page.keyboard.press('Enter')
  await expect(page).toHaveURL(/\/profiles\/[a-z2-7]{26}$/, { timeout: 20_000 })
})
