import { ByteWriter } from './byteWriter'

const SENTINEL = 'AutoCAD Binary DXF\r\n\u001a\u0000'
const LF = 10

export function isBinary(bytes: Uint8Array): boolean {
  for (let i = 0; i < SENTINEL.length; i++) if (bytes[i] !== SENTINEL.charCodeAt(i)) return false
  return true
}

type Value = 'text' | 'double' | 'int16' | 'int32' | 'int64' | 'byte' | 'chunk'

/** Kind of value by group code (DXF reference of the format's maker; in part from memory). */
const RANGES: [from: number, to: number, value: Value][] = [
  [0, 9, 'text'],
  [10, 59, 'double'],
  [60, 79, 'int16'],
  [90, 99, 'int32'],
  [100, 102, 'text'],
  [105, 105, 'text'],
  [110, 149, 'double'],
  [160, 169, 'int64'],
  [170, 179, 'int16'],
  [210, 239, 'double'],
  [270, 289, 'int16'],
  [290, 299, 'byte'],
  [300, 309, 'text'],
  [310, 319, 'chunk'],
  [320, 369, 'text'],
  [370, 389, 'int16'],
  [390, 399, 'text'],
  [400, 409, 'int16'],
  [410, 419, 'text'],
  [420, 429, 'int32'],
  [430, 439, 'text'],
  [440, 459, 'int32'],
  [460, 469, 'double'],
  [470, 481, 'text'],
  [999, 999, 'text'],
  [1000, 1003, 'text'],
  [1004, 1004, 'chunk'],
  [1005, 1009, 'text'],
  [1010, 1059, 'double'],
  [1060, 1070, 'int16'],
  [1071, 1071, 'int32'],
]
const VALUE_OF: (Value | undefined)[] = []
for (const [from, to, value] of RANGES) for (let code = from; code <= to; code++) VALUE_OF[code] = value

/**
 * A binary DXF as the text DXF that says the same: numbers in their shortest form that reads back to the same
 * double. Codes take two bytes, before R13 one (255 leads a longer one). Stops where the file breaks off or a
 * code is unknown, so that the reader finds a file cut short or a line that is no code.
 */
export function binaryToText(bytes: Uint8Array): Uint8Array {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength)
  const out = new ByteWriter(2 * bytes.length)
  const wide = bytes[SENTINEL.length + 1] === 0
  let at = SENTINEL.length
  const has = (n: number) => at + n <= bytes.length

  const readCode = (): number => {
    if (wide) {
      at += 2
      return has(0) ? view.getUint16(at - 2, true) : -1
    }
    at++
    if (!has(0)) return -1
    if (bytes[at - 1] !== 255) return bytes[at - 1]
    at += 2
    return has(0) ? view.getUint16(at - 2, true) : -1
  }
  const number = (size: number, read: (at: number) => number | bigint): boolean => {
    if (!has(size)) return false
    out.ascii(String(read(at)))
    at += size
    return true
  }
  const readers: Record<Value, () => boolean> = {
    double: () => number(8, (i) => view.getFloat64(i, true)),
    int16: () => number(2, (i) => view.getInt16(i, true)),
    int32: () => number(4, (i) => view.getInt32(i, true)),
    int64: () => number(8, (i) => view.getBigInt64(i, true)),
    byte: () => number(1, (i) => bytes[i]),
    chunk: () => {
      if (!has(1) || !has(1 + bytes[at])) return false
      at += 1 + bytes[at]
      return true
    },
    text: () => {
      const end = bytes.indexOf(0, at)
      if (end < 0) return false
      for (let i = at; i < end; i++) out.byte(bytes[i] === LF || bytes[i] === 13 ? 32 : bytes[i])
      at = end + 1
      return true
    },
  }
  while (at < bytes.length) {
    const code = readCode()
    if (code < 0) break
    const value = VALUE_OF[code]
    if (value === undefined) {
      out.ascii(`unknown group code ${code} at byte ${at}\n`)
      break
    }
    out.ascii(`${code}\n`)
    if (!readers[value]()) break
    out.byte(LF)
  }
  return out.done()
}
