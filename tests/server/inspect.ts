import { readdirSync } from 'node:fs'
import path from 'node:path'
import SqliteDatabase from 'better-sqlite3'

/** What lies in the database of a stopped server, and whether it is sound and whole. */
export function inspect(dataDir: string) {
  const connection = new SqliteDatabase(path.join(dataDir, 'sectionwright.sqlite'))
  const count = (text: string) => connection.prepare<[], { n: number }>(`select count(*) as n from ${text}`).get()?.n
  const found = {
    integrity: connection.pragma('integrity_check', { simple: true }),
    references: connection.pragma('foreign_key_check'),
    revisions: count('revision'),
    sections: count('section'),
    events: count("event where verb = 'revision.added'"),
    intakes: count('intake'),
    openKeys: count('idempotency where status is null'),
    strayChunks: count(
      'chunk where blob_id not in (select blob_id from source_file) and blob_id not in (select region_blob_id from section)',
    ),
    shortFiles: count(
      'source_file f where f.bytes <> (select coalesce(sum(length(data)), 0) from chunk c where c.blob_id = f.blob_id)',
    ),
    incoming: readdirSync(path.join(dataDir, 'incoming')),
  }
  connection.close()
  return found
}

/** Nothing under way, nothing half there. */
export const WHOLE = {
  integrity: 'ok',
  references: [],
  intakes: 0,
  openKeys: 0,
  strayChunks: 0,
  shortFiles: 0,
  incoming: [],
}
