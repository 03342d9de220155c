import { type Drawing, DEFAULT_LIMITS, type ReadLimits } from './drawing'
import { finishDrawing } from './finish'
import { dxfFinding } from './findings'
import { GroupCursor } from './groups'
import { emptyDrawing } from './emptyDrawing'
import { otherFileKind } from './fileKind'
import { readSections } from './sections'
import { Reading } from './reading'
import { plainBytes } from './plainBytes'

/**
 * Reads a DXF file (text or binary, R10 to 2018) into a drawing: entities in world coordinates with blocks
 * opened up, layers, unit, dimensions, and findings. Coordinates are drawing units as written, to the last bit.
 * Never throws for bad input: what cannot be read is a finding that names the place and the cure.
 * Numbers that cannot be read, missing groups and entities cut short are never guessed.
 * Source of the format: DXF reference of its maker, 2015–2027 editions.
 */
export function readDrawing(bytes: Uint8Array, limits: ReadLimits = DEFAULT_LIMITS): Drawing {
  if (bytes.length > limits.bytes) {
    return emptyDrawing(dxfFinding('file-too-large', { bytes: bytes.length, limit: limits.bytes, setting: 'bytes' }))
  }
  const { text, start, marked, binary } = plainBytes(bytes)
  if (isBlank(text, start)) return emptyDrawing(dxfFinding('file-empty'))
  const other = otherFileKind(text, start)
  if (other) return emptyDrawing(dxfFinding('file-not-dxf', { what: other.what, cure: other.cure }))
  const reading = new Reading(new GroupCursor(text, start), marked, binary)
  const content = readSections(reading, limits)
  return finishDrawing(reading, content, limits)
}

function isBlank(bytes: Uint8Array, start: number): boolean {
  for (let i = start; i < bytes.length; i++) if (bytes[i] > 32 || bytes[i] === 0) return false
  return true
}
