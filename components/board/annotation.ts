import type { Label, Segment } from './labels'
import { textWidth } from './labels'
import type { ScreenPoint } from './view'

/** How a line of the board looks, as drawing practice has it. */
export type LineLook = 'centroid' | 'principal' | 'plastic' | 'dimension' | 'fibre' | 'circle' | 'angle' | 'user' | 'hot'
export type TextLook = 'axis' | 'principal' | 'dimension' | 'plastic' | 'user'

/** One stroke of the annotation layer, px. A `mark` is an arrowhead: never dashed, filled or open. */
export interface Stroke {
  id: string
  look: LineLook
  d: string
  mark?: 'filled' | 'open'
}

/** A label with its text; `turned` texts read from the right. */
export interface TextLabel extends Label {
  text: string
  look: TextLook
  size: number
  mono: boolean
  turned?: boolean
}

/** Everything written and drawn over the metal, px. `lines` are what labels must not lie on. */
export interface Annotations {
  strokes: Stroke[]
  labels: TextLabel[]
  lines: Segment[]
}

export const emptyAnnotations = (): Annotations => ({ strokes: [], labels: [], lines: [] })

export function merge(parts: Annotations[]): Annotations {
  return {
    strokes: parts.flatMap((part) => part.strokes),
    labels: parts.flatMap((part) => part.labels),
    lines: parts.flatMap((part) => part.lines),
  }
}

/** Digits enough for a tenth of a pixel. */
export const px = (value: number) => String(Math.round(value * 10) / 10)
export const moveTo = (p: ScreenPoint) => `M${px(p.x)} ${px(p.y)}`
export const lineTo = (p: ScreenPoint) => `L${px(p.x)} ${px(p.y)}`
export const along = (p: ScreenPoint, d: ScreenPoint, t: number): ScreenPoint => ({ x: p.x + t * d.x, y: p.y + t * d.y })
/** The direction turned a quarter to the left as one sees it on the board. */
export const left = (d: ScreenPoint): ScreenPoint => ({ x: d.y, y: -d.x })

/** How far a label must stand off so that its box just clears a line at right angles to `d`, px. */
export const clearance = ({ width, height }: { width: number; height: number }, d: ScreenPoint) =>
  (Math.abs(d.x) * width + Math.abs(d.y) * height) / 2

/** A filled arrowhead whose tip is at `tip`, pointing along `d`. */
export function arrowhead(tip: ScreenPoint, d: ScreenPoint, length = 10, half = 2.4): string {
  const foot = along(tip, d, -length)
  return `${moveTo(tip)}${lineTo(along(foot, left(d), half))}${lineTo(along(foot, left(d), -half))}Z`
}

/** An open arrowhead, as axes end. */
export function openArrow(tip: ScreenPoint, d: ScreenPoint): string {
  const foot = along(tip, d, -9)
  return `${moveTo(along(foot, left(d), 3.6))}${lineTo(tip)}${lineTo(along(foot, left(d), -3.6))}`
}

interface TextOptions {
  id: string
  text: string
  look: TextLook
  /** where it may stand, given how large it is */
  places: (size: { width: number; height: number }) => ScreenPoint[]
  size?: number
  mono?: boolean
  turned?: boolean
}

export function textLabel({ id, text, look, places, size = 13, mono = false, turned = false }: TextOptions): TextLabel {
  const along = textWidth(text, size, mono)
  const box = turned ? { width: size, height: along } : { width: along, height: size }
  return { id, text, look, size, mono, turned, places: places(box), ...box }
}
