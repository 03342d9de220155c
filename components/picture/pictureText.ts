import type { Typeface } from './typeface'
import { element } from './xml'

interface Words {
  face: Typeface
  text: string
  x: number
  y: number
  size: number
  fill: string
  anchor?: 'start' | 'middle' | 'end'
  transform?: string
}

/** A text as one path, its baseline at x, y. */
export function words({ face, text, x, y, size, fill, anchor = 'start', transform }: Words): string {
  const width = anchor === 'start' ? 0 : face.width(text, size)
  const from = anchor === 'middle' ? x - width / 2 : x - width
  return element('path', { fill, transform, d: face.path(text, from, y, size) })
}

/** A text cut with an ellipsis where it is wider than its place, px. */
export function fitting(face: Typeface, text: string, size: number, room: number): string {
  if (face.width(text, size) <= room) return text
  const short = [...text].slice(0, 400)
  while (short.length > 0 && face.width(`${short.join('')}…`, size) > room) short.pop()
  return `${short.join('')}…`
}
