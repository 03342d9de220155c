import type { DxfCode } from './findings'
import type { GroupCursor } from './groups'
import type { Names } from './names'
import { NumberReader } from './number'
import { FULL_PRECISION, MOST_DECIMALS, noDigits } from './lastDigit'

const CODES = 1072
/** Coordinates beyond this are refused: their fourth powers no longer fit beside each other in a sum. */
export const LARGEST_NUMBER = 1e12

/** The groups that an entity kind reads into `record.values`, one slot a code, and those it cannot do without. */
export interface Slots {
  codes: readonly number[]
  slotOf: Int8Array
  needed: readonly number[]
}

export function slots(needed: readonly number[], optional: readonly number[] = []): Slots {
  const codes = [...needed, ...optional]
  const slotOf = new Int8Array(CODES).fill(-1)
  codes.forEach((code, slot) => {
    slotOf[code] = slot
  })
  return { codes, slotOf, needed }
}

export type RecordFault = Extract<DxfCode, 'number-bad' | 'number-large' | 'group-repeated' | 'group-missing'>

/** The groups of one record (all between two groups of code 0), and what every entity shares. One object, reused. */
export class GroupRecord {
  /** number of the kind in `kinds` */
  kind = 0
  /** number of the line that holds the record's 0 */
  line = 0
  /** groups of the record; those from `count` to `all` are extended data or an embedded object */
  count = 0
  all = 0
  code = new Int32Array(64)
  from = new Uint32Array(64)
  to = new Uint32Array(64)
  lines = new Uint32Array(64)
  /** what `scan` found, by slot */
  values = new Float64Array(48)
  seen = new Uint8Array(48)
  fault: RecordFault = 'number-bad'
  faultCode = 0
  faultGroup = -1
  readonly digits = noDigits()
  private readonly numbers = new NumberReader()

  constructor(
    readonly cursor: GroupCursor,
    readonly kinds: Names,
  ) {}

  /** Begins the record on whose group of code 0 the cursor stands, and answers its kind. */
  begin(): number {
    const { cursor } = this
    this.kind = this.kinds.idOf(cursor.from, cursor.to)
    this.line = cursor.line
    return this.kind
  }

  /** Reads on to the next group of code 0. False where the file ends before. */
  read(): boolean {
    const { cursor } = this
    let n = 0
    let extended = -1
    let more = cursor.next()
    while (more && cursor.code !== 0) {
      if (n === this.code.length) this.grow()
      this.code[n] = cursor.code
      this.from[n] = cursor.from
      this.to[n] = cursor.to
      this.lines[n] = cursor.line
      if (extended < 0 && (cursor.code >= 1000 || cursor.code === 101)) extended = n
      n++
      more = cursor.next()
    }
    this.all = n
    this.count = extended < 0 ? n : extended
    return more
  }

  /** The number in group g, NaN where it is none. */
  number(g: number): number {
    return this.numbers.read(this.cursor.bytes, this.from[g], this.to[g])
  }

  /** The number in group g, its decimals counted when it is a coordinate; NaN (and `fault`) where it is none or too large. */
  finite(g: number): number {
    const value = this.numbers.read(this.cursor.bytes, this.from[g], this.to[g])
    if (Number.isNaN(value)) return this.failed('number-bad', g)
    if (value > LARGEST_NUMBER || value < -LARGEST_NUMBER) return this.failed('number-large', g)
    const code = this.code[g]
    const { significant, decimals, padded } = this.numbers
    if (significant >= FULL_PRECISION) this.digits.full++
    if (code < 29 && code > 9) {
      this.digits.decimals[Math.min(MOST_DECIMALS, decimals)]++
      if (padded) this.digits.padded++
    }
    return value
  }

  /** First group of that code before the extended data, −1 for none. */
  find(code: number, start = 0): number {
    for (let g = start; g < this.count; g++) if (this.code[g] === code) return g
    return -1
  }

  /**
   * Reads the groups of `wanted` into `values` and `seen`; false, with `fault` set, when a number cannot
   * be read, is given twice with two values, or a needed one is missing.
   */
  scan(wanted: Slots): boolean {
    const { slotOf, codes, needed } = wanted
    const { values, seen, count, code } = this
    for (let s = 0; s < codes.length; s++) seen[s] = 0
    for (let g = 0; g < count; g++) {
      const c = code[g]
      const slot = c >= 0 && c < CODES ? slotOf[c] : -1
      if (slot < 0) continue
      const value = this.finite(g)
      if (Number.isNaN(value)) return false
      if (seen[slot] === 1 && value !== values[slot]) {
        this.failed('group-repeated', g)
        return false
      }
      values[slot] = value
      seen[slot] = 1
    }
    for (let s = 0; s < needed.length; s++) {
      if (seen[s] === 1) continue
      this.fault = 'group-missing'
      this.faultCode = needed[s]
      this.faultGroup = -1
      return false
    }
    return true
  }

  /** Value of slot s, or `otherwise` where the group is not there. */
  slot(s: number, otherwise: number): number {
    return this.seen[s] === 1 ? this.values[s] : otherwise
  }

  failed(fault: RecordFault, g: number): number {
    this.fault = fault
    this.faultCode = this.code[g]
    this.faultGroup = g
    return Number.NaN
  }

  private grow(): void {
    const size = 2 * this.code.length
    const code = new Int32Array(size)
    code.set(this.code)
    this.code = code
    const wider = (from: Uint32Array) => {
      const to = new Uint32Array(size)
      to.set(from)
      return to
    }
    this.from = wider(this.from)
    this.to = wider(this.to)
    this.lines = wider(this.lines)
  }
}
