const POWERS = Float64Array.from({ length: 23 }, (_, k) => Number(`1e${k}`))

/**
 * Reads decimal numbers from bytes to the last bit, or NaN for anything that is not wholly a finite
 * number (`40mm`, `12,5`, an empty line, `1e999`). Blanks around it are allowed.
 * A mantissa below 2^53 and a power of ten up to 22 are exact doubles, so that one multiplication or
 * division rounds correctly (Clinger 1990, from memory); the rest goes through `Number`.
 */
export class NumberReader {
  /** decimal places written, the exponent counted in */
  decimals = 0
  /** significant digits written, trailing zeros counted */
  significant = 0
  /** two decimals or more, the last one a 0 */
  padded = false

  read(bytes: Uint8Array, from: number, to: number): number {
    let i = from
    let end = to
    while (i < end && bytes[i] <= 32) i++
    while (end > i && bytes[end - 1] <= 32) end--
    const start = i
    let c = bytes[i]
    const negative = c === 45
    if (negative || c === 43) c = bytes[++i]
    let mantissa = 0
    let significant = 0
    let digits = 0
    let places = 0
    while (i < end && c >= 48 && c <= 57) {
      mantissa = 10 * mantissa + c - 48
      if (mantissa > 0) significant++
      digits++
      c = bytes[++i]
    }
    if (i < end && c === 46) {
      c = bytes[++i]
      while (i < end && c >= 48 && c <= 57) {
        mantissa = 10 * mantissa + c - 48
        if (mantissa > 0) significant++
        digits++
        places++
        c = bytes[++i]
      }
    }
    if (digits === 0) return Number.NaN
    let exponent = 0
    if (i < end && (c === 101 || c === 69)) {
      c = bytes[++i]
      const down = c === 45
      if (down || c === 43) c = bytes[++i]
      const first = i
      while (i < end && c >= 48 && c <= 57) {
        if (exponent < 100000) exponent = 10 * exponent + c - 48
        c = bytes[++i]
      }
      if (i === first) return Number.NaN
      if (down) exponent = -exponent
    }
    if (i < end) return Number.NaN
    this.decimals = Math.max(0, places - exponent)
    this.significant = significant
    this.padded = places >= 2 && bytes[i - 1] === 48 && exponent === 0 && mantissa > 0
    const power = exponent - places
    if (significant <= 16 && mantissa <= Number.MAX_SAFE_INTEGER && power >= -22 && power <= 22) {
      const value = power < 0 ? mantissa / POWERS[-power] : mantissa * POWERS[power]
      return negative ? -value : value
    }
    return slowly(bytes, start, end)
  }
}

function slowly(bytes: Uint8Array, from: number, to: number): number {
  let text = ''
  for (let i = from; i < to; i++) text += String.fromCharCode(bytes[i])
  const value = Number(text)
  return Number.isFinite(value) ? value : Number.NaN
}
