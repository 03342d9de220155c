// How fast the API reads a section through the session check, as a ratio to an empty route handler of the same build.
//
//   node tests/bench/api.mjs [--seconds N] [--rounds N]
//
// The empty handler is the one that Next itself puts behind OPTIONS of the same route: it walks the same way through the
// server and does nothing. All are loaded in turn, so that a shared machine slows each alike.
import { execFileSync } from 'node:child_process'
import { readFileSync } from 'node:fs'
import path from 'node:path'
import { parseArgs } from 'node:util'
import autocannon from 'autocannon'
import { fixture, median, report, startProduct } from './product.mjs'

const { values: options } = parseArgs({
  options: { seconds: { type: 'string', default: '4' }, rounds: { type: 'string', default: '3' } },
})
const CONNECTIONS = 8

/** CPU ms that a process has used so far; NaN where there is no /proc. */
function cpuOf(pid) {
  try {
    const fields = readFileSync(`/proc/${pid}/stat`, 'utf8').split(') ')[1].split(' ')
    return 10 * (Number(fields[11]) + Number(fields[12]))
  } catch {
    return Number.NaN
  }
}

/** Requests a second of one load, and the server's CPU ms for each; anything but the awaited status is no measurement. */
async function rate(request, status) {
  const before = cpuOf(product.pid)
  const result = await autocannon({ connections: CONNECTIONS, duration: Number(options.seconds), ...request })
  const wrong = result.requests.total - (result.statusCodeStats?.[status]?.count ?? 0)
  if (wrong > CONNECTIONS || result.errors > 0) throw new Error(`${request.url}: ${wrong} answers were not ${status}`)
  return { perSecond: result.requests.average, cpu: (cpuOf(product.pid) - before) / result.requests.total }
}

function limit() {
  const args = [path.join(import.meta.dirname, 'http-limit.mjs'), '--load', options.seconds, String(CONNECTIONS)]
  return { perSecond: JSON.parse(execFileSync(process.execPath, args, { encoding: 'utf8' })).requestsPerSecond }
}

const product = await startProduct()
try {
  const { id } = await product.addProfile('Angle, turned')
  const { revision } = await product.save(id, 'p05.dxf', readFileSync(fixture('cases/p05.dxf')))
  const url = `${product.url}/api/v1/revisions/${revision.id}/section`
  const headers = { cookie: product.cookie }
  const loads = {
    empty: () => rate({ url, method: 'OPTIONS', headers }, '204'),
    section: () => rate({ url, headers }, '200'),
    limit,
  }
  const rates = Object.fromEntries(Object.keys(loads).map((name) => [name, []]))
  await loads.section()
  for (let round = 0; round < Number(options.rounds); round++) {
    const names = Object.keys(loads)
    for (let k = 0; k < names.length; k++) {
      const name = names[(round + k) % names.length]
      rates[name].push(await loads[name]())
    }
  }
  const [empty, section, bare] = ['empty', 'section', 'limit'].map((name) =>
    median(rates[name].map(({ perSecond }) => perSecond)),
  )
  const [emptyCpu, sectionCpu] = ['empty', 'section'].map((name) => median(rates[name].map(({ cpu }) => cpu)))
  console.log(`\nAPI, ${CONNECTIONS} connections, median of ${options.rounds} rounds of ${options.seconds} s`)
  console.log(`empty route handler ${empty.toFixed(0)}/s, section ${section.toFixed(0)}/s, bare node:http ${bare.toFixed(0)}/s`)
  report(section / empty >= 0.4, `section read at 0.4 of an empty route handler: ${(section / empty).toFixed(3)}`)
  console.log(
    `         by the server's CPU time, ${emptyCpu.toFixed(2)} and ${sectionCpu.toFixed(2)} ms: ${(emptyCpu / sectionCpu).toFixed(3)}`,
  )
  console.log(`         section read beside bare node:http: ${(section / bare).toFixed(3)}`)
} finally {
  await product.stop()
}
