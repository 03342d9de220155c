import { expect, test } from 'vitest'
import { newId } from '@/db/id'
import { letterOf } from '@/db/letter'
import { Id } from '@/lib/api/schemas/common'

test('an id is 26 characters for 128 bits and no two of 1,000 are alike', () => {
  const ids = Array.from({ length: 1000 }, () => newId())
  expect(new Set(ids).size).toBe(1000)
  for (const id of ids) expect(Id.safeParse(id).success).toBe(true)
  expect(newId(new Uint8Array(16))).toBe('a'.repeat(26))
  expect(newId(new Uint8Array(16).fill(255))).toBe(`${'7'.repeat(25)}4`)
})

test('the 8th revision is H, the 9th J, the 20th Y, the 21st AA', () => {
  expect([7, 8, 19, 20, 39, 40].map(letterOf)).toEqual(['H', 'J', 'Y', 'AA', 'AY', 'BA'])
  const letters = Array.from({ length: 500 }, (_, position) => letterOf(position))
  expect(letters.join('')).not.toMatch(/[IOQSXZ]/)
  expect(new Set(letters).size).toBe(500)
})
