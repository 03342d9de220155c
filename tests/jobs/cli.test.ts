import { execFileSync, spawnSync } from 'node:child_process'
import { mkdtempSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { beforeAll, describe, expect, it } from 'vitest'
import { SectionAnswer } from '@/lib/api/schemas/section'
import { casePath } from '../cases/reference'

const root = path.resolve(import.meta.dirname, '../..')
const folder = mkdtempSync(path.join(tmpdir(), 'sectionwright-cli-'))

function section(...args: string[]) {
  const { status, stdout, stderr } = spawnSync(process.execPath, ['scripts/section.mjs', ...args], {
    cwd: root,
    encoding: 'utf8',
  })
  return { status, stdout, stderr }
}

function written(name: string, content: unknown): string {
  const file = path.join(folder, name)
  writeFileSync(file, typeof content === 'string' ? content : JSON.stringify(content))
  return file
}

beforeAll(() => {
  execFileSync(process.execPath, ['scripts/build-worker.mjs'], { cwd: root })
})

describe('npm run section', () => {
  it('prints a table with A = 2400 mm² for the rectangle 60 × 40 and ends with 0', () => {
    const { status, stdout, stderr } = section(casePath('p01.dxf'))
    expect(stderr).toBe('')
    expect(status).toBe(0)
    expect(stdout).toMatch(/^ +A +2400\.0+ mm² +area/m)
    expect(stdout).toContain('unconfirmed')
  })

  it('--json prints exactly the answer, with the file and its hash', () => {
    const { status, stdout } = section(casePath('p02.dxf'), '--json')
    const answer = SectionAnswer.parse(JSON.parse(stdout))
    expect(status).toBe(0)
    expect(answer.source.name).toBe('p02.dxf')
    expect(answer.section?.area).toBeWithin(1174.79644737231, { relative: 1e-9 })
  })

  it('takes the declared unit: p17 is drawn in metres', () => {
    const answer = JSON.parse(section(casePath('p17.dxf'), '--json').stdout)
    expect(answer.unit).toEqual({ drawing: 'm', mmPerUnit: 1000, declared: 'm' })
  })

  it('--unit, --scale and --tolerance replace what the recipe file says', () => {
    const recipe = written('recipe.json', { unit: 'cm', scale: 3, tolerance: 1 })
    const run = section(casePath('p01.dxf'), '--recipe', recipe, '--unit', 'in', '--scale', '2', '--tolerance', '0.05', '--json')
    const answer = JSON.parse(run.stdout)
    expect(answer.recipe).toMatchObject({ unit: 'in', scale: 2, tolerance: 0.05 })
    expect(answer.section.area).toBeWithin(2400 * 50.8 ** 2, { relative: 1e-12 })
  })

  it('--make-up takes a list of steps', () => {
    const makeUp = written('make-up.json', [{ at: [0, 25], does: 'add' }])
    const answer = JSON.parse(section(casePath('p19.dxf'), '--make-up', makeUp, '--json').stdout)
    expect(answer.recipe.makeUp).toHaveLength(1)
    expect(answer.section.pieces).toBe(1)
  })

  it.each([
    ['a file that is not there', ['missing.dxf'], 'there is no such file'],
    ['no file', [], 'Name the DXF file'],
    ['two files', ['a.dxf', 'b.dxf'], 'Name one file'],
    ['an unknown option', ['a.dxf', '--fast'], '--fast'],
    ['a unit that is none', [casePath('p01.dxf'), '--unit', 'furlong'], 'furlong'],
    ['a folder', [root], 'is not a file'],
  ])('%s ends with 2 and says so', (_, args, words) => {
    const { status, stdout, stderr } = section(...args)
    expect([status, stdout]).toEqual([2, ''])
    expect(stderr).toContain(words)
  })

  it('a recipe that is no JSON, or has a wrong field, ends with 2 and names it', () => {
    const broken = section(casePath('p01.dxf'), '--recipe', written('broken.json', '{"unit":'))
    expect(broken).toMatchObject({ status: 2, stderr: expect.stringContaining('broken.json is not JSON') })
    const wrong = section(casePath('p01.dxf'), '--recipe', written('wrong.json', { tolerance: 'fine' }))
    expect(wrong).toMatchObject({ status: 2, stderr: expect.stringContaining('--recipe: tolerance') })
  })

  it.each([
    ['--unit', '0'],
    ['--unit', '0x10'],
    ['--scale', '-2'],
    ['--scale', 'two'],
    ['--tolerance', '0,01'],
    ['--tolerance', '1e9'],
    ['--make-up', written('burn.json', [{ at: [0, 1], does: 'burn' }])],
    ['--make-up', 'missing.json'],
  ])('%s=%s ends with 2 and a sentence that names the option', (option, value) => {
    const { status, stdout, stderr } = section(casePath('p01.dxf'), `${option}=${value}`)
    expect([status, stdout]).toEqual([2, ''])
    expect(stderr.startsWith(option)).toBe(true)
  })

  it('a drawing without a section ends with 2: a sentence, or with --json the answer with section null', () => {
    const file = written('text.dxf', 'this is no drawing\n')
    expect(section(file)).toMatchObject({ status: 2, stdout: '', stderr: expect.stringMatching(/\w+/) })
    const json = section(file, '--json')
    expect([json.status, json.stderr]).toEqual([2, ''])
    const answer = SectionAnswer.parse(JSON.parse(json.stdout))
    expect(answer.section).toBeNull()
    expect(answer.findings.some(({ severity }) => severity === 'error')).toBe(true)
  })

  it.each(['section', 'bench', 'campaign', 'build-worker'])('scripts/%s.mjs --help prints its usage', (script) => {
    const { status, stdout } = spawnSync(process.execPath, [`scripts/${script}.mjs`, '--help'], { cwd: root, encoding: 'utf8' })
    expect(status).toBe(0)
    expect(stdout).toMatch(/^usage: /)
  })
})
