import type { EdgeTable } from './edges'
import type { Region } from './region'

const MAGIC = 0x52575331
const VERSION = 1
const HEADER = 32

/**
 * A region as bytes, for storing and sending: header of eight 32-bit numbers (magic, version, edges, carrier numbers,
 * loops, pieces, 0, 0), then doubles (ends, shapes), 32-bit (shape, source, loopStart, piece), bytes (kind, hole).
 * Little-endian, every double to the last bit.
 */
export function packRegion({ edges, loopStart, hole, piece, pieces }: Region): Uint8Array {
  const n = edges.count
  const loops = hole.length
  const bytes = new Uint8Array(HEADER + 8 * (4 * n + edges.shapesUsed) + 4 * (2 * n + 2 * loops + 1) + n + loops)
  const view = new DataView(bytes.buffer)
  for (const [j, value] of [MAGIC, VERSION, n, edges.shapesUsed, loops, pieces].entries()) view.setUint32(4 * j, value, true)
  let at = HEADER
  const doubles = (values: Float64Array, count: number) => {
    for (let j = 0; j < count; j++, at += 8) view.setFloat64(at, values[j], true)
  }
  const words = (values: Uint32Array, count: number) => {
    for (let j = 0; j < count; j++, at += 4) view.setUint32(at, values[j], true)
  }
  doubles(edges.ends, 4 * n)
  doubles(edges.shapes, edges.shapesUsed)
  words(edges.shape, n)
  words(edges.source, n)
  words(loopStart, loops + 1)
  words(piece, loops)
  bytes.set(edges.kind.subarray(0, n), at)
  bytes.set(hole, at + n)
  return bytes
}

/** The region of `packRegion`'s bytes, bit for bit. Throws a RangeError for bytes of another kind, version or length. */
export function unpackRegion(bytes: Uint8Array): Region {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength)
  if (bytes.length < HEADER || view.getUint32(0, true) !== MAGIC) throw new RangeError('These bytes are not a packed region.')
  if (view.getUint32(4, true) !== VERSION)
    throw new RangeError(`Packed region of version ${view.getUint32(4, true)}, expected ${VERSION}.`)
  const [n, shapesUsed, loops, pieces] = [8, 12, 16, 20].map((j) => view.getUint32(j, true))
  const expected = HEADER + 8 * (4 * n + shapesUsed) + 4 * (2 * n + 2 * loops + 1) + n + loops
  if (bytes.length !== expected) throw new RangeError(`Packed region of ${bytes.length} bytes, expected ${expected}.`)
  let at = HEADER
  const doubles = (count: number) => {
    const values = new Float64Array(count)
    for (let j = 0; j < count; j++, at += 8) values[j] = view.getFloat64(at, true)
    return values
  }
  const words = (count: number) => {
    const values = new Uint32Array(count)
    for (let j = 0; j < count; j++, at += 4) values[j] = view.getUint32(at, true)
    return values
  }
  const ends = doubles(4 * n)
  const shapes = doubles(shapesUsed)
  const shape = words(n)
  const source = words(n)
  const loopStart = words(loops + 1)
  const piece = words(loops)
  const kind = bytes.slice(at, at + n)
  const edges: EdgeTable = { count: n, kind, ends, shape, shapes, shapesUsed, source }
  return { edges, loopStart, hole: bytes.slice(at + n), piece, pieces }
}
