import SqliteDatabase from 'better-sqlite3'
import {
  CamelCasePlugin,
  CompiledQuery,
  type DatabaseConnection,
  Kysely,
  SqliteDialect,
  SqliteDriver,
  type Transaction,
} from 'kysely'
import type { Schema } from './schema'

export type Db = Kysely<Schema>
export type Trx = Transaction<Schema>

/** One writer and one reader on the same file; on an image in memory they are one connection. */
export interface Database {
  read: Db
  write: Db
  writer: SqliteDatabase.Database
  close(): void
}

/**
 * Takes the write lock at once (a transaction that reads first could not be upgraded beside another process), and
 * does not roll back what SQLite has rolled back itself, as it does on a full disk.
 */
class ImmediateDriver extends SqliteDriver {
  constructor(private readonly sqlite: SqliteDatabase.Database) {
    super({ database: sqlite })
  }

  override async beginTransaction(connection: DatabaseConnection): Promise<void> {
    await connection.executeQuery(CompiledQuery.raw('begin immediate'))
  }

  override async rollbackTransaction(connection: DatabaseConnection): Promise<void> {
    if (this.sqlite.inTransaction) await super.rollbackTransaction(connection)
  }
}

export function kyselyOf(connection: SqliteDatabase.Database): Kysely<Schema> {
  const dialect = new SqliteDialect({ database: connection })
  dialect.createDriver = () => new ImmediateDriver(connection)
  return new Kysely<Schema>({ dialect, plugins: [new CamelCasePlugin()] })
}

interface Options {
  /** page limit of the file, so that a full disk can be met on purpose */
  maxPages?: number
}

export function openWriter(file: string, { maxPages }: Options = {}): SqliteDatabase.Database {
  const writer = new SqliteDatabase(file, { timeout: 5000 })
  writer.pragma('journal_mode = WAL')
  writer.pragma('synchronous = FULL')
  writer.pragma('foreign_keys = ON')
  if (maxPages) writer.pragma(`max_page_count = ${maxPages}`)
  return writer
}

/** Opens a file that is migrated already. */
export function openDatabase(file: string, options: Options = {}): Database {
  const writer = openWriter(file, options)
  const reader = new SqliteDatabase(file, { readonly: true, timeout: 5000 })
  const close = () => {
    reader.close()
    writer.close()
  }
  return { read: kyselyOf(reader), write: kyselyOf(writer), writer, close }
}

/** Opens a serialized database in memory. */
export function openImage(image: Buffer): Database {
  const writer = new SqliteDatabase(image)
  writer.pragma('foreign_keys = ON')
  const both = kyselyOf(writer)
  return { read: both, write: both, writer, close: () => void writer.close() }
}
