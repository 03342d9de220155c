import { describe, expect, test } from 'vitest'
import { Section as SectionSchema } from '@/lib/api/schemas/section'
import { csvText, figuresCsv } from '@/lib/section/csv'
import { FIGURES } from '@/lib/section/figures/index'
import { figuresJson } from '@/lib/section/figuresJson'
import { figureSymbol, figureWord, namingSentence } from '@/lib/section/naming'
import { sectionOf } from '@/lib/section/section'
import type { Section } from '@/lib/section/types'
import { EXACT_SHAPES } from '@/tests/support/exactCases'

function sectionFor(density?: number): Section {
  const { section } = sectionOf(EXACT_SHAPES.L, { lastDigit: 0.0005, repairs: [], density })
  if (!section) throw new Error('no section')
  return section
}

const figure = (key: string) => {
  const found = FIGURES.find((row) => row.key === key)
  if (!found) throw new Error(`${key} is not in the table`)
  return found
}

/** Every number of a section by its dotted path; a bracketed one, { value, lower, upper }, counts once. */
function numbersOf(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return [path]
  if (value === null || typeof value !== 'object' || Array.isArray(value)) return []
  if ('lower' in value && 'upper' in value) return [path]
  return Object.entries(value).flatMap(([key, inner]) =>
    key === 'origin' ? [] : numbersOf(inner, path ? `${path}.${key}` : key),
  )
}

describe('the table of figures', () => {
  test('every number of a section has its row and its origin, and every row its number', () => {
    const section = sectionFor(2700)
    const rows = FIGURES.map(({ key }) => key)
    expect(rows).toEqual(expect.arrayContaining(numbersOf(section)))
    expect(new Set(rows).size).toBe(rows.length)
    expect(Object.keys(section.origin)).toEqual(expect.arrayContaining(numbersOf(section)))
  })

  test('no ± is negative, infinite or not a number', () => {
    for (const { plusMinus = {} } of Object.values(sectionFor(2700).origin)) {
      for (const bound of Object.values(plusMinus)) {
        expect(bound).toBeGreaterThanOrEqual(0)
        expect(Number.isFinite(bound)).toBe(true)
      }
    }
  })

  test('a section passes the schema of the API', () => {
    const section = sectionFor(2700)
    expect(SectionSchema.parse(JSON.parse(JSON.stringify(section)))).toEqual(section)
  })
})

describe('names by team setting', () => {
  test('Wel,x is S x in US symbols and Wel,y with axes y–z; I1 is Iu, θ runs from y to axis u', () => {
    const top = figure('elastic.xTop')
    expect(figureSymbol(top, { axes: 'xy', symbols: 'en' })).toEqual({ base: 'W', sub: 'el,x' })
    expect(figureSymbol(top, { axes: 'xy', symbols: 'us' })).toEqual({ base: 'S', sub: 'x' })
    expect(figureSymbol(top, { axes: 'yz', symbols: 'en' })).toEqual({ base: 'W', sub: 'el,y' })
    expect(figureSymbol(figure('ixy'), { axes: 'yz', symbols: 'en' })).toEqual({ base: 'I', sub: 'yz' })
    expect(figureSymbol(figure('i1'), { axes: 'yz', symbols: 'en' })).toEqual({ base: 'I', sub: 'u' })
    expect(figureWord(figure('theta'), { axes: 'yz' })).toBe('angle from y to axis u, counter-clockwise')
    expect(figureWord(figure('iy'), { axes: 'yz' })).toBe('second moment about z')
    expect(figureWord(figure('ixy'), { axes: 'yz' })).toBe('product of area, +∫yz dA')
    expect(figureSymbol(figure('centroid.y'), { axes: 'yz', symbols: 'en' })).toEqual({ base: 'z', sub: 'c' })
  })

  test('the sentence for print defines every name it uses', () => {
    expect(namingSentence('yz')).toContain('Iy = ∫z² dA, Iz = ∫y² dA, Iyz = +∫yz dA')
    expect(namingSentence('xy')).toContain('θ counter-clockwise from +x to axis 1 (major)')
  })

  test('no symbol is a bare W, S or Z', () => {
    for (const { symbol } of FIGURES) {
      for (const { base, sub } of [symbol.en, symbol.us]) if (/^[WSZ]$/.test(base)) expect(sub).toBeTruthy()
    }
  })
})

describe('CSV and JSON', () => {
  test('lines end in CRLF, the axes are defined in the head, numbers read back to the last bit', () => {
    const section = sectionFor()
    const lines = figuresCsv(section).split('\r\n')
    expect(lines.at(-1)).toBe('')
    expect(lines[0]).toContain('Ixy = +∫xy dA about the centroid')
    const line = lines.find((row) => row.startsWith('ixy,')) ?? ''
    const cells = line.split(',')
    expect(cells.slice(0, 2)).toEqual(['ixy', 'I_xy'])
    expect(Number(cells[2])).toBe(section.ixy)
    expect(cells[3]).toBe('mm4')
    expect(cells[2]).toMatch(/^-\d/)
  })

  test('with semicolon and byte order mark, in cm units: Ix of the L is 80.77564102564105 cm4', () => {
    const text = figuresCsv(sectionFor(), { separator: ';', bom: true, units: { lengthUnit: 'cm' } })
    expect(text.charCodeAt(0)).toBe(0xfeff)
    const cells = (text.split('\r\n').find((row) => row.startsWith('ix;')) ?? '').split(';')
    expect(Number(cells[2])).toBeWithin(80.77564102564105, { relative: 1e-14 })
    expect(cells[3]).toBe('cm4')
  })

  test.each([
    ['=SUM(A1)', "'=SUM(A1)"],
    ['+1', "'+1"],
    ['-profile', "'-profile"],
    ['@home', "'@home"],
    ['a "b", c', '"a ""b"", c"'],
    ['two\nlines', '"two\nlines"'],
    ['plain', 'plain'],
  ])('the text %j is written %j', (text, cell) => {
    expect(csvText(text)).toBe(cell)
  })

  test('lines about the profile come first, and a title that is a formula is disarmed', () => {
    const [first] = figuresCsv(sectionFor(), { about: [['profile', '=cmd|x']] }).split('\r\n')
    expect(first).toBe("profile,'=cmd|x")
  })

  test('JSON holds every figure with a value, its unit and its three ±', () => {
    const { axes, figures } = figuresJson(sectionFor())
    expect(axes).toContain('axis 2 = axis 1 turned +90°')
    expect(figures.find(({ key }) => key === 'ix')).toMatchObject({ unit: 'mm4', origin: 'exact' })
    expect(figures.find(({ key }) => key === 'ix')?.plusMinus.digits).toBeGreaterThan(0)
    expect(figures.some(({ key }) => key === 'mass')).toBe(false)
  })
})
