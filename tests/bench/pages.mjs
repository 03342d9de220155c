// Lighthouse's performance of the pages that people see most, desktop, as the median of several runs.
//
//   node tests/bench/pages.mjs [--runs N]
import { readFileSync } from 'node:fs'
import { parseArgs } from 'node:util'
import lighthouse, { desktopConfig } from 'lighthouse'
import { fixture, freePort, median, openBrowser, report, startProduct } from './product.mjs'

const { values: options } = parseArgs({ options: { runs: { type: 'string', default: '5' } } })
const AIM = 95

const product = await startProduct()
const port = await freePort()
const { browser } = await openBrowser(product, [`--remote-debugging-port=${port}`])
try {
  const { id } = await product.addProfile('Angle, turned')
  await product.save(id, 'p05.dxf', readFileSync(fixture('cases/p05.dxf')))
  console.log(`\nLighthouse, desktop, median of ${options.runs} runs`)
  for (const at of ['/sign-in', '/', '/jobs', `/profiles/${id}`]) {
    const extraHeaders = at === '/sign-in' ? undefined : { Cookie: product.cookie }
    const scores = []
    for (let run = 0; run < Number(options.runs); run++) {
      const flags = { port, onlyCategories: ['performance'], logLevel: 'error', extraHeaders }
      const { lhr } = await lighthouse(`${product.url}${at}`, flags, desktopConfig)
      if (new URL(lhr.finalDisplayedUrl).pathname !== at) throw new Error(`${at} led to ${lhr.finalDisplayedUrl}`)
      scores.push(Math.round(100 * lhr.categories.performance.score))
    }
    const name = at.startsWith('/profiles/') ? 'a profile' : at
    report(median(scores) >= AIM, `performance of ${name} at least ${AIM}: ${median(scores)} (${scores.join(', ')})`)
  }
} finally {
  await browser.close()
  await product.stop()
}
