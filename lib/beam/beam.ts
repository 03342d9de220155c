/** A pair of components: y along the member's depth (up), x across it (right), in the section's axes. */
export interface Pair {
  x: number
  y: number
}

/** What bends: about the centroid and the section's x and y; mm², mm⁴. */
export interface Stiffness {
  area: number
  ix: number
  iy: number
  ixy: number
  /** MPa */
  elasticModulus: number
  /** MPa; with `shearCompliance` it adds the shear deflection */
  shearModulus?: number
  /** 1/A_s as a symmetric 2×2, mm⁻²; left out: no shear deflection */
  shearCompliance?: { xx: number; yy: number; xy: number }
  /** per kelvin */
  expansion?: number
}

/** A stretch of the member with one stiffness, up to `to` (mm from the left end). */
export interface Stretch {
  to: number
  stiffness: Stiffness
}

/** pinned and fixed hold the member along its axis too, roller does not. Springs in N/mm and N·mm/rad. */
export interface Support {
  at: number
  kind: 'pinned' | 'roller' | 'fixed' | 'spring'
  /** the planes it holds; both unless said */
  holds?: 'both' | 'vertical' | 'horizontal'
  spring?: { along?: Pair; turning?: Pair; axial?: number }
  /** prescribed movement, mm, + up and right */
  settlement?: Pair
}

/** A hinge transmits no moment in the directions named. */
export interface Hinge {
  at: number
  releases: 'both' | 'vertical' | 'horizontal'
}

/**
 * Loads, + up (y) and right (x), N and mm. A moment's components turn the member towards +y and +x:
 * positive `y` gives the slope dv/dz a positive push. `gradient` is the temperature's change per mm
 * towards +y and +x, K/mm; `rise` warms the whole depth, K.
 */
export type BeamLoad =
  | { kind: 'point'; at: number; force: Pair }
  | { kind: 'distributed'; from: number; to: number; start: Pair; end: Pair }
  | { kind: 'moment'; at: number; moment: Pair }
  | { kind: 'axial'; at: number; force: number }
  | { kind: 'temperature'; from: number; to: number; gradient: Pair; rise: number }

export interface Beam {
  stretches: Stretch[]
  supports: Support[]
  hinges: Hinge[]
}

/** Polynomials in s = z − from, lowest power first, valid for z in [from, to]. */
export interface Piece {
  from: number
  to: number
  /** deflection v, u (mm), slope, and the internal forces below */
  deflection: { x: number[]; y: number[] }
  slope: { x: number[]; y: number[] }
  /** bending moment, N·mm: `y` is of the vertical plane and positive when sagging, `x` of the horizontal plane, positive when the +x side is compressed */
  moment: { x: number[]; y: number[] }
  /** shear force, N: derivative of the moment along the member */
  shear: { x: number[]; y: number[] }
  /** tension positive, N */
  axial: number[]
}

export interface Reaction {
  at: number
  /** force on the member, N */
  force: Pair
  /** moment on the member, N·mm, in the sense of `BeamLoad` moments */
  moment: Pair
  axial: number
}

export interface BeamResult {
  pieces: Piece[]
  reactions: Reaction[]
}

/** Why a beam cannot be solved, with a sentence a user can act on and the shape it would move in. */
export interface BeamFault {
  code: 'invalid' | 'mechanism'
  message: string
  at?: number
  /** for a mechanism: deflection at the nodes, scaled to 1 */
  movement?: { at: number; x: number; y: number }[]
}
export type BeamAnswer = { ok: true; result: BeamResult } | { ok: false; fault: BeamFault }
