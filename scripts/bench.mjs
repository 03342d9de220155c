// Runs product, peer and limit in turn on the same drawings; see tests/bench/README.md.
import { execFileSync, spawnSync } from 'node:child_process'
import { existsSync, mkdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { parseArgs } from 'node:util'
import { ensureBuilt } from './build-worker.mjs'

const USAGE = `usage: npm run bench -- [options]

Runs the product, the peer (ezdxf and Shapely) and the limit (C++) in turn on the drawings of
fixtures/cases and on generated ones, checks every result and prints medians and ratios; then what
people wait for, on the built server: reads of the API, saving, dropping, board, pages.

  --parts LIST     engine,api,board,pages (default all)
  --quick          3 rounds, four drawings of fixtures/cases, 1k and 10k entities
  --runs N         rounds (default 5)
  --sizes LIST     entities of the generated drawings (default 1k,10k,100k,1M)
  --kinds LIST     lines,lwpolyline (default both)
  --no-cases       generated drawings only
  --no-peer        product and limit only
  --help           print this`

const { values: options } = parseArgs({
  options: {
    quick: { type: 'boolean', default: false },
    runs: { type: 'string' },
    sizes: { type: 'string' },
    kinds: { type: 'string', default: 'lines,lwpolyline' },
    'no-cases': { type: 'boolean', default: false },
    'no-peer': { type: 'boolean', default: false },
    parts: { type: 'string', default: 'engine,api,board,pages' },
    help: { type: 'boolean', default: false },
  },
})
if (options.help) {
  console.log(USAGE)
  process.exit(0)
}

const root = path.resolve(import.meta.dirname, '..')
const bench = path.join(root, 'tests', 'bench')
const work = path.join(tmpdir(), 'sectionwright-bench')
const parts = options.parts.split(',')
const runs = Number(options.runs ?? (options.quick ? 3 : 5))
const sizes = (options.sizes ?? (options.quick ? '1k,10k' : '1k,10k,100k,1M')).split(',')
const PYTHON = existsSync('/usr/bin/python3') ? '/usr/bin/python3' : 'python3'
const GNU_TIME = existsSync('/usr/bin/time')

const succeeds = (program, args) => spawnSync(program, args, { stdio: 'ignore' }).status === 0
const median = (values) => {
  const sorted = values.filter(Number.isFinite).sort((a, b) => a - b)
  if (sorted.length === 0) return Number.NaN
  const middle = sorted.length >> 1
  return sorted.length % 2 ? sorted[middle] : (sorted[middle - 1] + sorted[middle]) / 2
}

/** What can be run here; what cannot is said once. */
function tools() {
  const python = succeeds(PYTHON, ['--version'])
  const peer = !options['no-peer'] && python && succeeds(PYTHON, ['-c', 'import ezdxf, shapely, numpy'])
  const limitProgram = path.join(work, 'limit')
  let limit = existsSync(limitProgram)
  if (!limit && succeeds('g++', ['--version'])) {
    limit = succeeds('g++', ['-O3', '-march=native', '-std=c++20', '-o', limitProgram, path.join(bench, 'limit.cpp')])
  }
  if (!python) console.log('python3 is missing: no drawings can be generated, only those of fixtures/cases are run.')
  if (!peer && !options['no-peer'])
    console.log('The peer is left out: it needs python3-ezdxf, python3-shapely and python3-numpy.')
  if (!limit) console.log('The limit is left out: it needs g++.')
  if (!GNU_TIME) console.log('Peak memory is left out: it needs GNU time (/usr/bin/time).')
  return { python, peer, limit: limit ? limitProgram : null }
}

/** A generated drawing, kept for the next run. */
function generated(kind, size) {
  const file = path.join(work, `${kind}-${size}.dxf`)
  const note = `${file}.json`
  if (!existsSync(note)) {
    const text = execFileSync(PYTHON, [path.join(bench, 'gen_big.py'), size, kind, '1', file], { encoding: 'utf8' })
    writeFileSync(note, text)
  }
  const { expected, entities } = JSON.parse(readFileSync(note, 'utf8'))
  const large = entities > (options.quick ? 10_000 : 100_000)
  return {
    name: `${kind} ${size}`,
    file,
    entities,
    expected,
    accept: 1e-9,
    args: [],
    // small drawings take many rounds until the compiler has done its work
    rounds: Math.round(Math.min(300, Math.max(large ? 5 : 15, 600_000 / entities))),
    peer: !large,
    limit: true,
  }
}

function cases() {
  const folder = path.join(root, 'fixtures', 'cases')
  const all = JSON.parse(readFileSync(path.join(folder, 'expected.json'), 'utf8'))
  const chosen = options.quick ? all.filter(({ file }) => ['p03.dxf', 'p10.dxf', 'p12.dxf', 'p18.dxf'].includes(file)) : all
  return chosen.map(({ file, unit, tolerance, makeUp, layers, expected_mm: e, accept_rel }) => {
    const recipe = path.join(work, `${file}.recipe.json`)
    writeFileSync(recipe, JSON.stringify({ unit: unit.drawing, tolerance, makeUp, layers: layers ?? null }))
    const expected = { A: e.area, cx: e.centroid.x, cy: e.centroid.y, Ix: e.ix, Iy: e.iy, Ixy: e.ixy }
    const plain = makeUp === null && unit.mmPerUnit === 1
    return {
      name: file,
      file: path.join(folder, file),
      expected,
      accept: Math.max(accept_rel.area, accept_rel.second),
      args: ['--recipe', recipe],
      rounds: 200,
      peer: plain,
      limit: plain,
    }
  })
}

/** One run of a command: its JSON, wall seconds and peak MB; null where it gives none. */
function once(program, args) {
  const timed = GNU_TIME ? ['/usr/bin/time', ['-f', 'peak %M', program, ...args]] : [program, args]
  const start = process.hrtime.bigint()
  const run = spawnSync(timed[0], timed[1], { encoding: 'utf8', maxBuffer: 1 << 26 })
  const wall = Number(process.hrtime.bigint() - start) / 1e9
  if (run.status !== 0) return { failed: run.stderr.trim().split('\n')[0] }
  const peak = run.stderr.match(/peak (\d+)/)
  return { wall, peak: peak ? Number(peak[1]) / 1024 : Number.NaN, ...JSON.parse(run.stdout) }
}

/** Greatest relative error of A, Ix, Iy and Ixy (to Ix + Iy). */
function errorOf(got, wanted) {
  const relative = (key, scale = Math.abs(wanted[key])) => Math.abs(got[key] - wanted[key]) / scale
  return Math.max(relative('A'), relative('Ix'), relative('Iy'), relative('Ixy', wanted.Ix + wanted.Iy))
}

function measure(drawing, { peer, limit }) {
  const product = [path.join(root, 'dist-worker', 'section.bench.mjs'), drawing.file, ...drawing.args]
  const heap = '--max-old-space-size=4096'
  const commands = [
    ['warm', process.execPath, [heap, ...product, '--rounds', String(drawing.rounds)]],
    ['cold', process.execPath, [heap, ...product, '--rounds', '1']],
    ...(peer && drawing.peer ? [['peer', PYTHON, [path.join(bench, 'peer.py'), drawing.file]]] : []),
    ...(limit && drawing.limit ? [['limit', limit, [drawing.file]]] : []),
  ]
  const results = Object.fromEntries(commands.map(([name]) => [name, []]))
  const broken = new Set()
  for (let round = 0; round < runs; round++) {
    for (let k = 0; k < commands.length; k++) {
      const [name, program, args] = commands[(round + k) % commands.length]
      if (broken.has(name)) continue
      const result = once(program, args)
      if (result.failed === undefined) results[name].push(result)
      else {
        broken.add(name)
        if (name === 'warm' || name === 'cold') throw new Error(`${drawing.name}: ${result.failed}`)
      }
    }
  }
  for (const name of ['peer', 'limit']) {
    const [first] = results[name] ?? []
    // peer and limit do not know every kind of drawing; a wrong figure is no time to compare with
    if (first && errorOf(first, drawing.expected) > (name === 'peer' ? 1e-2 : 1e-9)) results[name] = []
  }
  const error = Math.max(...[...results.warm, ...results.cold].map((result) => errorOf(result, drawing.expected)))
  const time = (name, key) => median((results[name] ?? []).map(({ seconds }) => seconds?.[key] ?? Number.NaN))
  const of = (name, key) => median((results[name] ?? []).map((result) => result[key]))
  return {
    drawing,
    error,
    right: error <= drawing.accept,
    total: time('warm', 'total'),
    core: time('warm', 'core'),
    peerTotal: time('peer', 'total'),
    limitTotal: time('limit', 'total'),
    wall: of('cold', 'wall'),
    peerWall: of('peer', 'wall'),
    limitWall: of('limit', 'wall'),
    peak: of('cold', 'peak'),
    peerPeak: of('peer', 'peak'),
    limitPeak: of('limit', 'peak'),
    stages: Object.fromEntries(['read', 'chain', 'combine', 'figures'].map((key) => [key, time('warm', key)])),
  }
}

const show = (value, digits = 3) => (Number.isFinite(value) ? String(Number(value.toPrecision(digits))) : '-')
const ms = (seconds) => show(1000 * seconds)

function print(rows) {
  const head = [
    'drawing',
    'error',
    'product ms',
    'read + chain + combine + figures',
    'peer ms',
    'peer / product',
    'limit ms',
    'core / limit',
    'product / limit',
    'wall s: product, peer, limit',
    'peer / product',
    'peak MB: product, peer, limit',
  ]
  console.log(`\nmedian of ${runs} rounds; inner times warm\n`)
  console.log(`| ${head.join(' | ')} |\n|${head.map(() => ' --- ').join('|')}|`)
  for (const r of rows) {
    const cells = [
      r.drawing.name,
      `${show(r.error, 2)}${r.right ? '' : ' WRONG'}`,
      ms(r.total),
      Object.values(r.stages).map(ms).join(' + '),
      ms(r.peerTotal),
      show(r.peerTotal / r.total),
      ms(r.limitTotal),
      show(r.core / r.limitTotal),
      show(r.total / r.limitTotal),
      [r.wall, r.peerWall, r.limitWall].map((value) => show(value)).join(', '),
      show(r.peerWall / r.wall),
      [r.peak, r.peerPeak, r.limitPeak].map((value) => show(value)).join(', '),
    ]
    console.log(`| ${cells.join(' | ')} |`)
  }
}

/** The aims, each with what was measured. */
function judge(rows) {
  const big = rows.filter(({ drawing }) => drawing.entities >= 1000)
  const from10k = big.filter(({ drawing }) => drawing.entities >= 10_000)
  const worst = (list, value, pick) => pick(...list.map(value).filter(Number.isFinite))
  const aim = (text, value, met) => {
    if (Number.isFinite(value)) console.log(`${met ? 'met    ' : 'NOT MET'}  ${text}: ${show(value)}`)
  }
  console.log('')
  const peer = worst(big, (r) => r.peerTotal / r.total, Math.min)
  aim('at least 20 times faster than the peer from 1k up, inner', peer, peer >= 20)
  const core = worst(from10k, (r) => r.core / r.limitTotal, Math.max)
  aim('reading, chaining and integrals within 3 times of the limit from 10k up', core, core <= 3)
  const whole = worst(from10k, (r) => r.total / r.limitTotal, Math.max)
  aim('the whole engine within 8 times of the limit from 10k up', whole, whole <= 8)
  for (const kind of options.kinds.split(',')) {
    const perEntity = (size) => {
      const row = rows.find(({ drawing }) => drawing.name === `${kind} ${size}`)
      return row ? row.total / row.drawing.entities : Number.NaN
    }
    const growth = perEntity('1M') / perEntity('10k')
    aim(`${kind}: time per entity at 1M at most 1.8 times that at 10k`, growth, growth <= 1.8)
  }
  const million = rows.find(({ drawing }) => drawing.name === 'lines 1M')
  if (million) aim('1M lines under 1.5 GB, MB', million.peak, million.peak < 1536)
  const wrong = rows.filter(({ right }) => !right)
  console.log(
    wrong.length === 0 ? 'All results of the product are right.' : `WRONG: ${wrong.map((r) => r.drawing.name).join(', ')}`,
  )
  return wrong.length === 0
}

async function benchEngine() {
  mkdirSync(work, { recursive: true })
  await ensureBuilt(['section.bench'])
  const available = tools()
  const drawings = [
    ...(options['no-cases'] ? [] : cases()),
    ...(available.python ? sizes.flatMap((size) => options.kinds.split(',').map((kind) => generated(kind, size))) : []),
  ]
  const rows = []
  for (const drawing of drawings) {
    process.stderr.write(`${drawing.name} (${(statSync(drawing.file).size / 1024 ** 2).toPrecision(3)} MiB)\n`)
    rows.push(measure(drawing, available))
  }
  print(rows)
  return judge(rows)
}

/** What is measured on the built server, each by a script of its own. */
const SERVER_PARTS = { api: ['--rounds', String(runs)], board: [], pages: ['--runs', String(runs)] }

let right = true
if (parts.includes('engine')) right = await benchEngine()
for (const [name, args] of Object.entries(SERVER_PARTS)) {
  if (!parts.includes(name)) continue
  const { status } = spawnSync(process.execPath, [path.join(bench, `${name}.mjs`), ...args], { cwd: root, stdio: 'inherit' })
  right &&= status === 0
}
process.exitCode = right ? 0 : 1
