import { existsSync, mkdirSync, rmSync } from 'node:fs'
import path from 'node:path'
import SqliteDatabase from 'better-sqlite3'
import { type Migration, Migrator } from 'kysely'
import { kyselyOf, openWriter } from './client'
import { MIGRATIONS } from './migrations'

const NAMES = 'select name from kysely_migration order by name'

function appliedIn(connection: SqliteDatabase.Database): string[] {
  const table = connection.prepare("select 1 from sqlite_master where name = 'kysely_migration'").get()
  if (!table) return []
  return connection
    .prepare<[], { name: string }>(NAMES)
    .all()
    .map(({ name }) => name)
}

/** Copies the open database to `file` and proves the copy sound; throws where it is not. */
export async function backupTo(connection: SqliteDatabase.Database, file: string): Promise<void> {
  if (existsSync(file)) throw new Error(`${file} exists already. Choose another name.`)
  mkdirSync(path.dirname(file), { recursive: true, mode: 0o700 })
  await connection.backup(file)
  checkFile(file)
}

/** Throws unless `file` is a sound database of this product. */
export function checkFile(file: string): void {
  let copy: SqliteDatabase.Database | undefined
  try {
    copy = new SqliteDatabase(file, { fileMustExist: true })
    copy.pragma('journal_mode = DELETE')
    const verdict = copy.pragma('integrity_check', { simple: true })
    const orphans = copy.pragma('foreign_key_check')
    if (verdict !== 'ok' || (Array.isArray(orphans) && orphans.length > 0))
      throw new Error(`${file} is damaged: ${String(verdict)}`)
    if (appliedIn(copy).length === 0) throw new Error(`${file} is no database of Sectionwright.`)
  } finally {
    copy?.close()
  }
}

interface Outcome {
  applied: string[]
  backup: string | null
}

/** Brings the file to the newest form in one transaction, after a checked backup of what was there. */
export async function migrateFile(
  file: string,
  { migrations = MIGRATIONS, stamp = new Date() }: { migrations?: Record<string, Migration>; stamp?: Date } = {},
): Promise<Outcome> {
  const writer = openWriter(file)
  try {
    const before = appliedIn(writer)
    const unknown = before.filter((name) => !(name in migrations))
    if (unknown.length > 0) {
      throw new Error(
        `${file} was written by a newer version of Sectionwright (${unknown.join(', ')}). Run that version, or restore an older backup.`,
      )
    }
    const missing = Object.keys(migrations).filter((name) => !before.includes(name))
    if (missing.length === 0) return { applied: [], backup: null }
    const backup = before.length > 0 ? backupName(file, missing[0], stamp) : null
    if (backup) {
      rmSync(backup, { force: true })
      await backupTo(writer, backup)
    }
    return { applied: await migrateOpen(writer, migrations), backup }
  } finally {
    writer.close()
  }
}

const backupName = (file: string, migration: string, stamp: Date) =>
  path.join(path.dirname(file), 'backups', `before-${migration}-${stamp.toISOString().replace(/[:.]/g, '-')}.sqlite`)

/** Applies what is missing to an open connection, all or nothing. */
export async function migrateOpen(writer: SqliteDatabase.Database, migrations = MIGRATIONS): Promise<string[]> {
  const migrator = new Migrator({ db: kyselyOf(writer), provider: { getMigrations: async () => migrations } })
  writer.exec('BEGIN IMMEDIATE')
  try {
    const { error, results = [] } = await migrator.migrateToLatest()
    if (error) throw error
    writer.exec('COMMIT')
    return results.map(({ migrationName }) => migrationName)
  } catch (error) {
    if (writer.inTransaction) writer.exec('ROLLBACK')
    throw error
  }
}
