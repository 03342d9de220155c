import { createHash } from 'node:crypto'
import { readFileSync, statSync } from 'node:fs'
import path from 'node:path'
import { RecipeInput } from '../api/schemas/recipe'
import { DEFAULT_LIMITS } from '../dxf/drawing'
import type { Recipe } from '../geometry/recipe'
import type { SectionAnswer } from '../section/types'
import { withFindings } from './answer'
import { type CliArguments, readArguments, USAGE } from './cliArguments'
import { tableOf } from './cliTable'
import { taskFinding } from './findings'
import { readTask, sectionTask } from './tasks'

const UNITS = ['mm', 'cm', 'm', 'in', 'ft'] as const

/** A sentence for the person at the command line: exit status 2. */
class Refusal extends Error {}

function readFile(file: string): Uint8Array {
  const stat = statSync(file, { throwIfNoEntry: false })
  if (!stat) throw new Refusal(`${file}: there is no such file.`)
  if (!stat.isFile()) throw new Refusal(`${file} is not a file.`)
  if (stat.size > DEFAULT_LIMITS.bytes) {
    throw new Refusal(`${file} has ${stat.size} bytes; the limit is ${DEFAULT_LIMITS.bytes / 1024 ** 2} MiB.`)
  }
  return readFileSync(file)
}

function readJson(option: string, file: string): unknown {
  try {
    return JSON.parse(new TextDecoder().decode(readFile(file)))
  } catch (error) {
    if (error instanceof Refusal) throw new Refusal(`${option}: ${error.message}`)
    throw new Refusal(`${option}: ${file} is not JSON: ${error instanceof Error ? error.message : String(error)}`)
  }
}

const NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i

function numberOf(option: string, text: string, takes = 'a number'): number {
  const value = NUMBER.test(text) ? Number(text) : Number.NaN
  if (!Number.isFinite(value)) throw new Refusal(`${option} takes ${takes}, not "${text}".`)
  return value
}

function unitOf(text: string): Recipe['unit'] {
  return UNITS.find((unit) => unit === text) ?? numberOf('--unit', text, `${UNITS.join(', ')} or a number of mm`)
}

/** The recipe of file and options; `unit` is undefined where nobody named one. */
function recipeOf({ recipe, unit, scale, tolerance, makeUp }: CliArguments): { recipe: Recipe; unitGiven: boolean } {
  const given = recipe === undefined ? {} : readJson('--recipe', recipe)
  if (typeof given !== 'object' || given === null || Array.isArray(given))
    throw new Refusal(`--recipe: ${recipe} holds no recipe.`)
  const wanted = {
    ...given,
    ...(unit !== undefined && { unit: unitOf(unit) }),
    ...(scale !== undefined && { scale: numberOf('--scale', scale) }),
    ...(tolerance !== undefined && { tolerance: numberOf('--tolerance', tolerance) }),
    ...(makeUp !== undefined && { makeUp: readJson('--make-up', makeUp) }),
  }
  const parsed = RecipeInput.safeParse(wanted)
  if (!parsed.success) {
    const [{ path: where, message }] = parsed.error.issues
    throw new Refusal(`${givenBy(where, { unit, scale, tolerance, makeUp })} cannot be used: ${message}.`)
  }
  return { recipe: parsed.data, unitGiven: 'unit' in wanted }
}

/** Which option a wrong field of the recipe came from, and where in its file. */
function givenBy([field, ...rest]: PropertyKey[], options: Record<string, string | undefined>): string {
  if (field === undefined) return '--recipe'
  if (options[String(field)] === undefined) return `--recipe: ${[field, ...rest].join('.')}`
  const option = field === 'makeUp' ? '--make-up' : `--${String(field)}`
  return rest.length > 0 ? `${option}: ${rest.join('.')}` : option
}

function parsed(argv: string[]): CliArguments {
  try {
    return readArguments(argv)
  } catch (error) {
    throw new Refusal(`${error instanceof Error ? error.message : String(error)} (--help shows the options)`)
  }
}

function compute(given: CliArguments): SectionAnswer {
  const { recipe, unitGiven } = recipeOf(given)
  const bytes = readFile(given.file)
  const drawing = readTask(bytes)
  const source = {
    name: path.basename(given.file),
    bytes: bytes.length,
    sha256: createHash('sha256').update(bytes).digest('hex'),
  }
  const declared = UNITS.find((name) => name === drawing.declared) ?? drawing.declaredMm
  const unit = unitGiven ? recipe.unit : (declared ?? recipe.unit)
  const by = unitGiven ? 'the command line' : declared ? 'the file itself' : 'the default (the file names none)'
  const { answer } = sectionTask(drawing, source, { ...recipe, unit }, {})
  return withFindings(answer, [taskFinding('unit-unconfirmed', { by, unit })])
}

function main(): number {
  const argv = process.argv.slice(2)
  try {
    const given = parsed(argv)
    if (given.help) {
      console.log(USAGE)
      return 0
    }
    const answer = compute(given)
    if (given.json) console.log(JSON.stringify(answer, null, 2))
    else if (answer.section) console.log(tableOf(answer))
    if (answer.section) return 0
    if (given.json) return 2
    const errors = answer.findings.filter(({ severity }) => severity === 'error')
    for (const { message } of errors.length > 0 ? errors : answer.findings) console.error(message)
    return 2
  } catch (error) {
    if (!(error instanceof Refusal)) throw error
    console.error(error.message)
    return 2
  }
}

process.exitCode = main()
