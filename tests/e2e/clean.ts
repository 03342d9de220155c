import AxeBuilder from '@axe-core/playwright'
import { expect, type Page } from '@playwright/test'

const WCAG = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice']
const LOOKS = [1440, 390].flatMap((width) => (['light', 'dark'] as const).map((colorScheme) => ({ width, colorScheme })))

/** Axe finds nothing on the page as it stands, wide and narrow, light and dark. */
export async function expectClean(page: Page): Promise<void> {
  for (const { width, colorScheme } of LOOKS) {
    await page.setViewportSize({ width, height: 900 })
    await page.emulateMedia({ colorScheme })
    const { violations } = await new AxeBuilder({ page }).withTags(WCAG).analyze()
    const told = violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => target.join(' ')).join(', ')}`)
    expect(told, `${new URL(page.url()).pathname} at ${width} px, ${colorScheme}`).toEqual([])
  }
  await page.setViewportSize({ width: 1440, height: 900 })
  await page.emulateMedia({ colorScheme: 'light' })
}
