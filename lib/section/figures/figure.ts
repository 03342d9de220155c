import type { Change } from '../change'
import type { OriginKind, Section } from '../types'

/** What kind of quantity a figure is; lib/units knows how each is shown in a team's units. */
export type Dimension =
  | 'length'
  | 'area'
  | 'modulus'
  | 'secondMoment'
  | 'angle'
  | 'massPerLength'
  | 'perimeterFactor'
  | 'ratio'
  | 'count'
  | 'warping'

export type FigureGroup = 'size' | 'centroid' | 'bending' | 'principal' | 'plastic' | 'torsion'

/** A symbol in parts, so that the screen can lower the subscript: { base: 'W', sub: 'el,x' }. */
export interface FigureSymbol {
  base: string
  sub?: string
}

/** What the board draws while the figure is hovered. */
export type Shows =
  | 'region'
  | 'outer'
  | 'inner'
  | 'circle'
  | 'extents'
  | 'centroid'
  | 'axisX'
  | 'axisY'
  | 'axesXY'
  | 'axis1'
  | 'axis2'
  | 'axes12'
  | 'fibreTop'
  | 'fibreBottom'
  | 'fibreRight'
  | 'fibreLeft'
  | 'fibre1Left'
  | 'fibre1Right'
  | 'fibre2Right'
  | 'fibre2Left'
  | 'plasticX'
  | 'plasticY'
  | 'plastic1'
  | 'plastic2'
  | 'freePlasticX'
  | 'freePlasticY'
  | 'shearCentre'

/** The kinds of edges that make an otherwise exact figure an iterated one. */
export type IteratedOn = 'ellipse' | 'bezier'

/** What the spread of some figures needs beside the section: how hard they answer to a change. */
export interface Response {
  /** width of metal along each plastic neutral axis, mm; 0 in a gap */
  widths: { x: number; y: number; axis1: number; axis2: number }
  /** how far the circle's centre moves when its points of contact move by 1 */
  circle: number
}

/** One row of the table of figures. Sheet, CSV, JSON and schema walk this table. */
/** A figure lies between these for certain; its own unit. */
export interface Bounds {
  lower: number
  upper: number
}

export interface Figure {
  /** dotted path of the value in `Section`, also the key in `origin` */
  key: string
  group: FigureGroup
  symbol: { en: FigureSymbol; us: FigureSymbol }
  word: string
  dimension: Dimension
  /** at best; a region with edges of a kind in `iteratedOn`, or with a rational spline, makes it 'iterated' */
  origin: OriginKind
  iteratedOn?: readonly IteratedOn[]
  shows: Shows
  value: (section: Section) => number | null | undefined
  bounds?: (section: Section) => Bounds | undefined
  /** first-order bound of what a change does to the figure, in its own unit; absent for counts */
  spread?: (section: Section, change: Change, response: Response) => number
}
