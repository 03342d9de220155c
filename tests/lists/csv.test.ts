import { expect, test } from 'vitest'
import { PLAIN, SPREADSHEET, toCsv } from '@/components/lists/csv'

test('a title that begins with = is kept from running as a formula, a negative figure stays a number', () => {
  expect(toCsv(['title', 'theta'], [['=1+1', -7.208]], PLAIN)).toBe("title,theta\r\n'=1+1,-7.208\r\n")
})

test('quotes are doubled, and a cell with the separator is quoted', () => {
  expect(toCsv(['title'], [['Mullion, "drained"']], PLAIN)).toBe('title\r\n"Mullion, ""drained"""\r\n')
})

test('the spreadsheet form begins with a byte order mark and separates by semicolons', () => {
  expect(toCsv(['a', 'b'], [['1;2', null]], SPREADSHEET)).toBe('\ufeffa;b\r\n"1;2";\r\n')
})
