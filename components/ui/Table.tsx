'use client'
import type { ReactNode } from 'react'
import { classes } from './classes'

export interface Column<Row> {
  key: string
  head: ReactNode
  cell: (row: Row) => ReactNode
  /** the same as it stands in an export; absent where there is nothing to export */
  plain?: (row: Row) => string | number | null
  /** the head of the export's column, with its unit */
  plainHead?: string
  /** the name the list is sorted by in the URL; absent where it cannot be sorted */
  sort?: string
  /** figures stand at the right, in the mono face */
  figure?: boolean
  /** left out on a phone */
  wide?: boolean
}

export interface Sorting {
  by: string
  dir: 'asc' | 'desc'
  onSort: (by: string, dir: 'asc' | 'desc') => void
}

/** A table of rows. Where it sorts is the caller's state (the URL); the heads are buttons. */
export function Table<Row>({
  caption,
  columns,
  rows,
  rowKey,
  sorting,
  busy = false,
}: {
  caption: string
  columns: Column<Row>[]
  rows: readonly Row[]
  rowKey: (row: Row) => string
  sorting?: Sorting
  busy?: boolean
}) {
  const cellClass = (column: Column<Row>) =>
    classes('py-2 pr-4 last:pr-0', column.figure && 'text-right', column.wide && 'max-md:hidden')
  return (
    <div className="relative overflow-x-auto">
      <table aria-busy={busy} className="w-full border-collapse">
        <caption className="sr-only">{caption}</caption>
        <thead>
          <tr className="border-b border-hair text-left text-small text-soft">
            {columns.map((column) => {
              const chosen = sorting?.by === column.sort && column.sort !== undefined
              return (
                <th
                  key={column.key}
                  scope="col"
                  aria-sort={chosen ? (sorting?.dir === 'asc' ? 'ascending' : 'descending') : undefined}
                  className={classes(cellClass(column), 'whitespace-nowrap font-normal')}
                >
                  {sorting && column.sort ? (
                    <SortButton column={column} name={column.sort} chosen={chosen} sorting={sorting} />
                  ) : (
                    column.head
                  )}
                </th>
              )
            })}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={rowKey(row)} className="border-b border-line hover:bg-wash">
              {columns.map((column) => (
                <td key={column.key} className={classes(cellClass(column), column.figure && 'whitespace-nowrap font-mono')}>
                  {column.cell(row)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}

function SortButton<Row>({
  column,
  name,
  chosen,
  sorting,
}: {
  column: Column<Row>
  name: string
  chosen: boolean
  sorting: Sorting
}) {
  const first = column.figure ? 'desc' : 'asc'
  const next = chosen ? (sorting.dir === 'asc' ? 'desc' : 'asc') : first
  return (
    <button
      type="button"
      onClick={() => sorting.onSort(name, next)}
      className={classes(
        'inline-flex min-h-10 items-center gap-1 hover:text-ink',
        chosen && 'text-ink',
        column.figure && 'flex-row-reverse',
      )}
    >
      <span>{column.head}</span>
      <span aria-hidden="true" className={classes('text-tiny', !chosen && 'opacity-0')}>
        {sorting.dir === 'asc' ? '▲' : '▼'}
      </span>
    </button>
  )
}
