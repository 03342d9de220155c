import { expect, test } from 'vitest'
import { readSearch } from '@/lib/api/search'

test('“Ix ≥ 40 cm⁴”, as the field says, is a condition of 400 000 mm⁴', () => {
  expect(readSearch('Ix ≥ 40 cm⁴')).toEqual({ words: [], conditions: [{ figure: 'ix', op: '>=', value: 400_000 }] })
})

test('words stand beside conditions, with and without blanks', () => {
  expect(readSearch('mullion ix>=40cm4 mass <= 2,1 kg/m circle < 140')).toEqual({
    words: ['mullion'],
    conditions: [
      { figure: 'ix', op: '>=', value: 400_000 },
      { figure: 'mass', op: '<=', value: 2.1 },
      { figure: 'circle', op: '<', value: 140 },
    ],
  })
})

test('a length is no second moment: “ix>=40mm” is a word', () => {
  expect(readSearch('ix>=40mm').conditions).toEqual([])
})
