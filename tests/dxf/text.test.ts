import { describe, expect, it } from 'vitest'
import { dxfFinding, quoted } from '@/lib/dxf/findings'
import { textReader } from '@/lib/dxf/text'
import { codesOf, drawn, finding, groups, latin, line, read, section, select, EOF } from '../support/dxf'

const layerOf = (file: string | Uint8Array) => {
  const { layers, entities } = read(file)
  return layers[entities.layer[0]].name
}
const on = (layer: string) => line(0, 0, 1, 1).replace('8\n0\n', `8\n${layer}\n`)
const paged = (page: string, layer: string, version = 'AC1015') =>
  latin(
    section('HEADER', groups([9, '$ACADVER'], [1, version], [9, '$DWGCODEPAGE'], [3, page])) +
      section('ENTITIES', on(layer)) +
      EOF,
  )

describe('names', () => {
  it.each([
    ['ANSI_1252', '\u00e4\u00df', 'äß'],
    ['ANSI_1251', '\u00c3\u00ce\u00d1\u00d2', 'ГОСТ'],
    ['ANSI_1250', '\u00b3', 'ł'],
    ['ANSI_932', '\u0083\u0076', 'プ'],
    ['ANSI_936', '\u00d0\u00cd', '型'],
    ['ANSI_949', '\u00c7\u00fc', '형'],
    ['ANSI_950', '\u00ab\u00ac', '型'],
    ['dos850', '\u0084\u00e1', 'äß'],
    ['DOS437', '\u0081\u00e1', 'üß'],
    ['ANSI_1252', '\\U+00B0C \\U+03A9', '°C Ω'],
    ['ANSI_1252', '\\M+1837A', 'ホ'],
  ])('in code page %s "%s" reads %s', (page, raw, wanted) => {
    expect(layerOf(paged(page, raw))).toBe(wanted)
  })

  it('are UTF-8 from AC1021 on, and windows-1252 where the bytes are no UTF-8', () => {
    expect(layerOf(drawn(on('Außen型'), { version: 'AC1021' }))).toBe('Außen型')
    expect(layerOf(paged('ANSI_1252', 'Au\u00dfen', 'AC1027'))).toBe('Außen')
  })

  it('after a UTF-8 mark are UTF-8 in any version', () => {
    expect(layerOf(`\ufeff${drawn(on('Außen'), { version: 'AC1009' })}`)).toBe('Außen')
  })

  it('in an unknown code page are read all the same, and it is said', () => {
    const drawing = read(paged('KOI99', 'A'))
    expect(codesOf(drawing)).toEqual(['encoding-unknown'])
    expect(textReader('AC1015', '', false).known).toBe(true)
  })

  it('that differ only in case are one layer', () => {
    const { layers } = read(drawn(on('Metal') + on('METAL') + on('metal')))
    expect(layers.map(({ name, entities }) => [name, entities])).toEqual([
      ['0', 0],
      ['Metal', 3],
    ])
  })

  it.each([
    '__proto__',
    'constructor',
    '<script>alert(1)</script>',
    '=HYPERLINK("x")',
    'A\u0007\u202eB',
    'L'.repeat(100_000),
    '',
  ])('like %.40s are just text', (name) => {
    const drawing = read(drawn(on(name), { version: 'AC1021' }))
    expect(drawing.layers[drawing.entities.layer[0]].name).toBe(name)
    expect(select(drawing).edges).toHaveLength(1)
  })
})

describe('sentences', () => {
  it('cut long names and show control characters and changes of direction as blanks', () => {
    expect(quoted('A\u0007\u202eB')).toBe('A  B')
    expect(quoted('L'.repeat(100_000))).toHaveLength(81)
    const drawing = read(drawn(on('L'.repeat(100_000)), { version: 'AC1021' }))
    expect(finding(read(drawn(line(0, 0, `${'9'.repeat(100_000)}x`, 1))), 'number-bad').message.length).toBeLessThan(400)
    expect(select(drawing, { layers: ['M'.repeat(100_000)] }).findings.every(({ message }) => message.length < 800)).toBe(true)
  })

  it('carry their parameters', () => {
    expect(dxfFinding('unit-unknown', { code: '99' })).toEqual({
      code: 'unit-unknown',
      severity: 'warning',
      params: { code: '99' },
      message: "The file's unit code ($INSUNITS 99) is not known. State the unit.",
    })
  })
})
