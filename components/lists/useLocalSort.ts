'use client'
import type { Column, Sorting } from '@/components/ui/Table'
import { useUrlState } from '@/components/ui/useUrlState'

type Plain = string | number | null

function order(a: Plain, b: Plain): number {
  if (a === null || b === null) return Number(a === null) - Number(b === null)
  return typeof a === 'number' && typeof b === 'number' ? a - b : String(a).localeCompare(String(b), 'en', { numeric: true })
}

/** Sorts a short list in the browser by what its columns export; `name` keeps the choice in the URL: materials=density.desc */
export function useLocalSort<Row>(name: string, rows: readonly Row[], columns: readonly Column<Row>[]) {
  const [query, change] = useUrlState()
  const [by = '', to] = (query.get(name) ?? '').split('.')
  const dir = to === 'desc' ? 'desc' : 'asc'
  const plain = columns.find(({ sort }) => sort !== undefined && sort === by)?.plain
  const sign = dir === 'desc' ? -1 : 1
  const sorted = plain ? [...rows].sort((a, b) => sign * order(plain(a), plain(b))) : rows
  const sorting: Sorting = { by, dir, onSort: (next, way) => change({ [name]: `${next}.${way}` }) }
  return { rows: sorted, sorting }
}
