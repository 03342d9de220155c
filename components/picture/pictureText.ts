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

/** No line of the picture holds more characters than this. */
const LONGEST = 200

/** A text cut with an ellipsis where it is wider than its place, px. */
export function fitting(face: Typeface, text: string, size: number, room: number): string {
  const short = [...text].slice(0, LONGEST)
  if (short.length < LONGEST && face.width(text, size) <= room) return text
  while (short.length > 0 && face.width(`${short.join('')}…`, size) > room) short.pop()
  return `${short.join('')}…`
}
