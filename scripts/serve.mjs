// Serves the built product: migrates, listens, says where.
import { existsSync } from 'node:fs'
import http from 'node:http'
import path from 'node:path'
import { packedFiles } from './packed.mjs'

const HELP = `usage: npm start            (or: node scripts/serve.mjs, after node scripts/bootstrap.mjs build)

Serves Sectionwright. Settings from the environment:
  PORT          3000
  HOST          127.0.0.1; on any other the first visit asks for a one-time code that is printed here
  APP_URL       the address that people use, https://… behind a proxy with TLS
  TRUST_PROXY   true where a proxy sets X-Forwarded-For
  DATA_DIR      ./data, the folder with the database`

if (process.argv.includes('--help')) {
  console.log(HELP)
  process.exit(0)
}

const root = path.resolve(import.meta.dirname, '..')
process.chdir(root)
process.env.NODE_ENV = 'production'
process.env.NEXT_TELEMETRY_DISABLED = '1'

const dist = process.env.NEXT_DIST ?? '.next'
if (!existsSync(path.join(root, dist, 'BUILD_ID'))) fail('The pages are not built yet. Run: node scripts/bootstrap.mjs build')

const port = Number(process.env.PORT || 3000)
const host = process.env.HOST || '127.0.0.1'
const trustProxy = ['true', '1', 'yes', 'on'].includes((process.env.TRUST_PROXY ?? '').toLowerCase())

function fail(sentence) {
  console.error(sentence)
  process.exit(1)
}

/** Forwarded headers from anybody but a trusted proxy are made up: the socket's address takes their place. */
function setAddress(request) {
  const { headers, socket } = request
  if (trustProxy) return
  for (const name of Object.keys(headers)) if (name.startsWith('x-forwarded-') || name === 'forwarded') delete headers[name]
  headers['x-forwarded-for'] = socket.remoteAddress ?? 'unknown'
}

let handle = (_request, response) => response.writeHead(503, { 'retry-after': '1' }).end()
const sendPacked = packedFiles(path.join(root, dist))
const server = http.createServer((request, response) => {
  setAddress(request)
  if (!sendPacked(request, response)) handle(request, response)
})
server.on('error', (error) => {
  if (error.code === 'EADDRINUSE')
    fail(`Port ${port} is in use. Stop what runs there, or choose another: PORT=${port + 1} npm start`)
  if (error.code === 'EACCES') fail(`Port ${port} needs more rights. Choose one above 1023: PORT=3000 npm start`)
  fail(`The server cannot listen on ${host}:${port}: ${error.message}`)
})

// npm dies of TERM without telling its child
const parent = process.ppid
setInterval(() => {
  if (process.ppid !== parent) process.exit(0)
}, 500).unref()
for (const signal of ['SIGTERM', 'SIGINT', 'SIGHUP']) process.on(signal, () => process.exit(0))

await new Promise((resolve) => server.listen(port, host, resolve))
// asked for only now: a busy port is told at once
const { default: next } = await import('next')
const app = next({ dev: false, dir: root, hostname: host, port, httpServer: server })
await app.prepare().catch((error) => fail(error instanceof Error ? error.message : String(error)))
handle = app.getRequestHandler()

const shown = ['127.0.0.1', '::1', 'localhost'].includes(host) ? 'localhost' : host
console.log(`Sectionwright serves on ${process.env.APP_URL || `http://${shown}:${port}`}`)
console.log(`Data in ${path.resolve(process.env.DATA_DIR || 'data')}. Stop with Ctrl-C.`)
