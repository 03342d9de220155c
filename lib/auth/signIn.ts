import { database, inTransaction } from '@/db/instance'
import { findUserByEmail } from '@/db/people'
import { refillBucket, takeToken } from '@/db/rateLimit'
import { hashToken } from '@/db/sessions'
import { AppError } from '@/lib/api/errors'
import { config } from '@/lib/config'
import { pretendToVerify, verifyPassword } from './password'

interface Attempt {
  email: string
  password: string
  address: string
}
const accountBucket = (email: string) => `account:${hashToken(email.toLowerCase())}`

/** Takes one attempt of the account and of the address; throws `too_many` with the seconds to wait. */
async function takeAttempt({ email, address }: Attempt): Promise<void> {
  const size = config().signInAttempts
  const wait = await inTransaction(async (trx) => {
    const account = await takeToken(trx, accountBucket(email), { size, secondsPerToken: 60 })
    const place = await takeToken(trx, `address:${address}`, { size: 5 * size, secondsPerToken: 12 })
    return Math.max(account, place)
  })
  if (wait > 0) throw new AppError('too_many', `Too many attempts. Try again in ${wait} s.`, { retryAfter: wait })
}

/** The id of the person whose e-mail and password these are. */
export async function checkPassword(attempt: Attempt): Promise<string> {
  await takeAttempt(attempt)
  const user = await findUserByEmail(database().read, attempt.email)
  if (!user) {
    await pretendToVerify(attempt.password)
    throw new AppError('wrong_password')
  }
  if (!(await verifyPassword(attempt.password, user.passwordHash))) throw new AppError('wrong_password')
  await inTransaction((trx) => refillBucket(trx, accountBucket(attempt.email)))
  return user.id
}
