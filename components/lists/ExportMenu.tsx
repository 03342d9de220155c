'use client'
import { download } from '@/components/ui/download'
import { Menu } from '@/components/ui/Menu'
import { problemOf } from '@/components/ui/problem'
import type { Column } from '@/components/ui/Table'
import { toast } from '@/components/ui/toastStore'
import { type CsvDialect, PLAIN, SPREADSHEET, toCsv } from './csv'

/** Exports all rows of a list as they are filtered and sorted, not only the page in view. */
export function ExportMenu<Row>({
  name,
  columns,
  align = 'left',
  all,
}: {
  name: string
  columns: Column<Row>[]
  align?: 'left' | 'right'
  all: () => Promise<readonly Row[]>
}) {
  const save = async (dialect: CsvDialect) => {
    try {
      const rows = await all()
      const exported = columns.filter(({ plain }) => plain)
      const head = exported.map((column) => column.plainHead ?? String(column.head))
      const cells = rows.map((row) => exported.map(({ plain }) => plain?.(row) ?? null))
      download(`${name}.csv`, 'text/csv;charset=utf-8', toCsv(head, cells, dialect))
    } catch (error) {
      toast(problemOf(error).sentence, { tone: 'error' })
    }
  }
  return (
    <Menu
      label="Export"
      name={`Export ${name}`}
      align={align}
      items={[
        { label: 'CSV', onChoose: () => save(PLAIN) },
        { label: 'CSV for spreadsheets (; and byte order mark)', onChoose: () => save(SPREADSHEET) },
      ]}
    />
  )
}
