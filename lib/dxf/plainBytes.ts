/** A file as bytes of a text DXF: byte-order mark passed over, UTF-16 and binary DXF rewritten. */
export interface PlainBytes {
  text: Uint8Array
  start: number
  /** a byte-order mark says that texts are UTF-8 */
  marked: boolean
}

export function plainBytes(bytes: Uint8Array): PlainBytes {
  if (bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf) return { text: bytes, start: 3, marked: true }
  return { text: bytes, start: 0, marked: false }
}
