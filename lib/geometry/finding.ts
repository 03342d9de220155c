/** What a finding means for the person: to know, to look at, or nothing can be computed as it is. */
export type Severity = 'note' | 'warning' | 'error'

export type FindingParams = Record<string, string | number | boolean | null>

/**
 * Something the reader wants a person to know. `code` names a row of `FINDINGS`
 * (findings.ts of lib/dxf, lib/geometry and lib/section), which holds severity and sentence.
 * `at` is a place in drawing units before the recipe's turn, `size` its extent there.
 */
export interface Finding<Code extends string = string> {
  code: Code
  severity: Severity
  message: string
  params: FindingParams
  at?: [number, number]
  size?: number
}

/** One row of the table of findings. `say` makes the sentence: what, where, and what to do. */
export interface FindingRow {
  severity: Severity
  say: (params: FindingParams) => string
}

/** A place for a sentence: six digits, but three decimals at least (far from the origin) and nine at most (rounding). */
export const placeText = ({ x, y }: FindingParams): string => `(${coordinate(x)}, ${coordinate(y)})`

const coordinate = (value: FindingParams[string]): string => {
  if (typeof value !== 'number') return String(value)
  const decimals = Math.min(9, Math.max(3, 5 - Math.floor(Math.log10(Math.abs(value) || 1))))
  return String(Number(value.toFixed(decimals)))
}

/** A finding from one row of a table; the only way findings are made. */
export function makeFinding<Table extends Record<string, FindingRow>, Code extends keyof Table & string>(
  table: Table,
  code: Code,
  params: FindingParams = {},
  at?: [number, number],
  size?: number,
): Finding<Code> {
  const { severity, say } = table[code]
  const finding: Finding<Code> = { code, severity, message: say(params), params }
  if (at) finding.at = at
  if (size !== undefined) finding.size = size
  return finding
}
