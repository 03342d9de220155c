import { createHash } from 'node:crypto'
import { type SelectQueryBuilder, type SqlBool, sql } from 'kysely'
import { z } from 'zod'
import { AppError } from '@/lib/api/errors'

/** The orders a list offers. A nullable column keeps its nulls last both ways. */
export type Keyset<Row> = Record<
  string,
  { column: string; id: string; of: (row: Row) => string | number | null; nullable?: boolean }
>

interface Ask {
  sort: string
  dir: 'asc' | 'desc'
  cursor?: string
  limit: number
  /** everything that narrows the list: a cursor of another filter is refused */
  filter: unknown[]
}

const Cursor = z.tuple([z.string(), z.enum(['asc', 'desc']), z.union([z.string(), z.number(), z.null()]), z.string(), z.string()])
type Cursor = z.infer<typeof Cursor>
const Counted = z.object({ total: z.int() })

const hashOf = (filter: unknown[]) => createHash('sha256').update(JSON.stringify(filter)).digest('base64url').slice(0, 12)

function readCursor(text: string, { sort, dir, filter }: Ask): Cursor {
  try {
    const cursor = Cursor.parse(JSON.parse(Buffer.from(text, 'base64url').toString()))
    if (cursor[0] === sort && cursor[1] === dir && cursor[4] === hashOf(filter)) return cursor
  } catch {
    // falls through to the one answer for every cursor that is not ours
  }
  throw new AppError('invalid', 'The cursor belongs to another list. Start at the first page.')
}

/** One page in a total order: `limit` rows after the cursor, the cursor of the next page, and how many there are in all. */
export async function pageOf<DB, TB extends keyof DB, Row extends { id: string }, View>(
  query: SelectQueryBuilder<DB, TB, Row>,
  keyset: Keyset<Row>,
  ask: Ask,
  toView: (row: Row) => View,
): Promise<{ items: View[]; next: string | null; total: number }> {
  const { column, id, of, nullable = false } = keyset[ask.sort]
  const [value, key] = [sql.ref<string | number | null>(column), sql.ref<string>(id)]
  const direction = sql.raw(ask.dir)
  const behind = ask.dir === 'asc' ? sql`(${value} is null)` : sql`(${value} is not null)`
  const order = nullable ? sql`${behind} ${direction}, ${value} ${direction}` : sql`${value} ${direction}`

  let rows = query
  if (ask.cursor) {
    const [, , from, fromId] = readCursor(ask.cursor, ask)
    const op = sql.raw(ask.dir === 'asc' ? '>' : '<')
    const past =
      from === null
        ? sql<SqlBool>`(${value} is null and ${key} ${op} ${fromId})`
        : nullable
          ? sql<SqlBool>`(${behind}, ${value}, ${key}) ${op} (${ask.dir === 'asc' ? 0 : 1}, ${from}, ${fromId})`
          : sql<SqlBool>`(${value}, ${key}) ${op} (${from}, ${fromId})`
    rows = rows.where(past)
  }
  const found = await rows
    .orderBy(sql`${order}, ${key} ${direction}`)
    .limit(ask.limit + 1)
    .execute()
  const counted = await query.clearSelect().select(sql<number>`count(*)`.as('total')).executeTakeFirstOrThrow()

  const last = found.length > ask.limit ? found[ask.limit - 1] : undefined
  const cursor: Cursor | null = last ? [ask.sort, ask.dir, of(last), last.id, hashOf(ask.filter)] : null
  return {
    items: found.slice(0, ask.limit).map((row) => toView(row)),
    next: cursor && Buffer.from(JSON.stringify(cursor)).toString('base64url'),
    total: Counted.parse(counted).total,
  }
}

/** `%text%` for LIKE with `\` as escape. */
export const containing = (text: string) => `%${text.replace(/[\\%_]/g, '\\$&')}%`
