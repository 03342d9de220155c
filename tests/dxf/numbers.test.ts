import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { NumberReader } from '@/lib/dxf/number'
import { bytesOf, codesOf, drawn, endsOf, finding, line, read } from '../support/dxf'

const numberIn = (text: string): number => {
  const bytes = bytesOf(text)
  return new NumberReader().read(bytes, 0, bytes.length)
}

describe('numbers', () => {
  it('reads every double in its shortest text back to the last bit', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => numberIn(String(value)) === value),
      { numRuns: 5000 },
    )
  })

  it('reads any decimal text as the nearest double, as the language itself does', () => {
    const digits = fc.stringMatching(/^[0-9]{1,25}$/)
    const text = fc.tuple(fc.constantFrom('', '-', '+'), digits, fc.option(digits), fc.option(fc.integer({ min: -40, max: 40 })))
    fc.assert(
      fc.property(text, ([sign, whole, decimals, exponent]) => {
        const written = `${sign}${whole}${decimals === null ? '' : `.${decimals}`}${exponent === null ? '' : `E${exponent}`}`
        expect(numberIn(written)).toBe(Number(written))
      }),
      { numRuns: 5000 },
    )
  })

  it('reads .5, 5., +5, 5e0 and padded 5', () => {
    expect(['.5', '5.', '+5', '5e0', '  5\t'].map(numberIn)).toEqual([0.5, 5, 5, 5, 5])
  })

  it('keeps the tie 9007199254740993 and the 22nd power of ten right', () => {
    expect(numberIn('9007199254740993')).toBe(9007199254740992)
    expect(numberIn('9007199254740995')).toBe(9007199254740996)
    expect(numberIn('1e-22')).toBe(1e-22)
    expect(numberIn('123456789e22')).toBe(123456789e22)
  })

  it.each(['40mm', '12,5', '', ' ', '.', '-', '1e', '1e+', '0x10', '--5', '1 2', 'NaN', 'Infinity', '1e999', '5d0', '1.2.3'])(
    'refuses "%s"',
    (text) => {
      expect(numberIn(text)).toBeNaN()
    },
  )

  it.each(['40mm', '12,5', 'NaN', '1e999'])('names "%s", its line and the cure, and gives no edge for it', (text) => {
    const drawing = read(drawn(line(0, 0, text, 5, [5, '2F'])))
    const { message, severity } = finding(drawing, 'number-bad')
    expect(severity).toBe('error')
    expect(message).toContain(`"${text}"`)
    expect(message).toContain('LINE, handle 2F, line 19 of the file')
    expect(message).toContain('(group 11, line 28)')
    expect(message).toContain('decimal point')
    expect(drawing.edges.count).toBe(0)
  })

  it('refuses coordinates beyond 1e12', () => {
    expect(codesOf(read(drawn(line(0, 0, '1e300', 5))))).toContain('number-large')
  })

  it('refuses a coordinate given twice with two values and takes one given twice alike', () => {
    expect(codesOf(read(drawn(line(0, 0, 1, 5, [11, 2]))))).toContain('group-repeated')
    expect(endsOf(read(drawn(line(0, 0, 1, 5, [11, '1.0']))))).toEqual([[0, 0, 1, 5]])
  })

  it.each([
    ['0.000001', 5e-7],
    ['60.0', 0],
    ['60', 0],
    ['12.345', 0.0005],
    ['12.34567890123456', 0],
    ['12.500000', 5e-7],
    ['1.25E-03', 5e-6],
  ])('takes half of the last written digit of %s as %f', (text, half) => {
    expect(read(drawn(line(0, 0, text, text))).lastDigit).toBe(half)
  })
})
