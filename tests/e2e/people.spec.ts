import { expect, test } from '@playwright/test'
import { enter, fresh } from './door'

test('an invited viewer joins by the link, opens no job, and is out at once when disabled', async ({ page, browser }) => {
  await enter(page)
  const email = `${fresh('v').replace(' ', '')}@example.org`
  await page.goto('/team')
  await page.getByRole('button', { name: 'Invite' }).click()
  await page.getByLabel('E-mail').fill(email)
  await page.getByLabel('designer').uncheck()
  await page.getByLabel('viewer').check()
  await page.getByRole('button', { name: 'Make the link' }).click()
  const link = await page.getByLabel('Link', { exact: true }).inputValue()
  await page.getByRole('button', { name: 'Done' }).click()

  const theirs = await browser.newContext()
  const guest = await theirs.newPage()
  await guest.goto(new URL(link).pathname)
  await guest.getByLabel('Your name').fill('Viktor Ek')
  await guest.getByLabel('Password').fill('another pass phrase')
  await guest.getByRole('button', { name: 'Join the team' }).click()
  await expect(guest.getByRole('heading', { name: 'Waiting for me' })).toBeVisible({ timeout: 20_000 })
  await guest.goto('/jobs')
  await expect(guest.getByRole('heading', { name: 'Jobs' })).toBeVisible()
  await expect(guest.getByRole('link', { name: 'New job' })).toHaveCount(0)

  await page.reload()
  const row = page.getByRole('row').filter({ hasText: email })
  await row.getByRole('button', { name: 'Change Viktor Ek' }).click()
  await page.getByLabel('Disabled').check()
  await page.getByRole('dialog').getByRole('button', { name: 'Save' }).click()
  await expect(row).toContainText('disabled')
  await guest.goto('/jobs')
  await expect(guest).toHaveURL(/\/sign-in/)
  await theirs.close()
})

test('figures follow the team’s unit, and the densities name their source', async ({ page }) => {
  await enter(page)
  await page.goto('/team')
  await page.getByLabel('mm, cm², cm⁴').check()
  await page.getByRole('button', { name: 'Save settings' }).click()
  await expect(page.getByText('The team’s settings are saved.')).toBeVisible()
  await page.reload()
  await expect(page.getByLabel('mm, cm², cm⁴')).toBeChecked()
  await expect(page.getByRole('row').filter({ hasText: 'EN AW-6060 T66' })).toContainText('EN 1999-1-1')
  await page.getByLabel('mm, mm², mm⁴').check()
  await page.getByRole('button', { name: 'Save settings' }).click()
})
