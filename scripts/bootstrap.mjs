// Makes a fresh clone ready: packages, browser, build. Imports nothing that npm has to install first.
import { spawnSync } from 'node:child_process'
import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { pack } from './packed.mjs'

const root = path.resolve(import.meta.dirname, '..')
const at = (...parts) => path.join(root, ...parts)
const dist = process.env.NEXT_DIST ?? '.next'

const HELP = `usage: node scripts/bootstrap.mjs [browser] [build]

Installs the packages where package.json, the lock file or Node changed. With
  browser   makes sure that there is a Chromium for the browser tests
  build     builds worker and pages where a source changed
Doing it again with nothing changed takes a moment only.`

class Refusal extends Error {}

function run(command, args, env = {}) {
  const { status, error } = spawnSync(command, args, { cwd: root, stdio: 'inherit', env: { ...process.env, ...env } })
  return !error && status === 0
}
const has = (command) => spawnSync('sh', ['-c', `command -v ${command}`]).status === 0
const isRoot = process.getuid?.() === 0

/** Debian packages, installed as root; anybody else is told the command. */
function debian(what, packages) {
  const command = `apt-get install -y --no-install-recommends ${packages.join(' ')}`
  if (!isRoot || !has('apt-get')) throw new Refusal(`${what} Install it, on Debian with: sudo ${command}`)
  console.log(`${what} Installing ${packages.join(', ')} from Debian …`)
  const quiet = { DEBIAN_FRONTEND: 'noninteractive' }
  if (!run('apt-get', ['update', '-qq'], quiet) || !run('apt-get', command.split(' ').slice(1), quiet)) {
    throw new Refusal(`${what} Debian could not install it. Try by hand: ${command}`)
  }
}

function checkNode() {
  const [major, minor] = process.versions.node.split('.').map(Number)
  if (major > 20 || (major === 20 && minor >= 19)) return
  throw new Refusal(
    `Sectionwright needs Node 20.19 or newer; this is ${process.versions.node}. Install it from https://nodejs.org.`,
  )
}

const lock = at('.next-bootstrap-lock')

function isAlive(pid) {
  try {
    process.kill(pid, 0)
    return true
  } catch (error) {
    return error.code === 'EPERM'
  }
}

/** One bootstrap at a time; the lock of a process that is gone is taken over. */
function takeLock() {
  for (let told = false; ; told = true) {
    try {
      mkdirSync(lock)
      writeFileSync(path.join(lock, 'pid'), String(process.pid))
      return
    } catch (error) {
      if (error.code !== 'EEXIST') throw error
    }
    const holder = existsSync(path.join(lock, 'pid')) ? Number(readFileSync(path.join(lock, 'pid'), 'utf8')) : 0
    const age = Date.now() - (statSync(lock, { throwIfNoEntry: false })?.mtimeMs ?? 0)
    if (holder ? !isAlive(holder) : age > 5000) rmSync(lock, { recursive: true, force: true })
    else {
      if (!told) console.log('Another command is preparing this folder; waiting for it …')
      Atomics.wait(new Int32Array(new SharedArrayBuffer(4)), 0, 0, 500)
    }
  }
}

const isStamped = (file, stamp) => existsSync(file) && readFileSync(file, 'utf8') === stamp

function packagesStamp() {
  const hash = createHash('sha256').update(`${process.version} ${process.platform} ${process.arch}`)
  for (const file of ['package.json', 'package-lock.json']) hash.update(readFileSync(at(file)))
  return hash.digest('hex')
}

/** Was exactly this lock file installed by hand? */
function isInstalled() {
  if (!existsSync(at('node_modules/.package-lock.json'))) return false
  const wanted = JSON.parse(readFileSync(at('package-lock.json'), 'utf8')).packages
  const found = JSON.parse(readFileSync(at('node_modules/.package-lock.json'), 'utf8')).packages
  return Object.entries(wanted).every(
    ([name, { version, optional }]) => name === '' || optional || found[name]?.version === version,
  )
}

const sqliteLoads = () => spawnSync(process.execPath, ['-e', "require('better-sqlite3')(':memory:')"], { cwd: root }).status === 0

function installPackages() {
  const stamp = packagesStamp()
  if (isStamped(at('node_modules/.setup'), stamp)) return
  if (!(isInstalled() && sqliteLoads())) {
    console.log('Installing the packages; this takes some minutes the first time …')
    // without --include=dev NODE_ENV=production would leave the build without its tools
    const install = () => run('npm', ['ci', '--include=dev', '--no-audit', '--no-fund']) && sqliteLoads()
    if (!install()) {
      const missing = ['g++', 'make', 'python3'].filter((command) => !has(command))
      if (missing.length === 0) throw new Refusal('The packages could not be installed; the lines above say why.')
      debian(`SQLite has to be compiled here, and ${missing.join(', ')} is missing.`, ['g++', 'make', 'python3'])
      if (!install()) throw new Refusal('The packages could not be installed; the lines above say why.')
    }
  }
  writeFileSync(at('node_modules/.setup'), stamp)
}

const BROWSERS = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome']

function findBrowser() {
  if (process.env.CHROMIUM || BROWSERS.some((file) => existsSync(file))) return
  debian('The browser tests need Chromium.', ['chromium', 'fonts-liberation'])
}

const SOURCES = ['app', 'components', 'db', 'lib', 'public', 'scripts/build-worker.mjs', 'scripts/packed.mjs']
const ROOT_SOURCES = /^(package(-lock)?\.json|tsconfig\.json|(next|postcss|tailwind)\.config\.\w+|proxy\.ts|instrumentation\.ts)$/

function filesUnder(place) {
  if (!existsSync(at(place))) return []
  if (!statSync(at(place)).isDirectory()) return [place]
  return readdirSync(at(place))
    .sort()
    .flatMap((name) => filesUnder(path.join(place, name)))
}

function sourcesStamp() {
  const hash = createHash('sha256').update(process.version)
  const files = [...SOURCES.flatMap(filesUnder), ...readdirSync(root).filter((name) => ROOT_SOURCES.test(name))]
  for (const file of files)
    hash
      .update(file)
      .update('\0')
      .update(readFileSync(at(file)))
  return hash.digest('hex')
}

async function build() {
  const stamp = sourcesStamp()
  const { ensureBuilt } = await import('./build-worker.mjs')
  await ensureBuilt().catch(() => {
    throw new Refusal('The worker could not be built; the lines above say why.')
  })
  if (isStamped(at(dist, '.setup'), stamp)) return
  console.log('Building the pages; this takes a minute …')
  rmSync(at(dist, '.setup'), { force: true })
  if (
    !run(process.execPath, ['node_modules/next/dist/bin/next', 'build'], { NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1' })
  ) {
    throw new Refusal('The pages could not be built; the lines above say why.')
  }
  pack(at(dist))
  writeFileSync(at(dist, '.setup'), stamp)
}

const wanted = process.argv.slice(2)
if (wanted.includes('--help')) {
  console.log(HELP)
  process.exit(0)
}
try {
  checkNode()
  takeLock()
  try {
    installPackages()
    if (wanted.includes('browser')) findBrowser()
    if (wanted.includes('build')) await build()
  } finally {
    rmSync(lock, { recursive: true, force: true })
  }
} catch (error) {
  if (!(error instanceof Refusal)) throw error
  console.error(error.message)
  process.exit(1)
}
