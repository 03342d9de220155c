import { binaryToText, isBinary } from './binary'
import { ByteWriter } from './byteWriter'

/** A file as bytes of a text DXF: byte-order mark passed over, UTF-16 and binary DXF rewritten. */
export interface PlainBytes {
  text: Uint8Array
  start: number
  /** a byte-order mark says that texts are UTF-8 */
  marked: boolean
  binary: boolean
}

export function plainBytes(bytes: Uint8Array): PlainBytes {
  if (isBinary(bytes)) return { text: binaryToText(bytes), start: 0, marked: false, binary: true }
  if (bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf) return { text: bytes, start: 3, marked: true, binary: false }
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return { text: toUtf8(bytes, 0), start: 0, marked: true, binary: false }
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return { text: toUtf8(bytes, 1), start: 0, marked: true, binary: false }
  return { text: bytes, start: 0, marked: false, binary: false }
}

/** UTF-16 (after its mark) as UTF-8; `low` is where the low byte of a unit stands: 0 little-endian, 1 big-endian. */
function toUtf8(bytes: Uint8Array, low: 0 | 1): Uint8Array {
  const out = new ByteWriter(bytes.length)
  const unit = (i: number) => bytes[i + low] | (bytes[i + 1 - low] << 8)
  for (let i = 2; i + 1 < bytes.length; i += 2) {
    let code = unit(i)
    if (code >= 0xd800 && code < 0xdc00 && i + 3 < bytes.length) {
      i += 2
      code = 0x10000 + ((code - 0xd800) << 10) + (unit(i) & 0x3ff)
    }
    if (code < 0x80) out.byte(code)
    else if (code < 0x800) {
      out.byte(0xc0 | (code >> 6))
      out.byte(0x80 | (code & 63))
    } else {
      if (code < 0x10000) out.byte(0xe0 | (code >> 12))
      else {
        out.byte(0xf0 | (code >> 18))
        out.byte(0x80 | ((code >> 12) & 63))
      }
      out.byte(0x80 | ((code >> 6) & 63))
      out.byte(0x80 | (code & 63))
    }
  }
  return out.done()
}
