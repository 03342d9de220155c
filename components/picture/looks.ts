import type { LineLook, TextLook } from '@/components/board/annotation'
import type { Attributes } from './xml'

/** The picture is always light: it is printed and mailed. */
export const INK = '#23262b'
export const SOFT = '#5d6168'
export const HAIR = '#bdb6a6'
export const SHEET = '#fdfcf8'
export const METAL = '#e3dece'
export const ACCENT = '#2f3e9e'

const CHAIN = '16 3 2 3'
export const LINES: Record<LineLook, Attributes> = {
  centroid: { stroke: SOFT, 'stroke-width': 1, 'stroke-dasharray': CHAIN },
  principal: { stroke: ACCENT, 'stroke-width': 1.4, 'stroke-dasharray': CHAIN },
  plastic: { stroke: SOFT, 'stroke-width': 1, 'stroke-dasharray': '7 5' },
  dimension: { stroke: SOFT, 'stroke-width': 1 },
  fibre: { stroke: ACCENT, 'stroke-width': 1.4 },
  circle: { stroke: SOFT, 'stroke-width': 1, 'stroke-dasharray': '2 4' },
  angle: { stroke: ACCENT, 'stroke-width': 1 },
  user: { stroke: ACCENT, 'stroke-width': 1.6, 'stroke-dasharray': '10 4' },
  hot: { stroke: ACCENT, 'stroke-width': 2 },
}
export const TEXTS: Record<TextLook, string> = { axis: SOFT, principal: ACCENT, dimension: INK, plastic: SOFT, user: ACCENT }
