import { type Browser, expect, type Page, test } from '@playwright/test'
import { enter } from './door'
import { savedProfile } from './things'

/** Compressed script of a first load, bytes. */
const LIMIT = 200_000

interface Load {
  at: string
  /** bytes of script over the wire by the page's load event, with nothing in the cache */
  first: number
  /** the same once the network is idle: with what the page asks for later */
  all: number
}

async function scriptOf(browser: Browser, from: Page, at: string, stranger: boolean): Promise<Load> {
  const storageState = stranger ? undefined : await from.context().storageState()
  const context = await browser.newContext({ baseURL: new URL(from.url()).origin, storageState })
  const page = await context.newPage()
  const devtools = await context.newCDPSession(page)
  await devtools.send('Network.enable')
  const scripts = new Set<string>()
  let bytes = 0
  devtools.on('Network.responseReceived', ({ requestId, response }) => {
    if (new URL(response.url).pathname.endsWith('.js')) scripts.add(requestId)
  })
  devtools.on('Network.loadingFinished', ({ requestId, encodedDataLength }) => {
    if (scripts.has(requestId)) bytes += encodedDataLength
  })
  await page.goto(at, { waitUntil: 'load' })
  const first = bytes
  await page.waitForLoadState('networkidle')
  expect(new URL(page.url()).pathname).toBe(at)
  await context.close()
  return { at, first, all: bytes }
}

test('the first load of every page is under 200 kB of compressed script', async ({ page, browser }) => {
  await enter(page)
  const { job, profile } = await savedProfile(page, 'fixtures/cases/p05.dxf')
  const places = [
    '/',
    '/jobs',
    '/jobs/new',
    job,
    `${job}/upload`,
    '/profiles',
    '/profiles/new',
    profile,
    `${profile}/upload`,
    '/team',
  ]
  const loads = [await scriptOf(browser, page, '/sign-in', true)]
  for (const at of places) loads.push(await scriptOf(browser, page, at, false))
  loads.sort((a, b) => b.first - a.first)
  const kB = (bytes: number) => (bytes / 1000).toFixed(1)
  const told = loads.map(({ at, first, all }) => `${at} ${kB(first)} kB (${kB(all)} kB with what comes later)`).join(', ')
  console.log(`compressed script, worst first: ${told}`)
  expect(loads.at(-1)?.first, told).toBeGreaterThan(50_000)
  expect(loads[0].first, `worst: ${told}`).toBeLessThan(LIMIT)
})
