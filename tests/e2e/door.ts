import { expect, type Page } from '@playwright/test'

/** The administrator of the server under test. */
export const ADA = { team: 'Nordlicht Metallbau', name: 'Ada Brandt', email: 'ada@example.org', password: 'a long pass phrase' }

/** A word that no other test uses, for titles and addresses. */
export const fresh = (word: string) => `${word} ${Math.random().toString(36).slice(2, 8)}`

/** Sets the server up where nobody did yet; whoever comes first becomes its administrator. */
export async function ensureTeam(page: Page): Promise<void> {
  const state = await (await page.request.get('/api/v1/setup')).json()
  if (!state.needed) return
  await page.goto('/')
  await page.waitForURL('**/setup')
  await page.getByLabel('Team').fill(ADA.team)
  await page.getByLabel('Your name').fill(ADA.name)
  await page.getByLabel('E-mail').fill(ADA.email)
  await page.getByLabel('Password').fill(ADA.password)
  await page.getByLabel('Load the demo data').uncheck()
  await page.getByRole('button', { name: 'Set up the team' }).click()
  await expect(page.getByRole('heading', { name: 'Waiting for me' })).toBeVisible({ timeout: 20_000 })
  await page.context().clearCookies()
}

export async function signIn(page: Page, { email, password }: { email: string; password: string }): Promise<void> {
  await page.goto('/sign-in')
  await page.getByLabel('E-mail').fill(email)
  await page.getByLabel('Password').fill(password)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await expect(page.getByRole('heading', { name: 'Waiting for me' })).toBeVisible({ timeout: 20_000 })
}

export async function enter(page: Page): Promise<void> {
  await ensureTeam(page)
  await signIn(page, ADA)
}

/** Opens a job and gives the path of its page. */
export async function openJob(page: Page, title: string): Promise<string> {
  await page.goto('/jobs/new')
  await page.getByLabel('Title', { exact: true }).fill(title)
  await page.getByLabel('Client').fill('Lindqvist Facades')
  await page.keyboard.press('Enter')
  await expect(page.getByRole('heading', { name: title })).toBeVisible({ timeout: 20_000 })
  return new URL(page.url()).pathname
}

/** Adds a profile to the job in view and lands on the page where its drawing is dropped. */
export async function addProfile(page: Page, title: string): Promise<void> {
  await page.getByRole('link', { name: 'New profile' }).click()
  await page.getByLabel('Title', { exact: true }).fill(title)
  await page.getByLabel('Material').selectOption({ label: 'EN AW-6060 T66 (2700 kg/m³)' })
  await page.getByRole('button', { name: 'Add profile' }).click()
  await expect(page.getByText('Drop the DXF here')).toBeVisible({ timeout: 20_000 })
}
