import SqliteDatabase from 'better-sqlite3'
import { type Database, openImage } from '@/db/client'
import { migrateOpen } from '@/db/migrate'

let image: Promise<Buffer> | undefined

async function migratedImage(): Promise<Buffer> {
  const connection = new SqliteDatabase(':memory:')
  await migrateOpen(connection)
  const bytes = connection.serialize()
  connection.close()
  return bytes
}

/** A migrated database of its own, in memory. */
export async function freshDatabase(): Promise<Database> {
  image ??= migratedImage()
  return openImage(Buffer.from(await image))
}
