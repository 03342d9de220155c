import { type BrowserContext, chromium, expect, test } from '@playwright/test'
import lighthouse, { desktopConfig } from 'lighthouse'
import { enter } from './door'
import { savedProfile } from './things'

// tells through which port Lighthouse works the browser
const PORT = Number(process.env.LIGHTHOUSE_PORT ?? 9333)

async function cookiesOf(context: BrowserContext): Promise<string> {
  return (await context.cookies()).map(({ name, value }) => `${name}=${value}`).join('; ')
}

test('Lighthouse gives accessibility 100 on sign-in, home, jobs and a profile', async ({ page, launchOptions }) => {
  test.setTimeout(180_000)
  await enter(page)
  const { profile } = await savedProfile(page, 'fixtures/cases/p05.dxf')
  const origin = new URL(page.url()).origin
  const cookie = await cookiesOf(page.context())
  const args = [...(launchOptions.args ?? []), `--remote-debugging-port=${PORT}`]
  const browser = await chromium.launch({ ...launchOptions, args })
  try {
    for (const at of ['/sign-in', '/', '/jobs', profile]) {
      const extraHeaders = at === '/sign-in' ? undefined : { Cookie: cookie }
      const flags = { port: PORT, onlyCategories: ['accessibility'], logLevel: 'error' as const, extraHeaders }
      const result = await lighthouse(`${origin}${at}`, flags, desktopConfig)
      if (!result) throw new Error(`Lighthouse said nothing about ${at}`)
      const { categories, audits, finalDisplayedUrl } = result.lhr
      expect(new URL(finalDisplayedUrl).pathname).toBe(at)
      const failed = Object.values(audits).filter(({ score }) => score !== null && score < 1)
      const told = failed.map(
        ({ id, details }) =>
          `${id}: ${JSON.stringify(details)
            .match(/"snippet":"[^>]*>/g)
            ?.join(' ')}`,
      )
      expect(told, at).toEqual([])
      expect(categories.accessibility.score, at).toBe(1)
    }
  } finally {
    await browser.close()
  }
})
