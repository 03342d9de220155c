import type { Severity } from '@/lib/geometry/finding'
import type { Region } from '@/lib/geometry/region'
import type { Section } from '@/lib/section/types'
import type { Box, DrawingPoint } from './view'

/** What the board draws: plain data, all of it in mm of the section (after the recipe's turn). */
export interface BoardModel {
  /** everything drawn lies in it; the sheet and its zones are laid around it */
  extents: Box
  /** what all paths are written about, y down, as lib/geometry/svgPath writes them */
  origin: DrawingPoint
  /** the net metal as one SVG path; '' where there is none yet */
  metal: string
  /** its outer loops and its holes alone */
  outer: string
  inner: string
  /** further line work, one path a look */
  strokes: BoardStroke[]
  /** what can be picked and lights up */
  outlines: BoardOutline[]
  marks: BoardMark[]
  /** null until the drawing gives a section */
  section: Section | null
  /** the metal's edges, for measuring and the user's axis */
  region: Region | null
}

/** `open`: chains that do not close; `out`: outlines left out; `drawn`: outlines before they make metal. */
export type StrokeLook = 'open' | 'out' | 'drawn'

export interface BoardStroke {
  look: StrokeLook
  path: string
}

export interface BoardOutline {
  id: string
  path: string
  polyline: Float64Array
  box: Box
}

/** A finding that has a place. `index` is its place in the list of findings beside the board. */
export interface BoardMark {
  index: number
  severity: Severity
  at: DrawingPoint
  /** mm */
  size: number
  message: string
}
