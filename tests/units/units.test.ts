import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { lastSurvivingPlace, survivingDigits } from '@/lib/units/digits'
import { format, plain } from '@/lib/units/format'
import { parseLength } from '@/lib/units/parseLength'
import { parseNumber } from '@/lib/units/parseNumber'
import type { UnitSettings } from '@/lib/units/quantity'
import { fromUnit, toUnit, unitOf } from '@/lib/units/units'

const mm: UnitSettings = { lengthUnit: 'mm', digits: 5 }
const cm: UnitSettings = { lengthUnit: 'cm', digits: 4 }
const inch: UnitSettings = { lengthUnit: 'in', digits: 4 }

describe('units', () => {
  // 1 in = 25.4 mm and 1 lb = 0.45359237 kg exactly: International Yard and Pound Agreement, 1959 (from memory)
  test('1 in⁴ is 416231.4256 mm⁴ and 1 lb/ft is 1.488163943569554 kg/m', () => {
    expect(fromUnit(1, 'secondMoment', 'in')).toBeWithin(416231.4256, { relative: 1e-15 })
    expect(fromUnit(1, 'massPerLength', 'in')).toBeWithin(1.488163943569554, { relative: 1e-15 })
  })
  test('1 kN·m is 1e6 N·mm and 1 kN/m is 1 N/mm', () => {
    expect(fromUnit(1, 'moment', 'mm')).toBe(1e6)
    expect(fromUnit(1, 'lineLoad', 'mm')).toBe(1)
  })
  // 1 psi = 6894.757293168 Pa: NIST SP 811, appendix B (from memory)
  test('1 psi is 0.006894757293168 MPa and 1 lbf/ft is 0.01459390294 N/mm', () => {
    expect(fromUnit(1, 'stress', 'in')).toBeWithin(0.006894757293168, { relative: 1e-12 })
    expect(fromUnit(1, 'lineLoad', 'in')).toBeWithin(0.0145939029372, { relative: 1e-10 })
  })
  test('going to a unit and back changes nothing beyond the last digit', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-9, max: 1e15, noNaN: true }),
        fc.constantFrom('mm' as const, 'cm' as const, 'in' as const),
        (value, system) => {
          expect(fromUnit(toUnit(value, 'secondMoment', system), 'secondMoment', system)).toBeWithin(value, { relative: 4e-16 })
        },
      ),
      { seed: 11 },
    )
  })
  test('a second moment in cm comes as the parts cm to the power 4, in ASCII cm4', () => {
    expect(unitOf('secondMoment', 'cm')).toMatchObject({ parts: [{ base: 'cm', power: 4 }], ascii: 'cm4' })
    expect(unitOf('massPerLength', 'in').ascii).toBe('lb/ft')
  })
})

describe('format', () => {
  test('1987618 mm⁴ at five digits is "1\u2009987\u2009600" and in cm⁴ at four 198.8', () => {
    expect(format(1987618, 'secondMoment', mm).text).toBe('1\u2009987\u2009600')
    expect(format(1987618, 'secondMoment', cm)).toEqual({ text: '198.8', unit: [{ base: 'cm', power: 4 }] })
  })
  test('−7.2083° carries a true minus', () => {
    expect(format(-7.2083, 'angle', cm).text).toBe('\u22127.208')
  })
  test('four figures stand together, five are grouped', () => {
    expect(format(9999, 'length', cm).text).toBe('9999')
    expect(format(12345, 'length', mm).text).toBe('12\u2009345')
  })
  test('3 pieces are 3 and 25.4 mm is 1.000 in', () => {
    expect(format(3, 'count', mm).text).toBe('3')
    expect(format(25.4, 'length', inch).text).toBe('1.000')
  })
  test('rounding noise below the ± prints as 0, without a minus', () => {
    expect(format(-1e-10, 'secondMoment', mm, 1e-3).text).toBe('0')
  })
  test('only digits that survive are printed: 12.3456 ± 0.03 is 12.3, ± 0.07 is 12', () => {
    expect(format(12.3456, 'length', mm, 0.03).text).toBe('12.3')
    expect(format(12.3456, 'length', mm, 0.07).text).toBe('12')
    expect(survivingDigits(1987618, 9, 300)).toBe('1988000')
    expect(lastSurvivingPlace(0.05)).toBe(-1)
    expect(lastSurvivingPlace(0.0500001)).toBe(0)
  })
  test('what is printed is within half of its last place of the value, whatever the ±', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-6, max: 1e12 }),
        fc.double({ min: 1e-9, max: 1e3 }),
        fc.integer({ min: 3, max: 12 }),
        (v, pm, n) => {
          const place = Math.max(lastSurvivingPlace(pm), Math.floor(Math.log10(v)) - n + 1)
          expect(Number(survivingDigits(v, n, pm))).toBeWithin(v, { absolute: 0.5000001 * 10 ** place })
        },
      ),
      { seed: 12 },
    )
  })
  test('copies are plain ASCII that reads back to the same number', () => {
    expect(plain(-1987618.123456789, 'secondMoment', mm)).toBe('-1987618.123456789')
    expect(plain(-0, 'length', mm)).toBe('0')
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        expect(Number(plain(value, 'area', mm))).toBe(value + 0)
      }),
      { seed: 13 },
    )
  })
})

describe('parseNumber', () => {
  test.each([
    ['12,5', 12.5],
    ['12.5', 12.5],
    [' 1 250,5 ', 1250.5],
    ['1\u2009987\u2009618', 1987618],
    ['\u22127,208', -7.208],
    ['+.5', 0.5],
    ['7,', 7],
    ['2e3', 2000],
    ['0,250', 0.25],
    ['1250', 1250],
  ])('"%s" is %d', (text, value) => {
    expect(parseNumber(text)).toMatchObject({ ok: true, value })
  })
  test('"1,250" is read as 1.25 with an echo, and refused in a pasted column', () => {
    expect(parseNumber('1,250')).toEqual({ ok: true, value: 1.25, echo: 'Read as 1.25, not as 1250.' })
    expect(parseNumber('1,250', { strict: true })).toMatchObject({ ok: false })
    expect(parseNumber('12,50', { strict: true })).toEqual({ ok: true, value: 12.5 })
  })
  test.each(['1,234.5', '1.234,5', '1,234,567', '1 2', '12 5', '', 'abc', '40mm', '1e999', '.', '--1', '0x10', 'Infinity'])(
    '"%s" is refused with a sentence',
    (text) => {
      const answer = parseNumber(text)
      expect(answer.ok).toBe(false)
      expect(!answer.ok && answer.message.endsWith('.')).toBe(true)
    },
  )
  test('what format prints at full digits is read back', () => {
    fc.assert(
      fc.property(fc.double({ min: -1e9, max: 1e9, noNaN: true }), (value) => {
        const { text } = format(value, 'length', { lengthUnit: 'mm', digits: 12 })
        expect(parseNumber(text)).toMatchObject({ ok: true })
        const parsed = parseNumber(text)
        expect(parsed.ok ? parsed.value : Number.NaN).toBeWithin(value, { relative: 1e-11 })
      }),
      { seed: 14 },
    )
  })
})

describe('parseLength', () => {
  test.each([
    ['12,5', 'mm', 12.5],
    ['12.5 mm', 'in', 12.5],
    ['4 1/2 in', 'mm', 114.3],
    ['4-1/2"', 'mm', 114.3],
    ['3/8"', 'mm', 9.525],
    ['2 ft 3 in', 'mm', 685.8],
    ['5\' 6 1/2"', 'mm', 1689.1],
    ['1,5 m', 'mm', 1500],
    ['2', 'in', 50.8],
    ["10'", 'mm', 3048],
    ['-1/4 in', 'mm', -6.35],
    ['3 cm', 'mm', 30],
  ] as const)('"%s" where %s is assumed is %d mm', (text, assumed, value) => {
    const parsed = parseLength(text, assumed)
    expect(parsed.ok ? parsed.value : Number.NaN).toBeWithin(value, { relative: 1e-15 })
  })
  test.each(['1/0 in', 'four in', 'mm', '1,234.5 mm'])('"%s" is refused', (text) => {
    expect(parseLength(text, 'mm').ok).toBe(false)
  })
})
