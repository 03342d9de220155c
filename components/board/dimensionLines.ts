import {
  type Annotations,
  along,
  arrowhead,
  clearance,
  emptyAnnotations,
  type LineLook,
  left,
  lineTo,
  moveTo,
  type TextLook,
  textLabel,
} from './annotation'
import type { Frame } from './axisLines'
import { type DrawingPoint, type ScreenPoint, toScreen } from './view'

/** Room between what is measured and its extension line, and how far that runs beyond the dimension line, px. */
const GAP = 5
const OVER = 6
/** A dimension line shorter than this has its arrowheads outside, px. */
const SHORT = 34

interface Dimension {
  id: string
  /** what is measured, on the board */
  a: ScreenPoint
  b: ScreenPoint
  /** px from a and b to the dimension line, to the left of a → b as one sees it */
  off: number
  text: string
  look?: LineLook
  textLook?: TextLook
}

/** A dimension as drawing practice draws it: thin lines, filled arrowheads, the text above the line. */
export function drawDimension({ id, a, b, off, text, look = 'dimension', textLook = 'dimension' }: Dimension): Annotations {
  const length = Math.hypot(b.x - a.x, b.y - a.y)
  if (length < 4) return emptyAnnotations()
  const d: ScreenPoint = { x: (b.x - a.x) / length, y: (b.y - a.y) / length }
  const n = left(d)
  const from = along(a, n, off)
  const to = along(b, n, off)
  const side = Math.sign(off) || 1
  const short = length < SHORT
  const start = short ? along(from, d, -18) : from
  const end = short ? along(to, d, 18) : to
  const extension = (p: ScreenPoint) =>
    Math.abs(off) < 1 ? '' : `${moveTo(along(p, n, side * GAP))}${lineTo(along(p, n, off + side * OVER))}`
  const heads = short
    ? arrowhead(from, d) + arrowhead(to, { x: -d.x, y: -d.y })
    : arrowhead(from, { x: -d.x, y: -d.y }) + arrowhead(to, d)
  const upright = Math.abs(d.x) < 0.26
  const places = (size: { width: number; height: number }) =>
    [0.5, 0.32, 0.68, 0.2, 0.8].flatMap((t) => {
      const away = clearance(size, n) + 6
      const above = upright || n.y > 0 ? -1 : 1
      return [away, -away].map((shift) => along(along(from, d, t * length), n, (upright ? side : above) * shift))
    })
  return {
    strokes: [
      { id, look, d: `${extension(a)}${extension(b)}${moveTo(start)}${lineTo(end)}` },
      { id: `${id}-arrows`, look, d: heads, mark: 'filled' },
    ],
    labels: [textLabel({ id, text, look: textLook, places, mono: true, turned: upright })],
    lines: [
      { a: start, b: end },
      ...(Math.abs(off) < 1
        ? []
        : [
            { a, b: along(a, n, off + side * OVER) },
            { a: b, b: along(b, n, off + side * OVER) },
          ]),
    ],
  }
}

/** Overall width below and height left of what is drawn. */
export function extentDimensions({ view, extents }: Frame, length: (mm: number) => string): Annotations[] {
  const at = (x: number, y: number) => toScreen(view, { x, y } satisfies DrawingPoint)
  const { minX, minY, maxX, maxY } = extents
  return [
    drawDimension({ id: 'width', a: at(minX, minY), b: at(maxX, minY), off: -38, text: length(maxX - minX) }),
    drawDimension({ id: 'height', a: at(minX, minY), b: at(minX, maxY), off: 38, text: length(maxY - minY) }),
  ]
}
