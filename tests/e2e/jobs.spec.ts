import { readFile } from 'node:fs/promises'
import { expect, test } from '@playwright/test'
import { addProfile, enter, fresh, openJob } from './door'

test.beforeEach(async ({ page }) => enter(page))

test('a job goes to the bin and comes back by undo', async ({ page }) => {
  const title = fresh('Harbour hall')
  await openJob(page, title)
  await page.goto(`/jobs?q=${encodeURIComponent(title)}`)
  await page.getByRole('button', { name: /^Actions for J-/ }).click()
  await page.getByRole('menuitem', { name: 'Move to bin' }).click()
  await expect(page.getByText(`No job matches “${title}”`)).toBeVisible()
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(page.getByRole('link', { name: title })).toBeVisible()
})

test('sort and filter stand in the URL and survive a reload', async ({ page }) => {
  const word = fresh('Zinnober')
  await openJob(page, `${word} A`)
  await openJob(page, `${word} B`)
  await page.goto('/jobs')
  await page.getByRole('searchbox', { name: 'Filter jobs' }).fill(word)
  await expect(page).toHaveURL(/q=Zinnober/)
  await page.getByRole('button', { name: 'Title' }).click()
  await expect(page).toHaveURL(/sort=title&dir=asc/)
  const titles = page.getByRole('row').getByRole('link', { name: new RegExp(word) })
  await expect(titles).toHaveText([`${word} A`, `${word} B`])
  await page.reload()
  await expect(titles).toHaveText([`${word} A`, `${word} B`])
  await page.getByRole('button', { name: 'Title' }).click()
  await expect(titles).toHaveText([`${word} B`, `${word} A`])
})

test('a title changed meanwhile by somebody else shows both versions, and mine can stay', async ({ page, context }) => {
  const title = fresh('Quay')
  const path = await openJob(page, title)
  await page.getByRole('button', { name: /^Actions for J-/ }).click()
  await page.getByRole('menuitem', { name: 'Rename …' }).click()
  await page.getByLabel('Title', { exact: true }).fill(`${title} mine`)
  const other = await context.newPage()
  await other.goto(path)
  await other.getByRole('button', { name: /^Actions for J-/ }).click()
  await other.getByRole('menuitem', { name: 'Rename …' }).click()
  await other.getByLabel('Title', { exact: true }).fill(`${title} theirs`)
  await other.keyboard.press('Enter')
  await expect(other.getByRole('heading', { name: `${title} theirs` })).toBeVisible()

  await page.getByRole('dialog').getByRole('button', { name: 'Save' }).click()
  const both = page.getByRole('status')
  await expect(both).toContainText('Somebody changed this since you opened it.')
  await expect(both).toContainText(`${title} mine`)
  await expect(both).toContainText(`${title} theirs`)
  await both.getByRole('button', { name: 'Keep mine' }).click()
  await page.getByRole('dialog').getByRole('button', { name: 'Save' }).click()
  await expect(page.getByRole('heading', { name: `${title} mine` })).toBeVisible()
})

test('a list exports all its rows, and a title that begins with = is made harmless', async ({ page }) => {
  const title = `=${fresh('Sum')}`
  await openJob(page, title)
  await page.goto(`/jobs?q=${encodeURIComponent(title)}`)
  await page.getByRole('button', { name: 'Export jobs' }).click()
  const downloading = page.waitForEvent('download')
  await page.getByRole('menuitem', { name: 'CSV', exact: true }).click()
  const file = await (await downloading).path()
  expect(await readFile(file, 'utf8')).toContain(`,'${title},Lindqvist Facades,0,`)
})

test('a profile without a drawing waits on the first page', async ({ page }) => {
  const title = fresh('Glazing bead')
  await openJob(page, fresh('Quay'))
  await addProfile(page, title)
  await page.goto('/')
  await expect(page.getByRole('listitem').filter({ hasText: title })).toContainText('waits for its drawing')
})
