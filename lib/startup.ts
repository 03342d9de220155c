import { randomBytes } from 'node:crypto'
import { chmodSync, existsSync, mkdirSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { database, openProcessDatabase } from '@/db/instance'
import { migrateFile } from '@/db/migrate'
import { isSetUp } from '@/db/teams'
import { isCodeAsked, setupCode } from './auth/setupCode'
import { config } from './config'
import { recover } from './jobs/recovery'
import { sectionPool } from './jobs/server-pool'
import { keepSweeping, sweep } from './jobs/sweep'
import { log } from './log'

function prepareDataDir(dataDir: string, incomingDir: string): void {
  mkdirSync(incomingDir, { recursive: true, mode: 0o700 })
  chmodSync(dataDir, 0o700)
  const secret = path.join(dataDir, 'secret')
  if (!existsSync(secret)) writeFileSync(secret, randomBytes(32).toString('base64url'), { flag: 'wx', mode: 0o600 })
}

function startPool(): void {
  const { computeSeconds, opinionSeconds, computeMemoryMb, computeChildren } = config()
  const size = computeChildren === undefined ? {} : { size: computeChildren }
  sectionPool({ seconds: computeSeconds, opinionSeconds, memoryBytes: computeMemoryMb * 1024 ** 2, ...size }).warm()
}

/** Everything before the first request: folder, secret, migrations, the open database, unfinished work. */
export async function startup(): Promise<void> {
  const { dataDir, incomingDir, databaseFile, maxPages, appUrl } = config()
  process.env.NEXTAUTH_URL = appUrl
  prepareDataDir(dataDir, incomingDir)
  const { applied, backup } = await migrateFile(databaseFile)
  if (applied.length > 0) log().info({ applied, backup }, 'migrated')
  openProcessDatabase(databaseFile, maxPages)
  startPool()
  await sweep()
  keepSweeping()
  recover().catch((error: unknown) => log().error({ error: String(error) }, 'recovery failed'))
  if (isCodeAsked() && !(await isSetUp(database().read))) {
    process.stdout.write(`\nThis server is not set up yet. Its one-time code: ${setupCode()}\n\n`)
  }
}
