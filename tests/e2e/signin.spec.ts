import { expect, test } from '@playwright/test'
import { ADA, ensureTeam, signIn } from './door'

test.beforeEach(async ({ page }) => ensureTeam(page))

test('a stranger is sent to sign in, and setting up again is refused', async ({ page }) => {
  await page.goto('/jobs')
  await expect(page).toHaveURL(/\/sign-in/)
  await page.goto('/setup')
  await expect(page).toHaveURL(/\/sign-in/)
})

test('a wrong password is refused with a sentence and the e-mail stays typed', async ({ page }) => {
  await page.goto('/sign-in')
  await page.getByLabel('E-mail').fill(ADA.email)
  await page.getByLabel('Password').fill('not the pass phrase')
  await page.keyboard.press('Enter')
  await expect(page.getByRole('main').getByRole('alert')).toContainText('E-mail or password is wrong.')
  await expect(page.getByLabel('E-mail')).toHaveValue(ADA.email)
})

test('whoever signs out is a stranger again', async ({ page }) => {
  await signIn(page, ADA)
  await page.getByRole('button', { name: `${ADA.name}, ${ADA.team}` }).click()
  await page.getByRole('menuitem', { name: 'Sign out' }).click()
  await expect(page.getByRole('heading', { name: 'Sign in' })).toBeVisible()
  await page.goto('/jobs')
  await expect(page).toHaveURL(/\/sign-in/)
})

test('the theme chosen is there again after a reload', async ({ page }) => {
  await signIn(page, ADA)
  await page.getByRole('button', { name: `${ADA.name}, ${ADA.team}` }).press('Enter')
  await page.getByRole('menuitemradio', { name: 'Dark' }).click()
  await page.reload()
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'dark')
  await expect(page.locator('body')).toHaveCSS('color', 'rgb(236, 232, 222)')
})
