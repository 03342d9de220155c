import { describe, expect, it } from 'vitest'
import { DEFAULT_LIMITS } from '@/lib/dxf/drawing'
import {
  bytesOf,
  codesOf,
  drawn,
  EOF,
  endsOf,
  entity,
  finding,
  fixture,
  groups,
  latin,
  line,
  read,
  section,
  select,
  table,
} from '../support/dxf'

const TRIANGLE = line(0, 0, 30, 0) + line(30, 0, 0, 40) + line(0, 40, 0, 0)
const WANTED = [
  [0, 0, 30, 0],
  [30, 0, 0, 40],
  [0, 40, 0, 0],
]
const good = drawn(TRIANGLE)
const utf16 = (text: string, big: boolean): Uint8Array =>
  Uint8Array.from(
    [...`\ufeff${text}`].flatMap((c) => {
      const code = c.charCodeAt(0)
      return big ? [code >> 8, code & 255] : [code & 255, code >> 8]
    }),
  )

describe('forms of a file that are read right', () => {
  it.each<[string, string | Uint8Array]>([
    ['LF', good],
    ['CR LF', good.replaceAll('\n', '\r\n')],
    ['CR', good.replaceAll('\n', '\r')],
    ['CR CR LF', good.replaceAll('\n', '\r\r\n')],
    ['mixed line ends', good.replace(/\n/g, (_, at: number) => ['\n', '\r\n', '\r'][at % 3])],
    ['blanks and tabs before and after codes', good.replace(/^(\d+)\n/gm, '  \t$1 \n')],
    ['blank lines before codes', good.replace(/\n0\n(?=[A-Z])/g, '\n\n \n0\n')],
    ['no line end after EOF', good.trimEnd()],
    ['Ctrl-Z after EOF', `${good}\u001a`],
    ['a UTF-8 mark', `\ufeff${good}`],
    ['UTF-16, low byte first', utf16(good, false)],
    ['UTF-16, high byte first', utf16(good, true)],
    ['comments between all groups', good.replace(/(^\d+\n.*\n)/gm, '$1999\n1,5 and $INSUNITS\n')],
    ['no header', section('ENTITIES', TRIANGLE) + EOF],
    ['R12', drawn(TRIANGLE, { version: 'AC1009' })],
    ['R2018', drawn(TRIANGLE, { version: 'AC1032' })],
    ['a table without ENDTAB', drawn(TRIANGLE, { before: table('LAYER', [[2, 'A']]).replace('0\nENDTAB\n', '') })],
    [
      'a foreign record in the layer table',
      drawn(TRIANGLE, { before: table('LAYER', [[2, 'A']]).replace('0\nENDTAB', '0\nFOREIGN\n2\nX\n0\nENDTAB') }),
    ],
    ['an unknown section', drawn(TRIANGLE, { before: section('NEWS', groups([0, 'LINE'], [10, 'x'])) })],
    [
      '290 with 7',
      drawn(TRIANGLE, {
        before: table('LAYER', [
          [2, '0'],
          [290, 7],
        ]),
      }),
    ],
    ['a missing ENDSEC', good.replace('0\nENDSEC\n0\nEOF', '0\nEOF')],
  ])('%s', (_, file) => {
    expect(endsOf(read(file))).toEqual(WANTED)
    expect(codesOf(read(file))).toEqual([])
  })

  it('reads entities without any section, and says so', () => {
    const drawing = read(TRIANGLE + EOF)
    expect(endsOf(drawing)).toEqual(WANTED)
    expect(codesOf(drawing)).toEqual(['file-without-sections'])
  })

  it('reads both of two ENTITIES sections, and says so', () => {
    const drawing = read(section('ENTITIES', line(0, 0, 30, 0)) + section('ENTITIES', line(30, 0, 0, 40)) + EOF)
    expect(drawing.edges.count).toBe(2)
    expect(codesOf(drawing)).toEqual(['sections-repeated'])
  })

  it('reads BLOCKS that follow ENTITIES', () => {
    const drawing = read(
      section('ENTITIES', entity('INSERT', [2, 'B'], [10, 5], [20, 0])) +
        section('BLOCKS', entity('BLOCK', [2, 'B'], [10, 0], [20, 0]) + TRIANGLE + groups([0, 'ENDBLK'])) +
        EOF,
    )
    expect(endsOf(drawing)[0]).toEqual([5, 0, 35, 0])
  })

  it('does not read what follows EOF, and says so', () => {
    const drawing = read(good + drawn(line(7, 7, 8, 8)))
    expect(drawing.edges.count).toBe(3)
    expect(codesOf(drawing)).toEqual(['file-goes-on'])
  })

  it.each([
    ['p01', 'R12, codes of one byte', 'AC1009'],
    ['p14', 'R2010, codes of two bytes', 'AC1024'],
  ])('reads %s written as binary DXF by another program (%s) as the same drawing', (name, _, version) => {
    const text = read(fixture('cases', `${name}.dxf`))
    const binary = read(fixture('dxf', `${name}-binary.dxf`))
    expect(binary.acadVersion).toBe(version)
    expect(endsOf(binary)).toEqual(endsOf(text))
    expect(binary.edges.shapes.slice(0, binary.edges.shapesUsed)).toEqual(text.edges.shapes.slice(0, text.edges.shapesUsed))
    expect(binary.read).toEqual(text.read)
    expect(binary.declared).toBe(text.declared)
  })
})

describe('files cut short', () => {
  it.each([
    ['in a number', good.indexOf('11\n30') + 4],
    ['behind a code', good.indexOf('11\n30') + 3],
    ['behind an entity', good.lastIndexOf('0\nLINE')],
    ['before ENDSEC', good.lastIndexOf('0\nENDSEC')],
    ['in the header', good.indexOf('$INSUNITS') + 4],
  ])('a file cut %s gives an error that names the line', (_, at) => {
    const found = finding(read(good.slice(0, at)), 'file-cut')
    expect(found.severity).toBe('error')
    expect(found.message).toMatch(/ends too early, at line \d+/)
  })

  it('a file whose ENTITIES are complete is read with a warning when only EOF is missing', () => {
    const drawing = read(good.replace(EOF, ''))
    expect(endsOf(drawing)).toEqual(WANTED)
    expect(codesOf(drawing)).toEqual(['file-without-eof'])
  })

  it('a binary file cut anywhere is an error', () => {
    const bytes = fixture('dxf', 'p01-binary.dxf')
    for (let size = 30; size < bytes.length - 40; size += 97) {
      expect(read(bytes.slice(0, size)).findings.some(({ severity }) => severity === 'error')).toBe(true)
    }
  })

  it('a line that should hold a group code and does not is named, with its text', () => {
    const { message } = finding(read(good.replace('0\nENDSEC\n0\nEOF', 'SUDDENLY\nENDSEC')), 'file-broken')
    expect(message).toContain('"SUDDENLY"')
    expect(message).toContain('at line 55,')
  })
})

describe('files that are no DXF', () => {
  it.each<[string, string | Uint8Array, RegExp]>([
    ['empty', '', /empty/],
    ['blank', ' \r\n\n', /empty/],
    ['DWG', 'AC1032\0\0\0\0\0', /a DWG/],
    ['PDF', '%PDF-1.7\n1 0 obj', /a PDF/],
    ['ZIP', 'PK\u0003\u0004....', /ZIP/],
    ['PNG', latin('\u0089PNG\r\n\u001a\n'), /PNG/],
    ['JPEG', latin('\u00ff\u00d8\u00ff\u00e0'), /JPEG/],
    ['STEP', 'ISO-10303-21;\nHEADER;', /STEP/],
    ['IGES', `${' '.repeat(72)}S      1\n`, /IGES/],
    ['SVG', '<?xml version="1.0"?>\n<svg xmlns="http://www.w3.org/2000/svg"/>', /SVG/],
    ['HTML', '<!DOCTYPE html><html></html>', /HTML/],
    ['text', 'Dear Sirs,\nplease', /a text/],
    ['zeros', new Uint8Array(100000), /another kind/],
  ])('%s is named in one sentence with the cure', (_, file, says) => {
    const drawing = read(file)
    expect(drawing.findings).toHaveLength(1)
    expect(drawing.findings[0].severity).toBe('error')
    expect(drawing.findings[0].message).toMatch(says)
    expect(drawing.edges.count).toBe(0)
  })
})

describe('limits', () => {
  it('a file above the byte limit is refused with the limit and its setting', () => {
    const { message } = finding(read(good, { ...DEFAULT_LIMITS, bytes: 100 }), 'file-too-large')
    expect(message).toContain('takes 100 (setting bytes)')
  })

  it('reading stops at the entity limit with an error', () => {
    const drawing = read(drawn(TRIANGLE.repeat(10)), { ...DEFAULT_LIMITS, entities: 20 })
    expect(finding(drawing, 'too-many-entities').message).toContain('more than 20 entities (setting entities)')
  })

  it('lists 2,000 findings of one code and counts the rest', () => {
    const drawing = read(drawn(line('x', 0, 1, 1).repeat(5000)))
    expect(drawing.remarks).toHaveLength(2000)
    expect(drawing.entities.count).toBe(5000)
    expect(select(drawing).findings.filter(({ code }) => code === 'number-bad')).toHaveLength(2000)
  })
})

describe('what only a hostile file has', () => {
  it('70,000 layouts are never taken for the model', () => {
    const on = (i: number) => line(0, 0, i, 1, [67, 1], [410, `L${i}`])
    const drawing = read(drawn(Array.from({ length: 70_000 }, (_, i) => on(i)).join('')))
    expect(select(drawing).edges).toHaveLength(0)
    expect(drawing.spaces.length).toBeLessThanOrEqual(10_001)
  })

  it('5,000 unknown kinds are counted, most of them as OTHER', () => {
    const drawing = read(drawn(Array.from({ length: 5000 }, (_, i) => entity(`K${i}`)).join('')))
    const { ignored } = drawing
    expect(Object.values(ignored).reduce((sum, n) => sum + n, 0)).toBe(5000)
    expect(ignored.OTHER).toBeGreaterThan(3900)
    for (const { message } of drawing.findings) expect(message.length).toBeLessThan(500)
  })

  it('more than 100,000 blocks are refused', () => {
    const blocks = `${groups([0, 'BLOCK'], [2, 'B'])}`.repeat(100_001)
    expect(finding(read(drawn(TRIANGLE, { before: section('BLOCKS', blocks) })), 'too-many-blocks').severity).toBe('error')
  })
})

describe('unit and version', () => {
  it.each([
    [0, 'none', null],
    [1, 'in', 25.4],
    [2, 'ft', 304.8],
    [4, 'mm', 1],
    [5, 'cm', 10],
    [6, 'm', 1000],
    [9, 'mil', 0.0254],
    [13, 'µm', 0.001],
    [21, 'US ft', 1200000 / 3937],
  ])('$INSUNITS %i is %s', (unit, declared, mm) => {
    const drawing = read(drawn(TRIANGLE, { unit }))
    expect([drawing.declared, drawing.declaredMm]).toEqual([declared, mm])
  })

  it('an unknown unit code is a warning, and no unit', () => {
    const drawing = read(drawn(TRIANGLE, { unit: 99 }))
    expect(drawing.declaredMm).toBeNull()
    expect(finding(drawing, 'unit-unknown').severity).toBe('warning')
  })

  it('a comment after $INSUNITS does not become its value', () => {
    expect(read(good.replace('$INSUNITS\n', '$INSUNITS\n999\n6\n')).declared).toBe('mm')
  })

  it('$MEASUREMENT is a hint', () => {
    const hint = (value: number) =>
      read(section('HEADER', groups([9, '$MEASUREMENT'], [70, value])) + section('ENTITIES', TRIANGLE) + EOF).measurement
    expect([hint(0), hint(1)]).toEqual(['english', 'metric'])
  })
})

it('reads bytes that stand anywhere in a larger buffer', () => {
  const bytes = bytesOf(good)
  const larger = new Uint8Array(bytes.length + 7)
  larger.set(bytes, 7)
  expect(endsOf(read(larger.subarray(7)))).toEqual(WANTED)
})
