export type Cell = string | number | null

export interface CsvDialect {
  separator: ',' | ';'
  /** a byte order mark, by which spreadsheet programs tell UTF-8 */
  mark: boolean
}
export const PLAIN: CsvDialect = { separator: ',', mark: false }
export const SPREADSHEET: CsvDialect = { separator: ';', mark: true }

/** Text that a spreadsheet would run as a formula gets an apostrophe before it; numbers stay as they are. */
const harmless = (text: string) => (/^[=+\-@\t\r]/.test(text) ? `'${text}` : text)

function cellText(cell: Cell, separator: string): string {
  if (cell === null) return ''
  if (typeof cell === 'number') return String(cell)
  const text = harmless(cell)
  return text.includes(separator) || /["\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text
}

/** Rows as CSV after RFC 4180: CRLF, quotes doubled, the head first. */
export function toCsv(head: readonly string[], rows: readonly (readonly Cell[])[], { separator, mark }: CsvDialect): string {
  const lines = [head, ...rows].map((row) => row.map((cell) => cellText(cell, separator)).join(separator))
  return `${mark ? '\ufeff' : ''}${lines.join('\r\n')}\r\n`
}
