import { sql } from 'kysely'
import type { Database } from './client'

/** Answers when the file can be read; throws where it cannot. */
export async function checkReadable({ read }: Database): Promise<void> {
  await sql`select count(*) from team`.execute(read)
}
