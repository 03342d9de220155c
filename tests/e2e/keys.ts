import { expect, type Locator, type Page } from '@playwright/test'

/** More stops than any page of ours has. */
const STOPS = 250

const isFocused = (target: Locator) => target.evaluate((element) => element === document.activeElement)

/** Walks by Tab until `target` has the focus; fails where keys do not lead there. */
export async function walkTo(page: Page, target: Locator, { back = false } = {}): Promise<void> {
  await target.waitFor({ timeout: 20_000 })
  for (let stop = 0; stop < STOPS; stop++) {
    if (await isFocused(target)) return
    await page.keyboard.press(back ? 'Shift+Tab' : 'Tab')
  }
  throw new Error(`Tab does not lead to ${target}`)
}

export async function press(page: Page, target: Locator, { key = 'Enter', back = false } = {}): Promise<void> {
  await walkTo(page, target, { back })
  await page.keyboard.press(key)
}

export async function write(page: Page, target: Locator, text: string): Promise<void> {
  await walkTo(page, target)
  await page.keyboard.press('Control+a')
  await page.keyboard.type(text)
}

/** Opens a menu and takes one of its items by the arrow keys. */
export async function choose(page: Page, menu: string | RegExp, item: string): Promise<void> {
  await press(page, page.getByRole('button', { name: menu }))
  const wanted = page.getByRole('menuitem', { name: item, exact: true })
  await wanted.waitFor()
  for (let step = 0; step < 20 && !(await isFocused(wanted)); step++) await page.keyboard.press('ArrowDown')
  await expect(wanted).toBeFocused()
  await page.keyboard.press('Enter')
}
