import { randomInt, timingSafeEqual } from 'node:crypto'
import { readFileSync, rmSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { AppError } from '@/lib/api/errors'
import { config } from '@/lib/config'

const file = () => path.join(config().dataDir, 'setup-code')

/** Whoever sets the server up from beyond this machine must have seen its output. */
export const isCodeAsked = () => !config().local

/** The one-time code, made at the first start and kept until the server is set up. */
export function setupCode(): string {
  const fresh = String(randomInt(0, 1_000_000_000_000)).padStart(12, '0')
  try {
    writeFileSync(file(), fresh, { flag: 'wx', mode: 0o600 })
    return fresh
  } catch {
    return readFileSync(file(), 'utf8')
  }
}

export function checkSetupCode(given = ''): void {
  if (!isCodeAsked()) return
  const [wanted, got] = [Buffer.from(setupCode()), Buffer.from(given.replace(/\D/g, '').padEnd(12, ' '))]
  if (wanted.length !== got.length || !timingSafeEqual(wanted, got)) throw new AppError('code_wrong')
}

export const forgetSetupCode = () => rmSync(file(), { force: true })
