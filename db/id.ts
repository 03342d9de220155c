import { randomBytes } from 'node:crypto'

const ALPHABET = 'abcdefghijklmnopqrstuvwxyz234567'

export type Id<Noun extends string> = string & { readonly __noun?: Noun }
export type TeamId = Id<'team'>
export type UserId = Id<'user'>

/** 128 random bits as 26 lower-case base32 characters. */
export function newId(bytes: Uint8Array = randomBytes(16)): string {
  let bits = 0n
  for (const byte of bytes) bits = (bits << 8n) | BigInt(byte)
  bits <<= 2n
  let id = ''
  for (let shift = 125n; shift >= 0n; shift -= 5n) id += ALPHABET[Number((bits >> shift) & 31n)]
  return id
}
