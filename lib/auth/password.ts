import { randomBytes, scrypt, timingSafeEqual } from 'node:crypto'

interface Cost {
  N: number
  r: number
  p: number
}
const COST: Cost = { N: 2 ** 15, r: 8, p: 3 }
const KEY_BYTES = 32

const derive = (password: string, salt: Buffer, cost: Cost): Promise<Buffer> =>
  new Promise((resolve, reject) =>
    scrypt(password.normalize('NFKC'), salt, KEY_BYTES, { ...cost, maxmem: 256 * cost.N * cost.r }, (error, key) =>
      error ? reject(error) : resolve(key),
    ),
  )

/** `scrypt$N$r$p$salt$key`: the cost stands in the hash, so that it can be raised later. */
export async function hashPassword(password: string, cost = COST): Promise<string> {
  const salt = randomBytes(16)
  const key = await derive(password, salt, cost)
  return ['scrypt', cost.N, cost.r, cost.p, salt.toString('base64url'), key.toString('base64url')].join('$')
}

export async function verifyPassword(password: string, hash: string): Promise<boolean> {
  const [name, N, r, p, salt, key] = hash.split('$')
  if (name !== 'scrypt') return false
  const wanted = Buffer.from(key, 'base64url')
  const got = await derive(password, Buffer.from(salt, 'base64url'), { N: Number(N), r: Number(r), p: Number(p) })
  return timingSafeEqual(got, wanted)
}

let decoy: Promise<string> | undefined

/** As long as a verification takes: an unknown address must not be told from a wrong password by time. */
export async function pretendToVerify(password: string): Promise<void> {
  decoy ??= hashPassword('no password at all')
  await verifyPassword(password, await decoy)
}
