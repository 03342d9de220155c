/** What was typed as a number: its value, with a sentence to echo where it could be read otherwise; or why it was refused. */
export type ParsedNumber = { ok: true; value: number; echo?: string } | { ok: false; message: string }

const SPACES = /[\s\u00a0\u2009\u202f]+/g
const SHAPE = /^([+-]?)(\d*)(?:[.,](\d*))?(?:[eE]([+-]?\d+))?$/
const GROUPED = /^[+-]?\d{1,3}( \d{3})+([.,]\d*)?$/

const refuse = (message: string): ParsedNumber => ({ ok: false, message })

/**
 * Reads a number as people write it: one comma or point is the decimal mark, spaces group by threes, a true minus counts.
 * "1,234.5" and "1,234,567" are refused. "1,250" reads 1.25 and says so; with `strict` (a pasted column, where nobody reads
 * the echo) it is refused.
 */
export function parseNumber(text: string, { strict = false }: { strict?: boolean } = {}): ParsedNumber {
  const typed = text.trim().replace('\u2212', '-').replace(SPACES, ' ')
  if (typed === '') return refuse('Type a number.')
  const marks = typed.replace(/[^.,]/g, '')
  if (marks.length > 1) {
    return refuse(
      marks.includes('.') && marks.includes(',')
        ? `“${typed}” has both a comma and a point. Write one decimal mark and no mark between thousands.`
        : `“${typed}” has more than one decimal mark. Write no mark between thousands.`,
    )
  }
  if (typed.includes(' ') && !GROUPED.test(typed))
    return refuse(`“${typed}” is not one number: spaces may only part groups of three.`)
  const match = SHAPE.exec(typed.replace(/ /g, ''))
  const [, sign = '', whole = '', fraction = '', exponent = '0'] = match ?? []
  if (!match || (whole === '' && fraction === '')) return refuse(`“${typed}” is not a number.`)
  const value = Number(`${sign}${whole || '0'}.${fraction || '0'}e${exponent}`)
  if (!Number.isFinite(value)) return refuse(`“${typed}” is too large.`)
  const twoWays = fraction.length === 3 && /^[1-9]\d{0,2}$/.test(whole) && !typed.includes(' ') && !/e/i.test(typed)
  if (!twoWays) return { ok: true, value }
  const otherwise = Number(`${sign}${whole}${fraction}`)
  if (strict)
    return refuse(`“${typed}” can be read as ${value} or as ${otherwise}. Write it without a mark or with other digits.`)
  return { ok: true, value, echo: `Read as ${value}, not as ${otherwise}.` }
}
