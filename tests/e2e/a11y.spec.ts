import path from 'node:path'
import AxeBuilder from '@axe-core/playwright'
import { expect, type Page, test } from '@playwright/test'
import { addProfile, enter, ensureTeam, fresh, openJob } from './door'

const WCAG = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice']

async function clean(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).withTags(WCAG).analyze()
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => target.join(' ')).join(', ')}`)).toEqual([])
}

for (const width of [1440, 390]) {
  for (const colorScheme of ['light', 'dark'] as const) {
    test(`axe finds nothing at ${width} px, ${colorScheme}`, async ({ page }) => {
      await page.setViewportSize({ width, height: 900 })
      await page.emulateMedia({ colorScheme })
      await ensureTeam(page)
      await page.goto('/sign-in')
      await clean(page)
      await enter(page)
      const job = await openJob(page, fresh('Axe'))
      await clean(page)
      for (const at of ['/', '/jobs', '/jobs/new', '/profiles', '/profiles/new', '/team', `${job}/upload`]) {
        await page.goto(at)
        await page.getByRole('heading').first().waitFor()
        await clean(page)
      }
      await page.goto(job)
      await addProfile(page, fresh('Axe'))
      await clean(page)
      await page.getByLabel('DXF file').setInputFiles(path.resolve('fixtures/demo/mullion-60x118.dxf'))
      await expect(page.getByRole('list', { name: 'Figures as they stand' })).toContainText('mm', { timeout: 20_000 })
      await clean(page)
    })

    test(`no page is wider than ${width} px, ${colorScheme}`, async ({ page }) => {
      await page.setViewportSize({ width, height: 900 })
      await page.emulateMedia({ colorScheme })
      await enter(page)
      for (const at of ['/', '/jobs', '/profiles', '/team', '/profiles/new']) {
        await page.goto(at)
        await page.getByRole('heading').first().waitFor()
        expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(width)
      }
    })
  }
}
