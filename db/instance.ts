import { type Database, openDatabase, type Trx } from './client'

interface Holder {
  sectionwrightDatabase?: Database
}
const holder: typeof globalThis & Holder = globalThis

/** The open database of this process. It is kept on globalThis because hot reload loads modules anew. */
export function database(): Database {
  if (!holder.sectionwrightDatabase) throw new Error('The database is not open yet.')
  return holder.sectionwrightDatabase
}

export function openProcessDatabase(file: string, maxPages?: number): Database {
  holder.sectionwrightDatabase ??= openDatabase(file, { maxPages })
  return holder.sectionwrightDatabase
}

/** Tests give the process a database of their own. */
export function setDatabase(database: Database | undefined): void {
  holder.sectionwrightDatabase = database
}

/** Runs `work` in one write transaction. Inside await only queries: everyone else waits meanwhile. */
export const inTransaction = <T>(work: (trx: Trx) => Promise<T>): Promise<T> => database().write.transaction().execute(work)
