import { expect, test } from 'vitest'
import { hashPassword, verifyPassword } from '@/lib/auth/password'

test('a password is kept as scrypt with N 32768, r 8, p 3 and a salt of its own', async () => {
  const [one, two] = [await hashPassword('a long password'), await hashPassword('a long password')]
  expect(one).toMatch(/^scrypt\$32768\$8\$3\$/)
  expect(one).not.toBe(two)
  expect(await verifyPassword('a long password', one)).toBe(true)
  expect(await verifyPassword('a long passwors', one)).toBe(false)
})

test('the cost is read from the hash, so an older one still opens', async () => {
  const old = await hashPassword('a long password', { N: 1024, r: 8, p: 1 })
  expect(old).toMatch(/^scrypt\$1024\$8\$1\$/)
  expect(await verifyPassword('a long password', old)).toBe(true)
  expect(await verifyPassword('a long password', old.replace('scrypt', 'plain'))).toBe(false)
})

test('the same letters typed as composed or as parts are one password', async () => {
  const hash = await hashPassword('Zürich-Zürich', { N: 1024, r: 8, p: 1 })
  expect(await verifyPassword('Zürich-Zürich'.normalize('NFD'), hash)).toBe(true)
})
