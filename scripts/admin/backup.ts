import { existsSync, statSync } from 'node:fs'
import path from 'node:path'
import SqliteDatabase from 'better-sqlite3'
import { backupTo } from '@/db/migrate'
import { config } from '@/lib/config'

const help = `usage: npm run backup [-- FILE]

Copies the database with all source files to FILE (DATA_DIR/backups/<time>.sqlite) and checks the copy.
The server may be running. DATA_DIR says which database, ./data if it is not set.`

async function run([given]: string[]): Promise<string> {
  const { databaseFile, dataDir } = config()
  if (!existsSync(databaseFile)) throw new Error(`There is no database at ${databaseFile}. Set DATA_DIR to its folder.`)
  const file = path.resolve(given ?? path.join(dataDir, 'backups', `${new Date().toISOString().replace(/[:.]/g, '-')}.sqlite`))
  const connection = new SqliteDatabase(databaseFile, { readonly: true, timeout: 5000 })
  try {
    await backupTo(connection, file)
  } finally {
    connection.close()
  }
  return `Backed up to ${file} (${statSync(file).size} bytes), checked and sound.`
}

export const backup = { help, run }
