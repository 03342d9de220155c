import { existsSync } from 'node:fs'
import { type Database, openDatabase } from '@/db/client'
import { migrateFile } from '@/db/migrate'
import { config } from '@/lib/config'

/** The database of DATA_DIR, in its newest form; the server may be running. */
export async function withDatabase<T>(work: (database: Database) => Promise<T>): Promise<T> {
  const { databaseFile } = config()
  if (!existsSync(databaseFile))
    throw new Error(`There is no database at ${databaseFile}. Start the server once, or set DATA_DIR.`)
  await migrateFile(databaseFile)
  const database = openDatabase(databaseFile)
  try {
    return await work(database)
  } finally {
    database.close()
  }
}
