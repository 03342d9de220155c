import { randomBytes } from 'node:crypto'

const ALPHABET = 'abcdefghijklmnopqrstuvwxyz234567'

declare const brand: unique symbol
/** A team's id. Queries take this type for their scope, so that no other id can stand in its place. */
export type TeamId = string & { readonly [brand]: 'team' }

/** 128 random bits as 26 lower-case base32 characters. */
export function newId(bytes: Uint8Array = randomBytes(16)): string {
  let bits = 0n
  for (const byte of bytes) bits = (bits << 8n) | BigInt(byte)
  bits <<= 2n
  let id = ''
  for (let shift = 125n; shift >= 0n; shift -= 5n) id += ALPHABET[Number((bits >> shift) & 31n)]
  return id
}

/** A new team's id; a fixed one for demo data and tests. */
export const newTeamId = (id: string = newId()) => id as TeamId
