const LF = 10
const CR = 13

/** First byte after the line end at `i`; CR CR LF (text mode applied twice) counts as one line end. */
function afterLineEnd(bytes: Uint8Array, i: number): number {
  if (bytes[i] === LF) return i + 1
  if (bytes[i + 1] === LF) return i + 2
  return bytes[i + 1] === CR && bytes[i + 2] === LF ? i + 3 : i + 1
}

/**
 * Walks over the groups (a line with a code, a line with a value) of a DXF file in text form, any line
 * ending, padding or blank lines before codes; comments (999) are passed over.
 * `next` answers false at the end and where the pairs are broken: `fault` then says which.
 */
export class GroupCursor {
  code = 0
  /** the value's bytes, without its line end */
  from = 0
  to = 0
  /** number of the line that holds the code, from 1 */
  line = 0
  fault: 'none' | 'code' | 'cut' = 'none'
  /** where the next group begins, or the code that is none */
  at: number
  private lineAhead = 1

  constructor(
    readonly bytes: Uint8Array,
    start = 0,
  ) {
    this.at = start
  }

  next(): boolean {
    do {
      if (!this.readCode() || !this.readValue()) return false
    } while (this.code === 999)
    return true
  }

  /** Whether anything but blanks and comments follows. */
  goesOn(): boolean {
    return this.next() || this.fault === 'code'
  }

  private readCode(): boolean {
    const { bytes } = this
    const end = bytes.length
    let i = this.at
    let c = bytes[i]
    while (i < end && (c === 32 || c === 9 || c === LF || c === CR)) {
      if (c === LF || c === CR) {
        i = afterLineEnd(bytes, i)
        this.lineAhead++
      } else i++
      c = bytes[i]
    }
    this.line = this.lineAhead
    this.at = i
    if (i >= end || c === 0 || c === 26) return false
    const negative = c === 45
    if (negative) c = bytes[++i]
    const firstDigit = i
    let code = 0
    while (i < end && c >= 48 && c <= 57 && i - firstDigit < 5) {
      code = 10 * code + c - 48
      c = bytes[++i]
    }
    const digits = i - firstDigit
    while (i < end && (c === 32 || c === 9)) c = bytes[++i]
    if (i >= end && digits > 0) return this.stop('cut')
    if (digits === 0 || (c !== LF && c !== CR)) return this.stop('code')
    this.code = negative ? -code : code
    this.at = afterLineEnd(bytes, i)
    this.lineAhead++
    return true
  }

  private readValue(): boolean {
    const { bytes } = this
    const end = bytes.length
    let i = this.at
    if (i >= end) return this.stop('cut')
    this.from = i
    let c = bytes[i]
    while (i < end && c !== LF && c !== CR) c = bytes[++i]
    this.to = i
    this.at = i < end ? afterLineEnd(bytes, i) : end
    this.lineAhead++
    return true
  }

  private stop(fault: 'code' | 'cut'): false {
    this.fault = fault
    return false
  }
}
