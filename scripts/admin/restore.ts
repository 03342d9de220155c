import { copyFileSync, existsSync, mkdirSync, renameSync, rmSync } from 'node:fs'
import path from 'node:path'
import SqliteDatabase from 'better-sqlite3'
import { checkFile } from '@/db/migrate'
import { config } from '@/lib/config'

const help = `usage: npm run restore -- FILE

Checks FILE, a backup, and puts it in the place of the database. Stop the server first.
What was there is kept in DATA_DIR/backups. Everybody who was signed in then may still be.`

/** Throws where a server has the file open. */
function requireAlone(file: string): void {
  const connection = new SqliteDatabase(file, { timeout: 0 })
  try {
    connection.pragma('locking_mode = EXCLUSIVE')
    connection.exec('begin exclusive; commit')
    connection.pragma('wal_checkpoint(TRUNCATE)')
  } catch {
    throw new Error('The server is running. Stop it, then restore.')
  } finally {
    connection.close()
  }
}

async function run([given]: string[]): Promise<string> {
  if (!given) throw new Error(help)
  const from = path.resolve(given)
  if (!existsSync(from)) throw new Error(`There is no file ${from}.`)
  const { databaseFile, dataDir } = config()
  mkdirSync(path.join(dataDir, 'backups'), { recursive: true, mode: 0o700 })
  const draft = path.join(dataDir, `restoring-${process.pid}.sqlite`)
  try {
    copyFileSync(from, draft)
    checkFile(draft)
    let kept = ''
    if (existsSync(databaseFile)) {
      requireAlone(databaseFile)
      const aside = path.join(dataDir, 'backups', `before-restore-${new Date().toISOString().replace(/[:.]/g, '-')}.sqlite`)
      renameSync(databaseFile, aside)
      kept = ` What was there is kept in ${aside}.`
    }
    for (const suffix of ['-wal', '-shm']) rmSync(databaseFile + suffix, { force: true })
    renameSync(draft, databaseFile)
    return `Restored from ${from}.${kept}`
  } finally {
    for (const suffix of ['', '-wal', '-shm', '-journal']) rmSync(draft + suffix, { force: true })
  }
}

export const restore = { help, run }
