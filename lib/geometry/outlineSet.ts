import type { ArcOffer } from './chords'
import type { EdgeTable } from './edges'
import type { Finding } from './finding'
import type { OutlineGroup } from './groups'
import type { Repair } from './region'

/**
 * The closed outlines of a drawing, in drawing units, before the make-up. Outline k is edges
 * loopStart[k] … loopStart[k + 1] − 1 of `edges`, each running into the next and the last into the
 * first, counter-clockwise. Ends are snapped: neighbours share their end to the last bit.
 */
export interface OutlineSet {
  edges: EdgeTable
  loopStart: Uint32Array
  count: number
  /** > 0, drawing units² */
  area: Float64Array
  /** minX minY maxX maxY of each outline, exact over its curves */
  bounds: Float64Array
  /** a point on each outline, by which a recipe names it: x y */
  at: Float64Array
  /** index of the entity (drawing.entities) that gave the outline's first edge */
  source: Uint32Array
  /**
   * Nesting depth, 0 outermost, among the outlines of the set; −1 where the outline crosses or
   * overlaps another, so that nesting says nothing and a person must state the make-up.
   */
  depth: Int32Array
  /** the smallest outline that holds this one, −1 for none */
  parent: Int32Array
  /** 1 where a person has to say whether the outline is metal or void (a face of branching edges); its depth is −1 */
  undecided: Uint8Array
  /** number of the group that lies apart from the others (a detail of the sheet), from 0 */
  group: Uint32Array
  /** the groups by number: bounds in drawing units and how many outlines */
  groups: OutlineGroup[]
  /** outlines that look like drawing frames, outermost first: offered to be left out */
  frames: number[]
  /** outlines that look like the cells of a title block or a table: offered to be left out */
  titleBlocks: number[][]
  /** runs of chords on one circle: offered to be taken as arcs */
  arcOffers: ArcOffer[]
  /** outlines whose boundaries meet other than at joints they share in passing: arranged together */
  clusters: number[][]
  /**
   * Chains that do not close: edge rows `openStart[k] … openStart[k + 1] − 1` of `openEdges`; shown
   * on the board, no metal.
   */
  openEdges: EdgeTable
  openStart: Uint32Array
  repairs: Repair[]
  findings: Finding[]
}

/** The four tolerances, in drawing units, each recorded in the section. */
export interface Tolerances {
  /** half of the last written digit */
  lastDigit: number
  /** ends closer than this are joined */
  chaining: number
  /** parallel edges closer than this are one edge drawn twice */
  duplicate: number
  /** vertices of the arrangement closer than this are one; 1e-9 × size */
  snap: number
}
