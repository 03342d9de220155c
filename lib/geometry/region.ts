import type { EdgeTable } from './edges'

/**
 * The net metal after the make-up: closed loops of exact edges, metal on the left of every edge
 * (outer loops counter-clockwise, holes clockwise). Loop k is edges loopStart[k] … loopStart[k + 1] − 1.
 */
export interface Region {
  edges: EdgeTable
  loopStart: Uint32Array
  /** 1 where the loop bounds a hole */
  hole: Uint8Array
  /** which piece (component of the open metal) the loop belongs to, from 0 */
  piece: Uint32Array
  pieces: number
}

/**
 * A repair that joined two ends which did not meet: where, how wide, and the signed area it decided; its share of a second
 * moment is that area times the square of its distance.
 */
export interface Repair {
  x: number
  y: number
  gap: number
  /** area that the outline would gain by the other reasonable closing (region's unit²) */
  area: number
}
