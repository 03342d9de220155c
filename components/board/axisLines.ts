import type { Point } from '@/lib/geometry/edges'
import {
  type Annotations,
  along,
  clearance,
  emptyAnnotations,
  type LineLook,
  left,
  lineTo,
  moveTo,
  openArrow,
  type TextLook,
  textLabel,
} from './annotation'
import { type Box, directionOnScreen, type ScreenPoint, toScreen, type View, type Viewport } from './view'

/** A line of the drawing that the board shows from end to end: through a point, `angle` rad from +x. */
export interface AxisLine {
  id: string
  look: LineLook
  text: string
  textLook: TextLook
  through: Point
  angle: number
  /** px beyond what is drawn */
  beyond: number
  arrow: boolean
}

export interface Frame {
  view: View
  viewport: Viewport
  extents: Box
}

/** Dash period of chain lines, px; rays start at whole periods, so that dashes stay where they are while the board moves. */
const PERIOD = 24
/** Kept free along the edges for the zones' names and the labels, px. */
const EDGE = { top: 46, left: 46, right: 26, bottom: 20 }

const cornersOf = (box: Box): Point[] => [
  { x: box.minX, y: box.minY },
  { x: box.maxX, y: box.minY },
  { x: box.maxX, y: box.maxY },
  { x: box.minX, y: box.maxY },
]

/** The part of p + t·d, t from `from` to `to`, inside the edges of the board; null where there is none. */
export function clipRay(
  p: ScreenPoint,
  d: ScreenPoint,
  from: number,
  to: number,
  viewport: Viewport,
): { from: number; to: number } | null {
  const spans: [number, number, number, number][] = [
    [p.x, d.x, EDGE.left, viewport.width - EDGE.right],
    [p.y, d.y, EDGE.top, viewport.height - EDGE.bottom],
  ]
  for (const [start, slope, low, high] of spans) {
    if (Math.abs(slope) < 1e-12) {
      if (start < low || start > high) return null
      continue
    }
    const a = (low - start) / slope
    const b = (high - start) / slope
    from = Math.max(from, Math.min(a, b))
    to = Math.min(to, Math.max(a, b))
  }
  return from < to ? { from, to } : null
}

/** From where to where along the axis the line runs, px from its point: as far as the drawing, and a little more. */
export function reachOf(
  line: Pick<AxisLine, 'through' | 'angle' | 'beyond'>,
  { view, extents }: Frame,
): { from: number; to: number } {
  const c = Math.cos(line.angle)
  const s = Math.sin(line.angle)
  const ts = cornersOf(extents).map((p) => view.scale * ((p.x - line.through.x) * c + (p.y - line.through.y) * s))
  return { from: Math.min(...ts, 0) - line.beyond, to: Math.max(...ts, 0) + line.beyond }
}

/** Both halves of the line drawn outwards from its point, so that the dash pattern never swims. */
function rays(p: ScreenPoint, d: ScreenPoint, from: number, to: number): string {
  const half = (end: number, start: number) => {
    const whole = Math.trunc(start / PERIOD) * PERIOD
    return `${moveTo(along(p, d, whole))}${lineTo(along(p, d, end))}`
  }
  const forth = to > 0 ? half(to, Math.max(from, 0)) : ''
  const back = from < 0 ? half(from, Math.min(to, 0)) : ''
  return forth + back
}

/** The part of an axis that the board shows: px from its point, and its ends. */
export function seenPart(line: AxisLine, frame: Frame) {
  const p = toScreen(frame.view, line.through)
  const d = directionOnScreen(line.angle)
  const wanted = reachOf(line, frame)
  const seen = clipRay(p, d, wanted.from, wanted.to, frame.viewport)
  return seen && { p, d, ...seen }
}

/** A chain line with its name at the end, and the places the name may step aside to. */
export function drawAxis(line: AxisLine, frame: Frame): Annotations {
  const seen = seenPart(line, frame)
  if (!seen) return emptyAnnotations()
  const { p, d } = seen
  const start = along(p, d, seen.from)
  const end = along(p, d, seen.to)
  const n = left(d)
  const places = (size: { width: number; height: number }) => {
    const ahead = clearance(size, d)
    const aside = clearance(size, n) + 6
    const beside = (p0: ScreenPoint, t: number) => [along(along(p0, d, t), n, aside), along(along(p0, d, t), n, -aside)]
    return [
      along(end, d, ahead + 7),
      ...[-ahead, -ahead - 24, -ahead - 60, -ahead - 110].flatMap((t) => beside(end, t)),
      along(start, d, -ahead - 7),
      ...[ahead, ahead + 24, ahead + 60].flatMap((t) => beside(start, t)),
    ]
  }
  return {
    strokes: [
      { id: line.id, look: line.look, d: rays(p, d, seen.from, seen.to) },
      ...(line.arrow ? [{ id: `${line.id}-arrow`, look: line.look, d: openArrow(end, d), mark: 'open' as const }] : []),
    ],
    labels: [textLabel({ id: line.id, text: line.text, look: line.textLook, places, size: 15 })],
    lines: [{ a: start, b: end }],
  }
}
