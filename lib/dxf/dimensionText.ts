/** What a dimension's text says. */
export interface DimensionText {
  /** the nominal size as written; null where the text names none or leaves it to the measured one (<>) */
  value: number | null
  /** half of the last written digit of `value` */
  rounding: number
  tolerance: { plus: number; minus: number } | null
}

const NUMBER = String.raw`\d+(?:[.,]\d+)?|[.,]\d+`

/**
 * Reads a dimension's text: `50`, `12,5`, `%%c50 H7`, `R5`, `50±0.1`, `50 +0.2/-0.1`, `4x R2,5`, with its
 * formatting codes. A comma or a point is the decimal mark. A count before × is not the size.
 */
export function readDimensionText(text: string): DimensionText {
  const plain = withoutFormatting(text)
  const none = { value: null, rounding: 0, tolerance: toleranceIn(plain) }
  // feet, and fractions of an inch, are left to the eye
  if (plain.includes('<>') || /'|\d\s*\/\s*\d+\s*"/.test(plain)) return none
  const size = plain.replace(/^\s*\(?\s*\d+\s*[x×*]\s*/i, '')
  const match = new RegExp(`(?<![\\d.,])-?(?:${NUMBER})`).exec(size)
  if (!match || /^\s*[±+]/.test(size)) return none
  const [whole, decimals = ''] = match[0].replace(',', '.').split('.')
  return {
    value: Number(`${whole || '0'}.${decimals || '0'}`),
    rounding: 0.5 * 10 ** -decimals.length,
    tolerance: none.tolerance,
  }
}

/** The text as a person sees it: stacked fractions side by side, symbols as characters. */
export function withoutFormatting(text: string): string {
  return text
    .replace(/\\S([^;]*?)[\^#]([^;]*);/g, ' $1/$2 ')
    .replace(/\\[ACFHQTWfp][^;]*;/g, '')
    .replace(/\\[LlOoKkNX]/g, '')
    .replace(/\\P/g, ' ')
    .replace(/\\~/g, ' ')
    .replace(/[{}]/g, '')
    .replace(/%%[cC]/g, '⌀')
    .replace(/%%[dD]/g, '°')
    .replace(/%%[pP]/g, '±')
}

function toleranceIn(plain: string): DimensionText['tolerance'] {
  const numberOf = (text: string) => Number(text.replace(',', '.'))
  const both = new RegExp(`±\\s*(${NUMBER})`).exec(plain)
  if (both) return { plus: numberOf(both[1]), minus: numberOf(both[1]) }
  const pair = new RegExp(`([+-]?)\\s*(${NUMBER})\\s*/\\s*([+-]?)\\s*(${NUMBER})\\s*$`).exec(plain)
  if (!pair || (pair[1] === '' && pair[3] === '')) return null
  const deviations = [(pair[1] === '-' ? -1 : 1) * numberOf(pair[2]), (pair[3] === '-' ? -1 : 1) * numberOf(pair[4])]
  return { plus: Math.max(...deviations), minus: -Math.min(...deviations) }
}
