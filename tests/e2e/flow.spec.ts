import { execFile } from 'node:child_process'
import { createHash } from 'node:crypto'
import { readFileSync } from 'node:fs'
import { readFile } from 'node:fs/promises'
import path from 'node:path'
import { promisify } from 'node:util'
import { type APIResponse, type Browser, expect, type Page, test } from '@playwright/test'
import { newDataDir, removeDataDir, type Server, startServer } from '../server/server'
import { expectClean } from './clean'
import { choose, press, walkTo, write } from './keys'

// The whole job, by keys alone, on a server that nobody has set up yet: each test goes on where the one before stopped.
test.describe.configure({ mode: 'serial', timeout: 120_000 })

const DRAWING = path.resolve('fixtures/cases/p10.dxf')
const EXPECTED = { ix: 468772.1232056139, iy: 1802043.8342517202, theta: 90, mass: 1192.8407044966673e-6 * 2700 }
const PASSWORD = 'a long pass phrase'
const ROLES = ['designer', 'fabricator', 'engineer', 'viewer'] as const
type Holder = (typeof ROLES)[number] | 'administrator'

const dataDir = newDataDir()
let server: Server
let url = ''
const pages = new Map<Holder, Page>()
const links = new Map<Holder, string>()
/** path of the profile's page and the id of its revision, once saved */
let profile = ''
let revisionId = ''

function pageOf(holder: Holder): Page {
  const page = pages.get(holder)
  if (!page) throw new Error(`nobody has signed in as ${holder}`)
  return page
}
async function newPage(browser: Browser, holder: Holder): Promise<Page> {
  const context = await browser.newContext({ baseURL: url, viewport: { width: 1440, height: 900 } })
  await context.grantPermissions(['clipboard-read', 'clipboard-write'])
  const page = await context.newPage()
  pages.set(holder, page)
  return page
}
const heading = (page: Page, name: string) => page.getByRole('heading', { name, exact: true })
const goBy = (page: Page, place: string) => press(page, page.getByRole('navigation').getByRole('link', { name: place }))
const roleBox = (page: Page, role: string) => page.getByRole('checkbox', { name: new RegExp(`^${role}`) })
const figure = (page: Page, name: string) => page.getByRole('row', { name }).getByRole('button').first()

test.beforeAll(async () => {
  server = await startServer(dataDir, { COMPUTE_SECONDS: '20', OPINION_SECONDS: '20' })
  url = server.url.replace('127.0.0.1', 'localhost')
})
test.afterAll(async () => {
  for (const page of pages.values()) await page.context().close()
  await server?.stop()
  removeDataDir(dataDir)
})

test('the first visit sets up the team and offers the demo data; the administrator invites four people', async ({ browser }) => {
  const page = await newPage(browser, 'administrator')
  await page.goto('/')
  await expect(page).toHaveURL(/\/setup$/)
  await expectClean(page)
  await expect(page.getByLabel('Load the demo data')).toBeChecked()
  await write(page, page.getByLabel('Team'), 'Nordlicht Metallbau')
  await write(page, page.getByLabel('Your name'), 'Ada Brandt')
  await write(page, page.getByLabel('E-mail'), 'administrator@example.org')
  await write(page, page.getByLabel('Password'), PASSWORD)
  await press(page, page.getByLabel('Load the demo data'), { key: 'Space' })
  await page.keyboard.press('Enter')
  await expect(heading(page, 'Waiting for me')).toBeVisible({ timeout: 20_000 })
  await goBy(page, 'Team')
  for (const role of ROLES) {
    await press(page, page.getByRole('button', { name: 'Invite', exact: true }))
    await write(page, page.getByLabel('E-mail'), `${role}@example.org`)
    if (role !== 'designer') {
      await press(page, roleBox(page, 'designer'), { key: 'Space' })
      await press(page, roleBox(page, role), { key: 'Space' })
    }
    await press(page, page.getByRole('button', { name: 'Make the link' }))
    links.set(role, await page.getByLabel('Link', { exact: true }).inputValue())
    await press(page, page.getByRole('button', { name: 'Done' }))
    await expect(page.getByRole('dialog')).toHaveCount(0)
  }
  await expect(page.getByRole('button', { name: /^Withdraw the invitation of/ })).toHaveCount(4)
  await expectClean(page)
})

for (const role of ROLES) {
  test(`the ${role} joins by the link`, async ({ browser }) => {
    const page = await newPage(browser, role)
    await page.goto(new URL(links.get(role) ?? '').pathname)
    if (role === 'designer') await expectClean(page)
    await write(page, page.getByLabel('Your name'), `Person ${role}`)
    await write(page, page.getByLabel('Password'), PASSWORD)
    await page.keyboard.press('Enter')
    await expect(heading(page, 'Waiting for me')).toBeVisible({ timeout: 20_000 })
  })
}

test('the designer opens a job, adds a profile, confirms 120 mm and saves revision A', async () => {
  const page = pageOf('designer')
  await goBy(page, 'Jobs')
  await press(page, page.getByRole('link', { name: 'New job' }))
  await write(page, page.getByLabel('Title', { exact: true }), 'Harbour hall')
  await write(page, page.getByLabel('Client'), 'Lindqvist Facades')
  await page.keyboard.press('Enter')
  await expect(heading(page, 'Harbour hall')).toBeVisible({ timeout: 20_000 })
  await press(page, page.getByRole('link', { name: 'New profile' }))
  await write(page, page.getByLabel('Title', { exact: true }), 'Three chambers')
  await walkTo(page, page.getByLabel('Material'))
  await page.keyboard.type('EN AW-6060 T66')
  await page.keyboard.press('Enter')
  await press(page, page.getByRole('button', { name: 'Add profile' }))
  await expect(page.getByText('Drop the DXF here')).toBeVisible({ timeout: 20_000 })

  const choosing = page.waitForEvent('filechooser')
  await press(page, page.getByRole('button', { name: 'Choose a file' }))
  await (await choosing).setFiles(DRAWING)
  await expect(page.getByRole('list', { name: 'Figures as they stand' })).toContainText('1192.8', { timeout: 20_000 })
  await expect(page.getByRole('button', { name: 'Save revision' })).toBeDisabled()
  await write(page, page.getByLabel('Known to be'), '120')
  await page.keyboard.press('Enter')
  await expect(page.getByText('It agrees.')).toBeVisible()
  await press(page, page.getByLabel('The finished profile'), { key: 'Space' })
  await expectClean(page)
  await press(page, page.getByRole('button', { name: 'Save revision' }))
  await expect(page.getByText(/Revision A of P-\d+ is saved/)).toBeVisible({ timeout: 30_000 })
  await expectClean(page)
  await press(page, page.getByRole('link', { name: 'Open the section sheet' }))
  await expect(page).toHaveURL(/\/profiles\/[a-z2-7]{26}$/, { timeout: 20_000 })
  profile = new URL(page.url()).pathname
  const { latest } = await (await page.request.get(`${url}/api/v1${profile}`)).json()
  revisionId = latest.id
})

test('the sheet shows Ix, Iy, θ and the mass of the reference; the designer copies Ix with every digit', async () => {
  const page = pageOf('designer')
  await expect(figure(page, 'second moment about x')).toHaveText('468\u2009770')
  await expect(figure(page, 'second moment about y')).toHaveText('1\u2009802\u2009000')
  await expect(figure(page, 'angle from x to axis 1')).toHaveText(/^90(\.0+)?$/)
  await expect(figure(page, 'mass per length')).toHaveText('3.2207')
  const { section } = await (await page.request.get(`${url}/api/v1/revisions/${revisionId}/section`)).json()
  for (const key of ['ix', 'iy', 'theta', 'mass'] as const) {
    expect(Math.abs(section[key] - EXPECTED[key]) / EXPECTED[key], key).toBeLessThan(1e-9)
  }
  await walkTo(page, figure(page, 'second moment about x'))
  await page.keyboard.press('c')
  await expect(page.getByText(/^Copied 468772\.123/)).toBeVisible()
  const copied = Number(await page.evaluate(() => navigator.clipboard.readText()))
  expect(copied).toBe(section.ix)
  await expectClean(page)
})

test('the focus on Ix draws a level axis on the picture, on Iy an upright one', async () => {
  const page = pageOf('designer')
  const hot = page.getByRole('application').locator('path.stroke-accent[stroke-width="2.4"]')
  const sizeOf = async (name: string, back: boolean) => {
    await walkTo(page, figure(page, name), { back })
    await expect(hot).toHaveCount(1)
    return hot.evaluate((line: SVGPathElement) => {
      const { width, height } = line.getBBox()
      return { width, height }
    })
  }
  const x = await sizeOf('second moment about x', true)
  expect(x.width).toBeGreaterThan(200)
  expect(x.height).toBeLessThan(1)
  const y = await sizeOf('second moment about y', false)
  expect(y.width).toBeLessThan(1)
  expect(y.height).toBeGreaterThan(100)
})

test('figures, picture and region leave as files; the source file byte for byte, the region with the same section', async () => {
  const page = pageOf('designer')
  const take = async (item: string) => {
    const arriving = page.waitForEvent('download')
    await choose(page, 'Export this revision', item)
    return (await arriving).path()
  }
  const section = JSON.parse(await readFile(await take('Section as JSON'), 'utf8')).section
  expect(Math.abs(section.iy - EXPECTED.iy) / EXPECTED.iy).toBeLessThan(1e-9)
  expect(await readFile(await take('Figures as CSV'), 'utf8')).toContain(String(section.ix))
  expect(await readFile(await take('Picture as SVG'), 'utf8')).toMatch(/^<svg|^<\?xml/)
  const digest = (bytes: Buffer) => createHash('sha256').update(bytes).digest('hex')
  expect(digest(await readFile(await take('Source file, as uploaded')))).toBe(digest(readFileSync(DRAWING)))

  const region = await take('Clean region as DXF')
  const { stdout } = await promisify(execFile)(process.execPath, ['scripts/section.mjs', region, '--json'])
  const again = JSON.parse(stdout).section
  for (const key of ['area', 'ix', 'iy'] as const) {
    expect(Math.abs(again[key] - section[key]) / section[key], key).toBeLessThan(1e-9)
  }
})

test('the designer bins the profile and takes it back by undo', async () => {
  const page = pageOf('designer')
  await goBy(page, 'Profiles')
  await choose(page, /^Actions for P-/, 'Move to bin')
  await press(page, page.getByRole('button', { name: 'Undo' }))
  await expect(page.getByRole('link', { name: 'Three chambers' })).toBeVisible()
})

/** What a person holding a role may do besides reading. */
const MAY: Record<Exclude<Holder, 'designer' | 'administrator'>, { jobs: boolean; materials: boolean }> = {
  fabricator: { jobs: false, materials: false },
  engineer: { jobs: true, materials: true },
  viewer: { jobs: false, materials: false },
}

for (const role of ['fabricator', 'engineer', 'viewer'] as const) {
  const { jobs, materials } = MAY[role]
  test(`the ${role} reads the sheet and is offered only what the role holds; the API refuses the rest with 403`, async () => {
    const page = pageOf(role)
    await goBy(page, 'Jobs')
    await expect(page.getByRole('link', { name: 'Harbour hall' })).toBeVisible()
    await expect(page.getByRole('link', { name: 'New job' })).toHaveCount(jobs ? 1 : 0)
    await expect(page.getByRole('button', { name: /^Actions for J-/ })).toHaveCount(jobs ? 1 : 0)
    await press(page, page.getByRole('link', { name: 'Harbour hall' }))
    await expect(heading(page, 'Harbour hall')).toBeVisible()
    await expect(page.getByRole('link', { name: 'New profile' })).toHaveCount(0)
    await expect(page.getByRole('link', { name: 'Drop drawings' })).toHaveCount(0)
    await press(page, page.getByRole('link', { name: 'Three chambers' }))
    await expect(figure(page, 'second moment about x')).toHaveText('468\u2009770')
    await expect(page.getByRole('link', { name: 'New revision' })).toHaveCount(0)
    await goBy(page, 'Team')
    await expect(page.getByText('administrator@example.org')).toBeVisible()
    await expect(page.getByRole('button', { name: 'Invite', exact: true })).toHaveCount(0)
    await expect(page.getByRole('button', { name: 'Save settings' })).toHaveCount(0)

    const { request } = page
    const headers = { origin: url }
    const api = (at: string) => `${url}/api/v1${at}`
    const file = { name: 'p10.dxf', mimeType: 'application/dxf', buffer: readFileSync(DRAWING) }
    const key = { 'idempotency-key': `flow-${role}` }
    const refused: Record<string, Promise<APIResponse>> = {
      upload: request.post(api(`${profile}/revisions`), { headers: { ...headers, ...key }, multipart: { recipe: '{}', file } }),
      profile: request.post(api('/profiles'), { headers, data: { title: 'Mine' } }),
      rename: request.patch(api(profile), { headers: { ...headers, 'if-match': '"1"' }, data: { title: 'Mine' } }),
      bin: request.delete(api(profile), { headers: { ...headers, 'if-match': '"1"' } }),
      invite: request.post(api('/invitations'), { headers, data: { email: 'x@example.org', roles: ['viewer'] } }),
      settings: request.patch(api('/team'), { headers: { ...headers, 'if-match': '"1"' }, data: { settings: { digits: 4 } } }),
      demo: request.post(api('/demo'), { headers }),
    }
    for (const [name, answer] of Object.entries(refused)) expect((await answer).status(), name).toBe(403)
    const job = await request.post(api('/jobs'), { headers, data: { title: `Of the ${role}` } })
    expect(job.status()).toBe(jobs ? 201 : 403)
    const material = { name: `Alloy of the ${role}`, density: 2700, source: 'certificate 12' }
    expect((await request.post(api('/materials'), { headers, data: material })).status()).toBe(materials ? 201 : 403)
  })
}

test('a person whom the administrator disables is out at once, page and API', async () => {
  const page = pageOf('administrator')
  const theirs = pageOf('viewer')
  expect((await theirs.request.get(`${url}/api/v1/me`)).status()).toBe(200)
  await page.reload()
  await press(page, page.getByRole('button', { name: 'Change Person viewer' }))
  await press(page, page.getByLabel('Disabled'), { key: 'Space' })
  await press(page, page.getByRole('dialog').getByRole('button', { name: 'Save' }))
  await expect(page.getByRole('row').filter({ hasText: 'viewer@example.org' })).toContainText('disabled')
  expect((await theirs.request.get(`${url}/api/v1/me`)).status()).toBe(401)
  await theirs.goto('/jobs')
  await expect(theirs).toHaveURL(/\/sign-in/)
})
