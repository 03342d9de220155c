import type { Migration } from 'kysely'
import * as start from './0001-start'

/** All migrations by name, in order. A new one is a file and a row; an old one is never changed. */
export const MIGRATIONS: Record<string, Migration> = {
  '0001-start': start,
}
